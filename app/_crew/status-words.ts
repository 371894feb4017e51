import type { DayStatus } from '@/lib/sync/client/day-client'
import { clockTime } from './say-when'

/** The machine's own state in one line: the link, what waits to be sent and since when. Times are those of the venue, by the corrected clock. */
export function statusWords(status: DayStatus, timeZone: string): string {
  const at = (deviceTime: number) => clockTime(deviceTime + status.clockOffset, timeZone)
  return `${linkWords(status, at)} · ${unsentWords(status, at)}`
}

function linkWords({ link, lastPullAt }: DayStatus, at: (time: number) => string): string {
  if (link === 'offline') return lastPullAt === null ? 'offline' : `offline since ${at(lastPullAt)}`
  if (lastPullAt === null) return 'not heard from the server yet'
  return link === 'live' ? 'in step' : `last heard ${at(lastPullAt)}`
}

function unsentWords({ unsent, unsentSince }: DayStatus, at: (time: number) => string): string {
  if (unsent === 0) return 'all sent'
  return unsentSince === null ? `${unsent} to send` : `${unsent} to send since ${at(unsentSince)}`
}
