'use client'

import { useCallback, useState } from 'react'
import { dayProblemOf, type DayProblem } from '@/lib/sync/client/day-problem'

export interface Action {
  readonly busy: boolean
  /** What went wrong the last time; null when nothing did. */
  readonly problem: DayProblem | null
  readonly setProblem: (problem: DayProblem | null) => void
  /** Does it, and says whether it was done. An expected failure becomes `problem`; a bug goes on to the error boundary. */
  readonly act: (work: () => Promise<unknown>) => Promise<boolean>
}

/** One thing a person does that may fail: busy while it runs, its failure kept in words. */
export function useAction(): Action {
  const [busy, setBusy] = useState(false)
  const [problem, setProblem] = useState<DayProblem | null>(null)
  const [bug, setBug] = useState<{ readonly error: unknown } | null>(null)
  // Thrown while rendering, so that the boundary shows it instead of a screen that silently did nothing.
  if (bug) throw bug.error
  const act = useCallback(async (work: () => Promise<unknown>) => {
    setBusy(true)
    try {
      await work()
      setProblem(null)
      return true
    } catch (error) {
      const known = dayProblemOf(error)
      if (known) setProblem(known)
      else setBug({ error })
      return false
    } finally {
      setBusy(false)
    }
  }, [])
  return { busy, problem, setProblem, act }
}
