import { type CivilDate, dayNumber } from './civil-date'

const DAY_MS = 86_400_000

/**
 * The instant (ms since the epoch, UTC) at which clocks at the venue show this date and time (`HH:MM`). Where the hour is skipped in
 * spring the clock never shows it: the instant as late after the change is given; of an hour that comes twice, the first.
 */
export function venueInstant(date: CivilDate, time: string, timeZone: string): number {
  const [hours, minutes] = time.split(':').map(Number)
  const shown = dayNumber(date) * DAY_MS + ((hours ?? 0) * 60 + (minutes ?? 0)) * 60_000
  // The zone's offset may change near the instant; the offsets half a day before and after bracket any change.
  const [before, after] = [shown - offsetMs(shown - DAY_MS / 2, timeZone), shown - offsetMs(shown + DAY_MS / 2, timeZone)]
  const shows = [before, after].filter((instant) => instant + offsetMs(instant, timeZone) === shown)
  return shows.length > 0 ? Math.min(...shows) : before
}

/** How far clocks there are ahead of UTC at an instant, ms. */
function offsetMs(instantMs: number, timeZone: string): number {
  const whole = Math.floor(instantMs / 1000) * 1000
  const parts = new Intl.DateTimeFormat('en-GB', {
    timeZone,
    hourCycle: 'h23',
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    hour: '2-digit',
    minute: '2-digit',
    second: '2-digit',
  }).formatToParts(whole)
  const value = (type: string) => Number(parts.find((part) => part.type === type)?.value)
  return Date.UTC(value('year'), value('month') - 1, value('day'), value('hour'), value('minute'), value('second')) - whole
}
