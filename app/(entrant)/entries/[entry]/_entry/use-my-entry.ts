'use client'

import useSWR from 'swr'
import { myEntry, type MyEntry } from '@/lib/contracts/my-entry'
import { callOrThrow, CallProblem } from '@/lib/http/call'

/** In the paddock a driver looks at this page while the bay works: often enough to see the verdict fall. */
const POLL_MS = 15_000

/** One's own entry, asked again by itself. Begins with what the page was rendered with, and says when the server is not heard. */
export function useMyEntry(first: MyEntry): { readonly entry: MyEntry; readonly lost: string | null } {
  const ask = () => callOrThrow(myEntry, { params: { entry: first.id } })
  const { data, error } = useSWR<MyEntry, unknown>(['my-entry', first.id], ask, {
    fallbackData: first,
    refreshInterval: POLL_MS,
    refreshWhenOffline: true,
    shouldRetryOnError: false,
  })
  return { entry: data ?? first, lost: error instanceof CallProblem ? error.problem.what : null }
}
