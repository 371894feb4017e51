'use client'

import { useCallback } from 'react'
import useSWR, { useSWRConfig } from 'swr'
import { board, type Board } from '@/lib/contracts/board'
import type { Problem } from '@/lib/contracts/problem'
import { callOrThrow, CallProblem } from '@/lib/http/call'
import { useEventStream } from './use-event-stream'

export const POLL_SECONDS = 15
/** While the stream is heard: a line that died without a word is noticed by this. */
const BESIDE_STREAM_SECONDS = 60

/** How fresh the board is; what is shown is from its own `at`. */
export type Connection = { readonly state: 'live' } | { readonly state: 'polling' } | { readonly state: 'lost'; readonly problem: Problem }

export interface UsedBoard {
  readonly board: Board
  readonly connection: Connection
}

/** The board, kept fresh by the event's stream and by asking where that is not heard. Begins with what the page was rendered with. */
export function useBoard(eventId: string, first: Board): UsedBoard {
  const ask = useCallback(() => callOrThrow(board, { params: { event: eventId } }), [eventId])
  const key = ['board', eventId]
  const { mutate: renew } = useSWRConfig()
  const onChange = useCallback(() => void renew(['board', eventId]), [renew, eventId])
  const isLive = useEventStream(eventId, onChange)
  const refreshInterval = (isLive ? BESIDE_STREAM_SECONDS : POLL_SECONDS) * 1000
  const { data, error } = useSWR<Board, unknown>(key, ask, {
    fallbackData: first,
    refreshInterval,
    refreshWhenHidden: true,
    refreshWhenOffline: true,
    shouldRetryOnError: false,
  })
  const shown = data ?? first
  if (error instanceof CallProblem) return { board: shown, connection: { state: 'lost', problem: error.problem } }
  return { board: shown, connection: { state: isLive ? 'live' : 'polling' } }
}
