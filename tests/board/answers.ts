import { vi } from 'vitest'
import type { Problem } from '@/lib/contracts/problem'

/** What the server is asked, oldest first. */
export interface Asked {
  readonly url: string
  readonly method: string
  readonly body: unknown
}

export type Answer = { readonly ok: unknown } | { readonly problem: Partial<Problem> & { readonly status: number } } | 'no network'

/** Stands in for the server: answers each request with the next of these, the last one again and again. */
export function answering(...answers: readonly Answer[]): readonly Asked[] {
  const asked: Asked[] = []
  vi.stubGlobal('fetch', async (url: string, init: RequestInit = {}) => {
    const answer = answers[Math.min(asked.length, answers.length - 1)] ?? 'no network'
    asked.push({ url, method: init.method ?? 'GET', body: typeof init.body === 'string' ? JSON.parse(init.body) : null })
    if (answer === 'no network') throw new TypeError('fetch failed')
    if ('ok' in answer) return Response.json(answer.ok)
    const { status } = answer.problem
    const whole = {
      type: 'about:blank',
      title: '',
      code: 'fault',
      what: '',
      kept: '',
      todo: '',
      issues: [],
      serverTime: 1,
      ...answer.problem,
    }
    return Response.json(whole, { status })
  })
  return asked
}
