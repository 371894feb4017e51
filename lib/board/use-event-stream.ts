'use client'

import { useEffect, useState } from 'react'
import { live } from '@/lib/contracts/live'
import { urlOf } from '@/lib/http/call'

const TRY_AGAIN_MS = 15_000
/** Several changes in this time are heard as one: a bay that sends its morning must not make every screen ask fifty times. */
const AT_MOST_EVERY_MS = 1_000

/** Hears that something of the event has changed, and whether it is listening at all. `onChange` must be the same function each time. */
export function useEventStream(eventId: string, onChange: () => void): boolean {
  const [isLive, setLive] = useState(false)
  useEffect(() => {
    let source: EventSource | null = null
    let again: ReturnType<typeof setTimeout> | undefined
    let soon: ReturnType<typeof setTimeout> | undefined
    function open(): void {
      source = new EventSource(urlOf(live, { event: eventId }, {}))
      source.onopen = () => setLive(true)
      source.onmessage = () => {
        soon ??= setTimeout(() => {
          soon = undefined
          onChange()
        }, AT_MOST_EVERY_MS)
      }
      source.onerror = () => {
        setLive(false)
        // A browser connects again by itself after a broken line, never after an answer that was no stream.
        if (source?.readyState === EventSource.CLOSED) again = setTimeout(open, TRY_AGAIN_MS)
      }
    }
    open()
    return () => {
      clearTimeout(again)
      clearTimeout(soon)
      source?.close()
    }
  }, [eventId, onChange])
  return isLive
}
