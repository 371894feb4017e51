'use client'

import { useCallback } from 'react'
import useSWR, { useSWRConfig } from 'swr'
import { holds, type Holds } from '@/lib/contracts/holds'
import type { Problem } from '@/lib/contracts/problem'
import { callOrThrow, CallProblem } from '@/lib/http/call'

export interface UsedHolds {
  readonly holds: Holds
  /** Why what is shown may be old; null while it is fresh. */
  readonly problem: Problem | null
  readonly renew: () => Promise<void>
}

const POLL_MS = 15_000

/** The list of holds, asked for again every few seconds. Begins with what the page was rendered with. */
export function useHolds(eventId: string, first: Holds): UsedHolds {
  const ask = useCallback(() => callOrThrow(holds, { params: { event: eventId } }), [eventId])
  const { mutate } = useSWRConfig()
  const { data, error } = useSWR<Holds, unknown>(['holds', eventId], ask, {
    fallbackData: first,
    refreshInterval: POLL_MS,
    shouldRetryOnError: false,
  })
  const renew = useCallback(async () => {
    await mutate(['holds', eventId])
  }, [mutate, eventId])
  return { holds: data ?? first, problem: error instanceof CallProblem ? error.problem : null, renew }
}
