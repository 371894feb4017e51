/** A date without a time, `YYYY-MM-DD` in the proleptic Gregorian calendar. */
export type CivilDate = string & { readonly __civilDate: unique symbol }

const DAY_MS = 86_400_000

/** Reads `YYYY-MM-DD`; null when it is not a date that exists. */
export function parseCivilDate(text: string): CivilDate | null {
  const match = /^(\d{4})-(\d{2})-(\d{2})$/.exec(text)
  if (!match) return null
  const [year, month, day] = [Number(match[1]), Number(match[2]), Number(match[3])]
  if (month < 1 || month > 12 || day < 1 || day > daysInMonth(year, month)) return null
  return text as CivilDate
}

/** As `parseCivilDate`, for literals in code and data already checked; throws when the text is no date. */
export function civilDate(text: string): CivilDate {
  const date = parseCivilDate(text)
  if (date === null) throw new Error(`not a civil date: ${text}`)
  return date
}

/** Days since 1970-01-01. */
export function dayNumber(date: CivilDate): number {
  return Math.round(Date.UTC(Number(date.slice(0, 4)), Number(date.slice(5, 7)) - 1, Number(date.slice(8, 10))) / DAY_MS)
}

/** The date `days` after 1970-01-01 (negative before). */
export function fromDayNumber(days: number): CivilDate {
  return new Date(days * DAY_MS).toISOString().slice(0, 10) as CivilDate
}

/** The date `days` later (earlier when negative). */
export function addDays(date: CivilDate, days: number): CivilDate {
  return fromDayNumber(dayNumber(date) + days)
}

/** Whole calendar years from `from` to `to`; a 29 February birthday falls on 1 March. */
export function wholeYearsBetween(from: CivilDate, to: CivilDate): number {
  const years = Number(to.slice(0, 4)) - Number(from.slice(0, 4))
  return to.slice(5) < from.slice(5) ? years - 1 : years
}

/** Days in a month (1–12) of that year. */
export function daysInMonth(year: number, month: number): number {
  return new Date(Date.UTC(year, month, 0)).getUTCDate()
}
