'use client'

import useSWR from 'swr'
import { type CrewMemberView, decideCrew, listCrew } from '@/lib/contracts/crew'
import type { Problem } from '@/lib/contracts/problem'
import { call, callOrThrow, CallProblem } from '@/lib/http/call'

/** Often enough that nobody stands long before an organiser who looks at the list. */
const POLL_MS = 5_000

export type Decision = 'accept' | 'refuse' | 'end'

/** Everybody who is or asks to be crew, kept fresh; and the organiser's word on one of them. */
export function useCrew(eventId: string) {
  const key = ['crew', eventId]
  const { data, error, mutate } = useSWR<{ crew: CrewMemberView[] }, unknown>(
    key,
    () => callOrThrow(listCrew, { params: { event: eventId } }),
    { refreshInterval: POLL_MS, refreshWhenOffline: true, shouldRetryOnError: false },
  )

  /** Null when it is done, else why not. */
  async function decide(member: string, decision: Decision): Promise<Problem | null> {
    const decided = await call(decideCrew, { params: { event: eventId }, body: { member, decision } })
    await mutate()
    return decided.ok ? null : decided.problem
  }

  return { crew: data?.crew ?? null, problem: error instanceof CallProblem ? error.problem : null, decide, renew: () => void mutate() }
}
