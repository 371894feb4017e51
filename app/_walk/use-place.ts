'use client'

import { useEffect } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { useAction } from '@/app/_crew/use-action'
import { goTo } from '@/app/_crew/use-location'
import { closingSentence } from '@/lib/checklist/places'
import { subjectKey } from '@/lib/inspection/subject'
import { civilDate } from '@/lib/rules/civil-date'
import type { DayProblem } from '@/lib/sync/client/day-problem'
import { answerCheck, isRefusal, type Answer, type FindingDraft } from '@/lib/walk/answer'
import { stopAfter, type WalkStop } from '@/lib/walk/next-stop'
import type { WalkItem, WalkPlace } from '@/lib/walk/walk-plan'
import { openStop } from './open-stop'
import { refusalWords } from './refusal-words'
import type { Undo } from './use-undo'
import { usePosition, type Position } from './use-position'
import { walkOf, type Walk } from './use-walk'

export interface PlaceNow extends Position {
  /** The check that is asked; null at the place's closing sentence. */
  readonly item: WalkItem | null
  readonly busy: boolean
  readonly problem: DayProblem | null
  readonly answer: (item: WalkItem, answer: Answer, note: string, photos: readonly string[]) => void
  readonly close: () => void
  readonly takeBack: () => void
}

const OUTCOME_WORDS = { ok: 'ok', advisory: 'advisory', fail: 'fail', 'could-not-see': 'could not see', unseen: 'taken back' } as const

/** Where one is at a place, and what an answer does: it is saved first, and only then the next check is shown (rule M1). */
export function usePlace(walk: Walk, here: WalkPlace, base: string, undo: Undo): PlaceNow {
  const day = useDay()
  const { subject } = walk
  const position = usePosition(here, subjectKey(subject))
  const { stop, moveTo } = position
  const { busy, problem, setProblem, act } = useAction()
  // A problem belongs to the check it was met at.
  useEffect(() => setProblem(null), [stop, setProblem])

  const show = (next: WalkStop | null) => {
    if (next?.place === here.place.id) moveTo(next)
    else if (next) openStop(subject, base, next)
    else goTo(base)
  }

  const draft = (item: WalkItem, given: Answer, note?: string) =>
    answerCheck(subject, item.check, given, walk.facts ?? {}, civilDate(walk.lastDay), note)

  const save = async (drafts: readonly FindingDraft[], note: string, words: string) => {
    const isSaved = await act(() => day.record(drafts, note === '' ? [] : [{ ref: 'words', text: note }]))
    if (!isSaved) return
    undo.saved({ checks: drafts.map(({ check }) => check), words, stop })
    // Asked anew: what was just saved may ask for something to be seen again.
    show(stopAfter(walkOf(day, subject).plan, stop))
  }

  const answer = (item: WalkItem, given: Answer, note: string, photos: readonly string[]) => {
    const made = draft(item, given, note === '' ? undefined : 'note:words')
    if (isRefusal(made)) setProblem(refusalWords(made))
    else
      void save(
        [photos.length === 0 ? made : { ...made, photos: [...photos] }],
        note,
        `${item.check.short}: ${OUTCOME_WORDS[made.outcome]}`,
      )
  }

  const close = () => {
    const open = here.together.filter((item) => !item.answered)
    const made = open.map((item) => draft(item, { say: 'ok', values: {} }))
    const refused = made.find(isRefusal)
    if (refused) setProblem(refusalWords(refused))
    else
      void save(
        made.flatMap((one) => (isRefusal(one) ? [] : [one])),
        '',
        closingSentence(
          here.place,
          open.map(({ check }) => check),
        ),
      )
  }

  const takeBack = () => {
    void undo.takeBack().then((back) => {
      if (back) show(back)
    })
  }

  const item = [...here.oneByOne, ...here.together].find(({ check }) => check.id === stop.check) ?? null
  return { ...position, item, busy, problem: problem ?? undo.problem, answer, close, takeBack }
}
