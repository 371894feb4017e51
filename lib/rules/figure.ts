import type { Facts } from './judgement'
import { parseCivilDate } from './civil-date'
import { dateInWords } from './date-in-words'

/** A fact as text for a sentence; "?" where a record of another version does not hold it, so that a sentence never breaks. */
export function figure(facts: Facts, name: string): string {
  const value = facts[name]
  return value === undefined || value === null ? '?' : String(value)
}

/** A civil date among the facts, as `Sat 9 May 2026`; as it stands when it is no date. */
export function dateFigure(facts: Facts, name: string): string {
  const text = figure(facts, name)
  const date = parseCivilDate(text)
  return date === null ? text : dateInWords(date)
}

/** "1 year", "6 years". */
export function counted(count: string, one: string): string {
  return count === '1' ? `1 ${one}` : `${count} ${one}s`
}
