import { civilDate, dayNumber, fromDayNumber, type CivilDate } from './civil-date'
import { weekday } from './date-in-words'

/**
 * First day of a tyre's production week by the US rule: week 01 is the first full week, Sunday to Saturday, of the calendar year. These are not
 * ISO weeks: they differ by up to six days and in some years by a whole week. Null where the year has no such week (53 in most years).
 */
export function tyreWeekStart(year: number, week: number): CivilDate | null {
  if (!Number.isInteger(week) || week < 1 || week > 53) return null
  const newYear = civilDate(`${year}-01-01`)
  const firstSunday = dayNumber(newYear) + ((7 - weekday(newYear)) % 7)
  const start = fromDayNumber(firstSunday + 7 * (week - 1))
  return start.startsWith(`${year}-`) ? start : null
}
