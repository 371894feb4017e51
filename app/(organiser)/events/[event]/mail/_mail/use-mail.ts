'use client'

import useSWR from 'swr'
import { type EventMail, eventMail, mailAgain, type Mailing, writeMailing } from '@/lib/contracts/mail'
import type { Problem } from '@/lib/contracts/problem'
import { call, callOrThrow, CallProblem } from '@/lib/http/call'

/** Mail goes out within seconds: who has just pressed a button sees it go. */
const POLL_MS = 4_000

/** The event's mail, kept fresh, and what an organiser does with it; each gives null when it is done, else why not. */
export function useMail(eventId: string) {
  const params = { event: eventId }
  const { data, error, mutate } = useSWR<EventMail, unknown>(['mail', eventId], () => callOrThrow(eventMail, { params }), {
    refreshInterval: POLL_MS,
    refreshWhenOffline: true,
    shouldRetryOnError: false,
  })

  async function write(what: Mailing, expected: number): Promise<Problem | null> {
    const written = await call(writeMailing, { params, body: { what, expected } })
    await mutate()
    return written.ok ? null : written.problem
  }

  async function again(mail: string): Promise<Problem | null> {
    const tried = await call(mailAgain, { params, body: { mail } })
    await mutate()
    return tried.ok ? null : tried.problem
  }

  return { mail: data ?? null, problem: error instanceof CallProblem ? error.problem : null, write, again }
}
