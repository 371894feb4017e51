const formats = new Map<string, Intl.DateTimeFormat>()

/** What clocks at the venue show at an instant: `HH:MM`, 24 h. Throws a RangeError for an unknown zone. The inverse of `venueInstant`. */
export function venueClock(instantMs: number, timeZone: string): string {
  let format = formats.get(timeZone)
  if (!format) {
    format = new Intl.DateTimeFormat('en-GB', { timeZone, hourCycle: 'h23', hour: '2-digit', minute: '2-digit' })
    formats.set(timeZone, format)
  }
  return format.format(instantMs)
}
