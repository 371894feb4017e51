'use client'

import { useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { useAction } from '@/app/_crew/use-action'
import type { DayProblem } from '@/lib/sync/client/day-problem'
import type { Draft } from '@/lib/sync/client/draft'
import type { WalkStop } from '@/lib/walk/next-stop'
import type { WalkSubject } from './use-walk'

/** The last answer, as far as it can be taken back. */
interface Undoable {
  readonly checks: readonly string[]
  readonly words: string
  readonly stop: WalkStop
}

export interface Undo {
  /** What was just saved, in words; null when there is nothing to take back. */
  readonly done: string | null
  readonly problem: DayProblem | null
  readonly saved: (undoable: Undoable) => void
  /** Takes the last answer back; gives where it was made, or null where that failed or there was nothing. */
  readonly takeBack: () => Promise<WalkStop | null>
}

/** The way back from the last answer. It lives above the places of a walk: closing a place must not close it. */
export function useUndo(subject: WalkSubject): Undo {
  const day = useDay()
  const [last, setLast] = useState<Undoable | null>(null)
  const { busy, problem, setProblem, act } = useAction()

  const takeBack = async () => {
    if (last === null || busy) return null
    // Only what this person said: the client names no other's finding (rule F4).
    const drafts = last.checks.map((check): Draft => ({ kind: 'finding', subject, check, outcome: 'unseen' }))
    if (!(await act(() => day.record(drafts)))) return null
    setLast(null)
    return last.stop
  }

  const saved = (undoable: Undoable) => {
    setLast(undoable)
    setProblem(null)
  }

  return { done: last ? `Saved: ${last.words}` : null, problem, saved, takeBack }
}
