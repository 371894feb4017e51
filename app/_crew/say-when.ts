/** `07:41` in the venue's time zone. */
export function clockTime(at: number, timeZone: string): string {
  return new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit', hourCycle: 'h23', timeZone }).format(at)
}

/** `Sat 9 May 2026` for a civil date. */
export function dayWords(day: string): string {
  const date = new Date(`${day}T12:00:00Z`)
  const part = (options: Intl.DateTimeFormatOptions) => new Intl.DateTimeFormat('en-GB', { ...options, timeZone: 'UTC' }).format(date)
  return `${part({ weekday: 'short' })} ${part({ day: 'numeric' })} ${part({ month: 'short' }).slice(0, 3)} ${part({ year: 'numeric' })}`
}

/** `just now`, `6 min ago`, `3 h ago`. */
export function ago(ms: number): string {
  const minutes = Math.floor(ms / 60_000)
  if (minutes < 1) return 'just now'
  return minutes < 60 ? `${minutes} min ago` : `${Math.floor(minutes / 60)} h ago`
}
