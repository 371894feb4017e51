'use client'

import { useEffect, useState } from 'react'
import type { DayClient } from './day-client'
import { dayHere } from './day-here'
import { dayProblemOf, type DayProblem } from './day-problem'
import { dayProblem } from './problem-of'

export type DayHere =
  | { readonly state: 'opening' }
  | { readonly state: 'not-enrolled' }
  | { readonly state: 'open'; readonly client: DayClient }
  | { readonly state: 'failed'; readonly problem: DayProblem }

/** The day of this browser, for the crew's shells: opens it after the page has come alive, with no network needed. */
export function useDayHere(): DayHere {
  const [here, setHere] = useState<DayHere>({ state: 'opening' })
  useEffect(() => {
    let cancelled = false
    dayHere().then(
      (client) => !cancelled && setHere(client === null ? { state: 'not-enrolled' } : { state: 'open', client }),
      (error: unknown) => !cancelled && setHere({ state: 'failed', problem: dayProblemOf(error) ?? dayProblem('storage-failed') }),
    )
    return () => {
      cancelled = true
    }
  }, [])
  return here
}
