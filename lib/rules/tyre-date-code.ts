import type { CivilDate } from './civil-date'
import { tyreWeekStart } from './tyre-week'

/** What the marking on a sidewall says of the week the tyre was made. */
export type TyreDateCode =
  | { readonly kind: 'empty' }
  /** Four digits, WWYY, from 2000 on. */
  | { readonly kind: 'week'; readonly week: number; readonly year: number; readonly start: CivilDate }
  /** Three digits, WWY, before 2000; the decade is not said. */
  | { readonly kind: 'before-2000'; readonly week: number }
  | { readonly kind: 'no-such-week'; readonly week: number; readonly year: number | null }
  /** Letters that no marking uses; `suggestion` is what was probably meant, null where that reads as nothing either. */
  | { readonly kind: 'letters-never-used'; readonly suggestion: string | null }
  /** A marking without its date: the other sidewall carries it. */
  | { readonly kind: 'no-date' }
  | { readonly kind: 'unreadable' }

const SEPARATORS = /[\s\-\u2010-\u2015]+/g
const MISREAD: Readonly<Record<string, string>> = { O: '0', Q: '0', I: '1', Z: '2', S: '5', G: '6' }

/**
 * Reads a date code (3 or 4 digits) or a whole identification number with or without "DOT": 13 symbols (new), 8–12 (older), 7 (retread or
 * old), 7–11 ending in three digits (before 2000). Case, spaces and hyphens do not matter. An older number of up to 11 symbols that ends in four
 * digits is read as WWYY; nothing in the marking itself tells that apart from a maker's code that ends in a digit before three more.
 */
export function readTyreDateCode(text: string): TyreDateCode {
  const symbols = text.toUpperCase().replace(SEPARATORS, '').replace(/^DOT/, '')
  if (symbols === '') return { kind: 'empty' }
  if (!/^[A-Z0-9]+$/.test(symbols)) return { kind: 'unreadable' }
  if (/[GIOQSZ]/.test(symbols)) return { kind: 'letters-never-used', suggestion: suggestionFor(symbols) }
  return readSymbols(symbols)
}

function suggestionFor(symbols: string): string | null {
  const suggestion = symbols.replace(/[GIOQSZ]/g, (letter) => MISREAD[letter] ?? letter)
  const read = readSymbols(suggestion).kind
  return read === 'week' || read === 'before-2000' ? suggestion : null
}

function readSymbols(symbols: string): TyreDateCode {
  const { length } = symbols
  const isNumber = length >= 7 && length <= 13
  if (!isNumber && length !== 3 && length !== 4) return { kind: 'unreadable' }
  if (/\d{4}$/.test(symbols)) return weekAndYear(symbols.slice(-4))
  const hasThree = length === 3 || (isNumber && length <= 11)
  if (hasThree && /\d{3}$/.test(symbols)) return weekBefore2000(symbols.slice(-3))
  return { kind: isNumber ? 'no-date' : 'unreadable' }
}

function weekAndYear(digits: string): TyreDateCode {
  const [week, year] = [Number(digits.slice(0, 2)), 2000 + Number(digits.slice(2))]
  const start = tyreWeekStart(year, week)
  return start === null ? { kind: 'no-such-week', week, year } : { kind: 'week', week, year, start }
}

function weekBefore2000(digits: string): TyreDateCode {
  const week = Number(digits.slice(0, 2))
  return week < 1 || week > 53 ? { kind: 'no-such-week', week, year: null } : { kind: 'before-2000', week }
}
