import { browserStores } from './browser-stores'
import { browserTools } from './browser-tools'
import type { DayClient } from './day-client'
import { enrolledHere } from './enrol-here'
import { httpTransport } from './http-transport'
import { openDay } from './open-day'

let opening: Promise<DayClient | null> | null = null

/**
 * The day this browser was last enrolled for, opened once per page and kept in step; null where it is no crew device. Rejects with a `DayError` or the
 * store's own error where its storage cannot be opened; the next call tries again.
 */
export function dayHere(): Promise<DayClient | null> {
  opening ??= open().catch((error: unknown) => {
    opening = null
    throw error
  })
  return opening
}

async function open(): Promise<DayClient | null> {
  const latest = (await enrolledHere(browserStores))[0]
  if (latest === undefined) return null
  const store = await browserStores.device(latest.event, latest.device)
  const client = await openDay(store, {
    tools: browserTools,
    transport: (enrolment) => httpTransport(enrolment, browserTools),
    network: window,
  })
  client.start()
  return client
}
