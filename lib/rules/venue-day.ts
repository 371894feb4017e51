import type { CivilDate } from './civil-date'

const formats = new Map<string, Intl.DateTimeFormat>()

/**
 * The civil date at the venue at an instant (ms since the epoch, UTC) in its IANA time zone.
 * Passes and perishable findings live by this day, midnight to midnight at the venue. Throws a RangeError for an unknown zone.
 */
export function venueDay(instantMs: number, timeZone: string): CivilDate {
  let format = formats.get(timeZone)
  if (!format) {
    format = new Intl.DateTimeFormat('en-CA', {
      timeZone,
      year: 'numeric',
      month: '2-digit',
      day: '2-digit',
      calendar: 'iso8601',
      numberingSystem: 'latn',
    })
    formats.set(timeZone, format)
  }
  const parts = new Map(format.formatToParts(instantMs).map((part) => [part.type, part.value]))
  return `${parts.get('year')}-${parts.get('month')}-${parts.get('day')}` as CivilDate
}
