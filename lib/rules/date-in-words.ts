import { dayNumber, type CivilDate } from './civil-date'

const DAYS = ['Sun', 'Mon', 'Tue', 'Wed', 'Thu', 'Fri', 'Sat']
const MONTHS = ['January', 'February', 'March', 'April', 'May', 'June', 'July', 'August', 'September', 'October', 'November', 'December']

/** A civil date as people read it: `Sat 9 May 2026`. */
export function dateInWords(date: CivilDate): string {
  const month = MONTHS[Number(date.slice(5, 7)) - 1] ?? ''
  return `${DAYS[weekday(date)] ?? ''} ${Number(date.slice(8, 10))} ${month} ${date.slice(0, 4)}`
}

/** Day of the week, 0 for Sunday. 1970-01-01 was a Thursday. */
export function weekday(date: CivilDate): number {
  return (((dayNumber(date) + 4) % 7) + 7) % 7
}
