const formats = new Map<string, Intl.DateTimeFormat>()

/** The time at the venue, `09:31`; empty for an instant or a zone that is none, so that an answer never breaks over its wording. */
export function venueTime(instantMs: number, timeZone: string): string {
  try {
    let format = formats.get(timeZone)
    if (!format) {
      format = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit', hourCycle: 'h23', timeZone })
      formats.set(timeZone, format)
    }
    return format.format(instantMs)
  } catch {
    // A RangeError: no such zone or no such instant. What is said stays true without the time.
    return ''
  }
}
