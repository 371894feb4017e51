'use client'

import { useEffect, useRef, useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { goTo } from '@/app/_crew/use-location'
import { Button } from '@/app/_ui/button'
import { Notice } from '@/app/_ui/notice'
import { UndoBar } from '@/app/_ui/undo-bar'
import { closingSentence } from '@/lib/checklist/places'
import { explainJudgement } from '@/lib/rules/explain'
import { dayProblemOf, type DayProblem } from '@/lib/sync/client/day-problem'
import type { Draft } from '@/lib/sync/client/draft'
import { answerCheck, isRefusal, type Answer, type FindingDraft } from '@/lib/walk/answer'
import type { Typed } from '@/lib/walk/read-values'
import { recallWalk, rememberWalk } from '@/lib/walk/walk-memory'
import { nextStop, type WalkItem, type WalkPlace, type WalkStop } from '@/lib/walk/walk-plan'
import { civilDate } from '@/lib/rules/civil-date'
import { subjectKey } from '@/lib/inspection/subject'
import { CheckPanel } from './check-panel'
import { ClosingPanel } from './closing-panel'
import { HeadsSoFar } from './heads-so-far'
import { StopPicker } from './stop-picker'
import type { Walk } from './use-walk'

/** The last answer, as far as it can be taken back. */
interface Undoable {
  readonly checks: readonly string[]
  readonly words: string
  readonly stop: WalkStop
}

interface PlaceScreenProps {
  readonly walk: Walk
  readonly here: WalkPlace
  /** Where to go when the walk has no hole left, and where its places stand. */
  readonly base: string
}

/** One place of the walk: what is asked there one by one, then one sentence for the rest. Saved before the next check is shown. */
export function PlaceScreen({ walk, here, base }: PlaceScreenProps) {
  const day = useDay()
  const key = subjectKey(walk.subject)
  const [stop, setStop] = useState<WalkStop>(() => firstStop(here, key))
  const [typed, setTyped] = useState<Typed>(() => recalledValues(key, stop))
  const [busy, setBusy] = useState(false)
  const [problem, setProblem] = useState<DayProblem | null>(null)
  const [undoable, setUndoable] = useState<Undoable | null>(null)
  const heading = useRef<HTMLHeadingElement>(null)
  const item = here.oneByOne.find(({ check }) => check.id === stop.check) ?? null
  const facts = walk.facts ?? {}

  useEffect(() => {
    rememberWalk(localStorage, key, { ...stop, values: typed, at: Date.now() })
  }, [key, stop, typed])

  const moveTo = (next: WalkStop) => {
    setStop(next)
    setTyped({})
    setProblem(null)
    heading.current?.focus()
  }

  /** Saves, and only then goes on (rule M1): what is shown as answered is on the disk. */
  const save = async (drafts: readonly FindingDraft[], note: string, words: string, from: WalkStop) => {
    setBusy(true)
    try {
      await day.record(drafts, note === '' ? [] : [{ ref: 'words', text: note }])
    } catch (error) {
      const known = dayProblemOf(error)
      if (!known) throw error
      return setProblem(known)
    } finally {
      setBusy(false)
    }
    setUndoable({ checks: drafts.map(({ check }) => check), words, stop: from })
    const answered = new Set(drafts.map(({ check }) => check))
    const rest = nextStop([markAnswered(here, answered)], from)
    if (rest) return moveTo(rest)
    const elsewhere = nextStop(
      walk.plan.filter((place) => place.place.id !== here.place.id),
      null,
    )
    if (!elsewhere) return goTo(base)
    goTo(`${base}/${nextPlaceAfter(walk.plan, here.place.id) ?? elsewhere.place}`)
  }

  const answer = (asked: WalkItem, given: Answer, note: string) => {
    const draft = answerCheck(walk.subject, asked.check, given, facts, civilDate(walk.lastDay), note === '' ? undefined : 'note:words')
    if (isRefusal(draft)) return setProblem(refusalWords(draft))
    void save([draft], note, `${asked.check.short}: ${OUTCOME_WORDS[draft.outcome]}`, stop)
  }

  const close = () => {
    const open = here.together.filter((one) => !one.answered)
    const drafts = open.map(({ check }): FindingDraft => ({ kind: 'finding', subject: walk.subject, check: check.id, outcome: 'ok' }))
    void save(
      drafts,
      '',
      closingSentence(
        here.place,
        open.map(({ check }) => check),
      ),
      stop,
    )
  }

  const undo = async (done: Undoable) => {
    // Only what this person said: taking back another's finding is not undoing (rule F4).
    const drafts = done.checks.map((check): Draft => ({ kind: 'finding', subject: walk.subject, check, outcome: 'unseen' }))
    setUndoable(null)
    try {
      await day.record(drafts)
      moveTo(done.stop)
    } catch (error) {
      const known = dayProblemOf(error)
      if (!known) throw error
      setProblem(known)
    }
  }

  const count = here.oneByOne.length + (here.together.length > 0 ? 1 : 0)
  const position = item ? here.oneByOne.indexOf(item) + 1 : count
  return (
    <div className="flex grow flex-col px-4 pb-4">
      <h1 ref={heading} tabIndex={-1} className="pt-3 text-base text-muted outline-none">
        {here.place.title} · {position} of {count}
        {item?.check.critical ? ' · no-go item' : ''}
        {item?.seeAgain ? ' · see again' : ''}
      </h1>
      <p className="text-muted">{here.place.stand}</p>
      <StopPicker here={here} stop={stop} onPick={moveTo} />
      {problem && <Notice happened={problem.what} kept={problem.kept} todo={problem.todo} className="mt-3" />}
      {item ? (
        <>
          <HeadsSoFar item={item} subject={key} />
          <CheckPanel
            key={item.check.id}
            item={item}
            facts={facts}
            lastDay={walk.lastDay}
            typed={typed}
            onTyped={setTyped}
            busy={busy}
            onAnswer={(given, note) => answer(item, given, note)}
          />
        </>
      ) : (
        <ClosingPanel
          here={here}
          busy={busy}
          onClose={close}
          onPick={(check) => moveTo({ place: here.place.id, check })}
          onAnswer={answer}
        />
      )}
      <UndoBar done={undoable ? `Saved: ${undoable.words}` : null} onUndo={() => undoable && void undo(undoable)} />
      <div className="pt-4">
        <Button look="quiet" onClick={() => goTo(base)}>
          All places
        </Button>
      </div>
    </div>
  )
}

const OUTCOME_WORDS = { ok: 'ok', advisory: 'advisory', fail: 'fail', 'could-not-see': 'could not see', unseen: 'undone' } as const

function firstStop(here: WalkPlace, key: string): WalkStop {
  const left = recallWalk(localStorage, key)
  const isHere = left?.place === here.place.id && (left.check === null || here.oneByOne.some(({ check }) => check.id === left.check))
  if (left && isHere) return { place: left.place, check: left.check }
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

function nextPlaceAfter(plan: readonly WalkPlace[], place: string): string | null {
  const at = plan.findIndex((one) => one.place.id === place)
  return [...plan.slice(at + 1), ...plan.slice(0, at)].find(({ unanswered }) => unanswered > 0)?.place.id ?? null
}

function refusalWords(refusal: ReturnType<typeof answerCheck> & { refused: string }): DayProblem {
  const words = refusal.judgement ? explainJudgement(refusal.judgement.code, refusal.judgement.facts) : ''
  if (refusal.refused === 'milder-than-rule')
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
