'use client'

import { useMemo } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { askedChecks } from '@/lib/checklist/applicable-checks'
import type { Book } from '@/lib/checklist/book'
import type { CarFacts } from '@/lib/checklist/car-facts'
import type { Depth, JudgedKind } from '@/lib/checklist/checklist'
import type { SubjectState } from '@/lib/inspection/state'
import { judgedKind, subjectKey, type Subject } from '@/lib/inspection/subject'
import type { DayClient } from '@/lib/sync/client/day-client'
import { useDayStatus, useSubjectState } from '@/lib/sync/client/use-day'
import { planWalk, type WalkPlace } from '@/lib/walk/walk-plan'

export type WalkSubject = Exclude<Subject, { event: string }>

/** One subject's walk: how it stands, what is asked and where. */
export interface Walk {
  readonly subject: WalkSubject
  readonly state: SubjectState
  /** The book its `presented` pins; before the first, the one in force. Null where this device has not loaded it. */
  readonly book: Book | null
  /** The facts pinned; null before the first `presented`. */
  readonly facts: CarFacts | null
  readonly depth: Depth | null
  readonly plan: readonly WalkPlace[]
  readonly lastDay: string
}

/** The walk of a car, a person or a fit, drawn again when its records change. */
export function useWalk(subject: WalkSubject): Walk {
  const day = useDay()
  const key = subjectKey(subject)
  const state = useSubjectState(day, key)
  const status = useDayStatus(day)
  // The key stands for the subject, and the state and status for all that the walk is made of: two equal subjects are one walk.
  // eslint-disable-next-line react-hooks/exhaustive-deps -- the dependencies stand in another form, as the line above says
  return useMemo(() => walkOf(day, subject), [day, key, state, status.event?.lastDay, status.day])
}

/** The walk of a car, a person or a fit as it stands at this moment. */
export function walkOf(day: DayClient, subject: WalkSubject): Walk {
  const state = day.state(subjectKey(subject))
  const status = day.status()
  const head = state.presentedHeads[0]?.record ?? null
  const book = head ? day.book(head.checklist, head.limits) : day.book()
  return {
    subject,
    state,
    book,
    facts: head?.facts ?? null,
    depth: state.depth,
    plan: book ? planWalk(book.checklist.places, book.checks, askedOf(judgedKind(subject), state, book), state.checks) : [],
    lastDay: status.event?.lastDay ?? status.day,
  }
}

/** All that any of the `presented` asks (rule F12). */
function askedOf(kind: JudgedKind, state: SubjectState, book: Book): ReadonlySet<string> {
  const asked = state.presentedHeads.flatMap(({ record }) => askedChecks(book, kind, record.facts, record.depth))
  return new Set(asked.map((check) => check.id))
}
