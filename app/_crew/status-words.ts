import type { DayStatus } from '@/lib/sync/client/day-client'
import { clockTime } from './say-when'

/**
 * The machine's own state in one line: the link, what waits to be sent and since when. Times are those of the venue, by the corrected clock.
 * Offline, what waits has waited since then, and the line says it once.
 */
export function statusWords(status: DayStatus, timeZone: string): string {
  const at = (deviceTime: number) => clockTime(deviceTime + status.clockOffset, timeZone)
  return `${linkWords(status, at)} · ${unsentWords(status, at)}`
}

function linkWords({ link, lastPullAt }: DayStatus, at: (time: number) => string): string {
  if (link === 'offline') return lastPullAt === null ? 'offline' : `offline since ${at(lastPullAt)}`
  if (lastPullAt === null) return 'not heard from the server yet'
  return link === 'live' ? 'in step' : `last heard ${at(lastPullAt)}`
}

function unsentWords({ unsent, unsentSince, photosUnsent, link, lastPullAt }: DayStatus, at: (time: number) => string): string {
  const photos = photosUnsent === 0 ? '' : `${photosUnsent} ${photosUnsent === 1 ? 'photograph' : 'photographs'}`
  if (unsent === 0) return photos === '' ? 'all sent' : `${photos} to send`
  const what = photos === '' ? `${unsent} to send` : `${unsent} and ${photos} to send`
  const isSaid = link === 'offline' && lastPullAt !== null && unsentSince !== null && unsentSince >= lastPullAt
  return unsentSince === null || isSaid ? what : `${what} since ${at(unsentSince)}`
}
