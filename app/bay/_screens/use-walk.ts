'use client'

import { useMemo } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { askedChecks } from '@/lib/checklist/applicable-checks'
import type { Book } from '@/lib/checklist/book'
import type { CarFacts } from '@/lib/checklist/car-facts'
import type { Depth } from '@/lib/checklist/checklist'
import type { SubjectState } from '@/lib/inspection/state'
import { subjectKey, type Subject } from '@/lib/inspection/subject'
import { useDayStatus, useSubjectState } from '@/lib/sync/client/use-day'
import { planWalk, type WalkPlace } from '@/lib/walk/walk-plan'

export type WalkSubject = Exclude<Subject, { event: string } | { fit: string }>

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

/** The walk of a car or a person, drawn again when its records change. */
export function useWalk(subject: WalkSubject): Walk {
  const day = useDay()
  const key = subjectKey(subject)
  const state = useSubjectState(day, key)
  const status = useDayStatus(day)
  return useMemo(() => {
    const head = state.presentedHeads[0]?.record ?? null
    const book = head ? day.book(head.checklist, head.limits) : day.book()
    const kind = 'car' in subject ? 'car' : 'person'
    const asked = new Set(
      book
        ? state.presentedHeads.flatMap(({ record }) => askedChecks(book, kind, record.facts, record.depth).map((check) => check.id))
        : [],
    )
    return {
      subject,
      state,
      book,
      facts: head?.facts ?? null,
      depth: state.depth,
      plan: book ? planWalk(book.checklist.places, book.checks, asked, state.checks) : [],
      lastDay: status.event?.lastDay ?? status.day,
    }
    // The key stands for the subject: two equal subjects are one walk.
    // eslint-disable-next-line react-hooks/exhaustive-deps -- the dependency stands in another form, as the line above says
  }, [day, key, state, status.event?.lastDay, status.day])
}
