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

function unsentWords({ unsent, unsentSince, link, lastPullAt }: DayStatus, at: (time: number) => string): string {
  if (unsent === 0) return 'all sent'
  const isSaid = link === 'offline' && lastPullAt !== null && unsentSince !== null && unsentSince >= lastPullAt
  return unsentSince === null || isSaid ? `${unsent} to send` : `${unsent} to send since ${at(unsentSince)}`
}
