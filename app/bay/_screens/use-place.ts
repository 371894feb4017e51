'use client'

import { useEffect, useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { useAction } from '@/app/_crew/use-action'
import { goTo } from '@/app/_crew/use-location'
import { closingSentence } from '@/lib/checklist/places'
import { subjectKey } from '@/lib/inspection/subject'
import { civilDate } from '@/lib/rules/civil-date'
import { explainJudgement } from '@/lib/rules/explain'
import type { DayProblem } from '@/lib/sync/client/day-problem'
import type { Draft } from '@/lib/sync/client/draft'
import { answerCheck, isRefusal, type Answer, type AnswerRefusal, type FindingDraft } from '@/lib/walk/answer'
import type { Typed } from '@/lib/walk/read-values'
import { recallWalk, rememberWalk } from '@/lib/walk/walk-memory'
import { nextStop, type WalkItem, type WalkPlace, type WalkStop } from '@/lib/walk/walk-plan'
import type { Walk } from './use-walk'

/** The last answer, as far as it can be taken back. */
interface Undoable {
  readonly checks: readonly string[]
  readonly words: string
  readonly stop: WalkStop
}

export interface PlaceNow {
  readonly stop: WalkStop
  /** The check that is asked; null at the place's closing sentence. */
  readonly item: WalkItem | null
  readonly typed: Typed
  readonly setTyped: (typed: Typed) => void
  readonly busy: boolean
  readonly problem: DayProblem | null
  /** What was just saved, in words; null when there is nothing to undo. */
  readonly done: string | null
  readonly moveTo: (stop: WalkStop) => void
  readonly answer: (item: WalkItem, answer: Answer, note: string) => void
  readonly close: () => void
  readonly undo: () => void
}

const OUTCOME_WORDS = { ok: 'ok', advisory: 'advisory', fail: 'fail', 'could-not-see': 'could not see', unseen: 'undone' } as const

/** Where one is at a place, and what an answer does: it is saved first, and only then the next check is shown (rule M1). */
export function usePlace(walk: Walk, here: WalkPlace, base: string): PlaceNow {
  const day = useDay()
  const key = subjectKey(walk.subject)
  const [stop, setStop] = useState<WalkStop>(() => firstStop(here, key))
  const [typed, setTyped] = useState<Typed>(() => recalledValues(key, stop))
  const [undoable, setUndoable] = useState<Undoable | null>(null)
  const { busy, problem, setProblem, act } = useAction()

  useEffect(() => {
    rememberWalk(localStorage, key, { ...stop, values: typed, at: Date.now() })
  }, [key, stop, typed])

  const moveTo = (next: WalkStop) => {
    setStop(next)
    setTyped({})
    setProblem(null)
  }

  const save = async (drafts: readonly FindingDraft[], note: string, words: string) => {
    const saved = await act(() => day.record(drafts, note === '' ? [] : [{ ref: 'words', text: note }]))
    if (!saved) return
    setUndoable({ checks: drafts.map(({ check }) => check), words, stop })
    const rest = nextStop([markAnswered(here, new Set(drafts.map(({ check }) => check)))], stop)
    if (rest) moveTo(rest)
    else goTo(nextAddress(walk.plan, here.place.id, base))
  }

  const answer = (item: WalkItem, given: Answer, note: string) => {
    const words = note === '' ? undefined : 'note:words'
    const draft = answerCheck(walk.subject, item.check, given, walk.facts ?? {}, civilDate(walk.lastDay), words)
    if (isRefusal(draft)) setProblem(refusalWords(draft))
    else void save([draft], note, `${item.check.short}: ${OUTCOME_WORDS[draft.outcome]}`)
  }

  const close = () => {
    const checks = here.together.filter((item) => !item.answered).map(({ check }) => check)
    const drafts = checks.map(({ id }): FindingDraft => ({ kind: 'finding', subject: walk.subject, check: id, outcome: 'ok' }))
    void save(drafts, '', closingSentence(here.place, checks))
  }

  const undo = async ({ checks, stop: back }: Undoable) => {
    // Only what this person said: the client names no other's finding (rule F4).
    const drafts = checks.map((check): Draft => ({ kind: 'finding', subject: walk.subject, check, outcome: 'unseen' }))
    setUndoable(null)
    if (await act(() => day.record(drafts))) moveTo(back)
  }

  return {
    stop,
    item: [...here.oneByOne, ...here.together].find(({ check }) => check.id === stop.check) ?? null,
    typed,
    setTyped,
    busy,
    problem,
    done: undoable ? `Saved: ${undoable.words}` : null,
    moveTo,
    answer,
    close,
    undo: () => {
      if (undoable) void undo(undoable)
    },
  }
}

function firstStop(here: WalkPlace, key: string): WalkStop {
  const left = recallWalk(localStorage, key)
  const isOfPlace = (check: string) => [...here.oneByOne, ...here.together].some((item) => item.check.id === check)
  if (left?.place === here.place.id && (left.check === null || isOfPlace(left.check))) return { place: left.place, check: left.check }
  return nextStop([here], null) ?? { place: here.place.id, check: here.oneByOne[0]?.check.id ?? null }
}

function recalledValues(key: string, stop: WalkStop): Typed {
  const left = recallWalk(localStorage, key)
  return left?.place === stop.place && left.check === stop.check ? left.values : {}
}

/** The place as it will stand once these are saved, so that the next hole is known before the fold is drawn. */
function markAnswered(place: WalkPlace, answered: ReadonlySet<string>): WalkPlace {
  const mark = (item: WalkItem): WalkItem => (answered.has(item.check.id) ? { ...item, answered: true } : item)
  return { ...place, oneByOne: place.oneByOne.map(mark), together: place.together.map(mark) }
}

/** The next place with a hole, once round; the walk from above when there is none. */
function nextAddress(plan: readonly WalkPlace[], place: string, base: string): string {
  const at = plan.findIndex((one) => one.place.id === place)
  const next = [...plan.slice(at + 1), ...plan.slice(0, at)].find(({ unanswered }) => unanswered > 0)
  return next ? `${base}/${next.place.id}` : base
}

function refusalWords({ refused, judgement }: AnswerRefusal): DayProblem {
  const words = judgement ? explainJudgement(judgement.code, judgement.facts) : ''
  if (refused === 'milder-than-rule')
    return {
      code: 'not-allowed',
      what: `The limit says otherwise: ${words}`,
      kept: 'Nothing was recorded; the values are still here.',
      todo: 'Record it as it is. Only the chief can accept a fail, with a dispensation.',
    }
  return {
    code: 'not-allowed',
    what: words || 'A value is missing.',
    kept: 'Nothing was recorded yet.',
    todo: 'Take the value, or say that you could not see it.',
  }
}
