import { describe, expect, test } from 'vitest'
import { weekNumber, weekNumberSun } from 'weeknumber'
import { readTyreDateCode } from '@/lib/rules/tyre-date-code'
import { tyreWeekStart } from '@/lib/rules/tyre-week'

/**
 * The US rule counts a tyre's weeks from Sunday to Saturday, "01" being the first full week of the year. The npm package `weeknumber` counts the same
 * way (`weekNumberSun`) and shares no code with ours. It reads local dates, so noon of the day is handed in.
 */
const YEARS = Array.from({ length: 36 }, (_, index) => 2000 + index)
const WEEKS = Array.from({ length: 53 }, (_, index) => index + 1)

/** The Sundays of a year by the other count: its week number for each day of that year that is a Sunday. */
function sundaysOf(year: number): Map<number, string> {
  const sundays = new Map<number, string>()
  for (let day = new Date(year, 0, 1, 12); day.getFullYear() === year; day = new Date(year, day.getMonth(), day.getDate() + 1, 12)) {
    if (day.getDay() !== 0) continue
    sundays.set(weekNumberSun(day), `${year}-${String(day.getMonth() + 1).padStart(2, '0')}-${String(day.getDate()).padStart(2, '0')}`)
  }
  return sundays
}

describe('tyre weeks against the package weeknumber', () => {
  test.each(YEARS)('every code of %i begins on the Sunday that the other count gives, or is refused by both', (year) => {
    const sundays = sundaysOf(year)
    for (const week of WEEKS) {
      const code = `${String(week).padStart(2, '0')}${String(year % 100).padStart(2, '0')}`
      const read = readTyreDateCode(code)
      const start = sundays.get(week)
      expect(read, code).toEqual(start === undefined ? { kind: 'no-such-week', week, year } : { kind: 'week', week, year, start })
    }
  })

  test('the years with 53 weeks are those that begin on a Sunday, or on a Saturday with a leap day', () => {
    expect(YEARS.filter((year) => sundaysOf(year).has(53))).toEqual([2000, 2006, 2012, 2017, 2023, 2028, 2034])
    expect(YEARS.filter((year) => tyreWeekStart(year, 53) !== null)).toEqual([2000, 2006, 2012, 2017, 2023, 2028, 2034])
  })

  test('they are not ISO weeks: the Monday of ISO week 01 of 2009 falls in 2008, week 01 of a tyre does not', () => {
    expect(weekNumber(new Date(2008, 11, 29, 12))).toBe(1)
    expect(tyreWeekStart(2009, 1)).toBe('2009-01-04')
  })
})
