import { civilDate } from '@/lib/rules/civil-date'
import { dateInWords } from '@/lib/rules/date-in-words'
import { venueClock } from '@/lib/rules/venue-clock'

/** `07:41` in the venue's time zone. */
export function clockTime(at: number, timeZone: string): string {
  return venueClock(at, timeZone)
}

/** `Sat 9 May 2026` for a civil date as text. Throws where it is none. */
export function dayWords(day: string): string {
  return dateInWords(civilDate(day))
}

/** `just now`, `6 min ago`, `3 h ago`. */
export function ago(ms: number): string {
  const minutes = Math.floor(ms / 60_000)
  if (minutes < 1) return 'just now'
  return minutes < 60 ? `${minutes} min ago` : `${Math.floor(minutes / 60)} h ago`
}
