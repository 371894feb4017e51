import { applicableChecks } from './applicable-checks'
import type { Book, BookCheck } from './book'
import type { CarFacts } from './car-facts'
import type { HoldReason, JudgedKind } from './checklist'
import { HOLD_TABLE, SOMETHING_ELSE, type HoldRow, type See } from './hold-table'

/** What a hold names for one subject, and what it cannot name. */
export interface ResolvedHold {
  readonly stations: readonly string[]
  readonly checks: readonly string[]
  /** To be looked at as well, in words: this checklist has nothing for it, so no answer of the walk can stand for it. */
  readonly alsoLook: readonly string[]
}

/**
 * What a line of the table comes to for one subject. `facts` are those of each `presented`; empty where there is none, and then everything may apply.
 *
 * A named station that yields no check leaves a hold to the chief alone (rule F5), so only stations are named that this subject has, and what the checklist
 * lacks is said in words instead. Where nothing of the line is found, nothing is named and only the chief lifts it: a hold never shrinks to none.
 */
export function resolveHold(row: HoldRow, part: JudgedKind, book: Book | null, facts: readonly CarFacts[]): ResolvedHold {
  const sees = row[part] ?? []
  if (book === null) return { stations: [], checks: [], alsoLook: sees.map(({ words }) => words) }
  const known = applicable(book, part, facts)
  const found = sees.map((see) => ({ see, ...findIn(see, known) }))
  const own = row.isChiefOnly ? null : ownReason(row.id, part, book)
  const has = (station: string) => known.some((check) => check.station === station)
  const stations = unique([...found.flatMap((one) => one.stations), ...(own?.stations.filter(has) ?? [])])
  const named = [...found.flatMap((one) => one.checks), ...(own?.checks.flatMap((id) => startingWith(id, known)) ?? [])]
  return {
    stations,
    // A check of a station that is named whole need not be named again.
    checks: unique(named.filter((check) => !stations.includes(check.station)).map(({ id }) => id)),
    alsoLook: found.filter((one) => one.stations.length + one.checks.length === 0 && !one.see.whereFitted).map(({ see }) => see.words),
  }
}

/** The lines that may be picked with this checklist: the table's, then the checklist's own under ids of its own, then *something else*. */
export function pickableHolds(book: Book | null): readonly HoldRow[] {
  const table = HOLD_TABLE.filter(({ by }) => by === 'crew')
  const others = (book?.checklist.holdReasons ?? []).filter(({ id }) => !HOLD_TABLE.some((row) => row.id === id))
  return [...table, ...others.map(asRow), SOMETHING_ELSE]
}

/** The line of a reason, as this checklist or the table knows it; null where neither does (a newer build's). */
export function holdRow(reason: string, book: Book | null): HoldRow | null {
  return HOLD_TABLE.find(({ id }) => id === reason) ?? pickableHolds(book).find(({ id }) => id === reason) ?? null
}

/** Why something is held, in words: the table's, the checklist's, or the id itself where neither knows it. */
export function holdWords(reason: string, book: Book | null): string {
  return holdRow(reason, book)?.words ?? reason.replaceAll('-', ' ')
}

function asRow({ id, text, subject }: HoldReason): HoldRow {
  const part = { car: null, person: null, [subject]: [] }
  const who = subject === 'person' ? ('who was in it' as const) : null
  return { ...SOMETHING_ELSE, ...part, id, words: text, who, isChiefOnly: false }
}

/** What the checklist itself names under this id. */
function ownReason(id: string, part: JudgedKind, book: Book): HoldReason | null {
  return book.checklist.holdReasons.find((reason) => reason.id === id && reason.subject === part) ?? null
}

function applicable(book: Book, part: JudgedKind, facts: readonly CarFacts[]): readonly BookCheck[] {
  const sets = (facts.length === 0 ? [{}] : facts).map((one) => applicableChecks(book, part, one))
  return [...new Set(sets.flat())]
}

interface Found {
  readonly stations: readonly string[]
  readonly checks: readonly BookCheck[]
}

function findIn(see: See, known: readonly BookCheck[]): Found {
  const stationsOf = (which: (check: BookCheck) => boolean): Found => ({
    stations: unique(known.filter(which).map(({ station }) => station)),
    checks: [],
  })
  switch (see.what) {
    case 'every-station':
      return stationsOf(() => true)
    case 'stations':
      return stationsOf(({ station }) => see.named.some((name) => station.startsWith(name)))
    case 'checks':
      return { stations: [], checks: see.named.flatMap((name) => startingWith(name, known)) }
    case 'perishable':
      return { stations: [], checks: known.filter(({ standing, required }) => !standing && required) }
    case 'tagged':
      return { stations: [], checks: known.filter(({ tags }) => tags?.includes(see.tag)) }
  }
}

/** The check itself, or each of its corners and places. */
function startingWith(id: string, known: readonly BookCheck[]): readonly BookCheck[] {
  return known.filter((check) => check.id === id || check.id === `${id}.${check.place}`)
}

function unique(ids: readonly string[]): readonly string[] {
  return [...new Set(ids)]
}
