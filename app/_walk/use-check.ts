'use client'

import { useState } from 'react'
import type { CarFacts } from '@/lib/checklist/car-facts'
import { judgeCheck } from '@/lib/checklist/judge-check'
import { civilDate } from '@/lib/rules/civil-date'
import type { Judgement } from '@/lib/rules/judgement'
import type { Answer } from '@/lib/walk/answer'
import { readValues, type ReadValues } from '@/lib/walk/read-values'
import { NO_PHOTO_WORDS, wantsPhoto } from '@/lib/walk/wants-photo'
import type { WalkItem } from '@/lib/walk/walk-plan'
import type { Entered } from './use-position'

export interface CheckInput {
  readonly item: WalkItem
  readonly facts: CarFacts
  /** The event's last day: dated kit is judged on it. */
  readonly lastDay: string
  readonly entered: Entered
  readonly setEntered: (entered: Entered) => void
  readonly onAnswer: (answer: Answer, note: string, photos: readonly string[]) => void
}

/** What a reason is being asked for. */
export type Asking = 'fail' | 'advisory' | 'put-right'

export interface CheckNow {
  readonly problems: ReadValues['problems']
  readonly judgement: Judgement | null
  /** What an answer may be at its mildest as the values stand. */
  readonly says: 'ok' | 'advisory' | 'fail' | 'undecided'
  readonly asking: Asking | null
  readonly ask: (asking: Asking | null) => void
  /** Free text for the reason; it stays until the check is answered. */
  readonly note: string
  readonly setNote: (note: string) => void
  readonly give: (reason: string) => void
  /** The mildest answer the rule allows: ok, or advisory. */
  readonly agree: (says: 'ok' | 'advisory') => void
  readonly couldNotSee: () => void
  readonly dropMending: () => void
  /** The checklist wants a photograph with the answer just given, and there is none; null otherwise. */
  readonly photoAsked: { readonly onPhoto: (hash: string) => void; readonly onWithout: () => void; readonly onClose: () => void } | null
}

interface Waiting {
  readonly answer: Answer
  readonly note: string
}

/** One check as it is being answered. The judgement proposes, the person decides, never milder. */
export function useCheck({ item, facts, lastDay, entered, setEntered, onAnswer }: CheckInput): CheckNow {
  const { check } = item
  const { typed, mending, photos } = entered
  const fields = check.measure ?? []
  const [asking, ask] = useState<Asking | null>(null)
  const [note, setNote] = useState('')
  const [waiting, setWaiting] = useState<Waiting | null>(null)
  const { values, problems } = readValues(fields, typed)
  const judgement = problems.length > 0 ? null : judgeCheck(check, values, facts, civilDate(lastDay))

  const answer = (given: Answer, words: string) => {
    if (photos.length === 0 && wantsPhoto(check, given)) setWaiting({ answer: given, note: words })
    else onAnswer(given, words, photos)
  }

  const give = (reason: string) => {
    ask(null)
    if (asking === 'put-right') putRight(reason)
    else if (asking !== null) answer({ say: asking, values, reason }, note.trim())
  }

  const putRight = (reason: string) => {
    // What was measured is the state met; the state left is measured anew.
    if (fields.length > 0) setEntered({ typed: {}, mending: { typed, reason, note: note.trim() }, photos })
    else answer({ say: 'put-right', found: { values, reason }, values: {} }, note.trim())
  }

  const agree = (says: 'ok' | 'advisory') => {
    if (mending) {
      const found = { values: readValues(fields, mending.typed).values, reason: mending.reason }
      answer({ say: 'put-right', found, values }, mending.note)
    } else if (says === 'ok') answer({ say: 'ok', values }, '')
    else ask('advisory')
  }

  return {
    problems,
    judgement,
    says: saysOf(item, problems.length > 0, judgement),
    asking,
    ask,
    note,
    setNote,
    give,
    agree,
    couldNotSee: () => answer({ say: 'could-not-see' }, ''),
    dropMending: () => {
      if (mending) setEntered({ typed: mending.typed, mending: null, photos })
    },
    photoAsked: waiting && photoAsked(waiting, onAnswer, () => setWaiting(null)),
  }
}

function photoAsked({ answer, note }: Waiting, onAnswer: CheckInput['onAnswer'], onClose: () => void): NonNullable<CheckNow['photoAsked']> {
  const go = (words: string, photos: readonly string[]) => {
    onClose()
    onAnswer(answer, words, photos)
  }
  return {
    onPhoto: (hash) => go(note, [hash]),
    onWithout: () => go(note === '' ? NO_PHOTO_WORDS : `${note} ${NO_PHOTO_WORDS}`, []),
    onClose,
  }
}

function saysOf({ check }: WalkItem, hasProblems: boolean, judgement: Judgement | null): CheckNow['says'] {
  if (hasProblems) return 'undecided'
  return judgement?.outcome ?? (check.rule ? 'undecided' : 'ok')
}
