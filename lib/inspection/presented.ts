import { applicableChecks, askedChecks } from '@/lib/checklist/applicable-checks'
import type { Book, BookCheck } from '@/lib/checklist/book'
import { DEPTHS, type Depth } from '@/lib/checklist/checklist'
import type { ReadEntry, SubjectLog } from './read-log'
import type { RecordOf } from './record'
import type { FoldContext } from './state'
import type { SubjectKind } from './subject'

export type PresentedEntry = ReadEntry<RecordOf<'presented'>>

/** What the `presented` records of a subject come to: which checks there are, which apply, which are asked (rules F3, F12). */
export interface Presented {
  /** Every one that is believed, replaced or not. */
  readonly all: readonly PresentedEntry[]
  readonly heads: readonly PresentedEntry[]
  readonly depth: Depth | null
  /** Checks of the books the heads pin, by id; one definition a book. In checklist order. */
  readonly definitions: ReadonlyMap<string, readonly BookCheck[]>
  /** Checks that apply under any head, whatever the depth. */
  readonly applicable: ReadonlySet<string>
  /** Checks that any head requires at its depth. */
  readonly required: ReadonlySet<string>
  /** The heads are there and their books are at hand; otherwise nothing can be derived and nothing passes. */
  readonly isDerivable: boolean
}

/** Reads the `presented` records: the heads are those that no other names in its `basis`. */
export function readPresented(log: SubjectLog, kind: SubjectKind, context: FoldContext): Presented {
  const all = log.of('presented').filter((entry) => entry.isFull)
  const named = new Set(all.flatMap((entry) => entry.record.basis))
  const heads = all.filter((entry) => !named.has(entry.hash))
  const applicable = new Set<string>()
  const required = new Set<string>()
  const books = new Set<Book>()
  let isDerivable = heads.length > 0 && kind !== 'event'
  for (const { record } of heads) {
    const book = context.openBook(record.checklist, record.limits)
    if (!book || kind === 'event') {
      isDerivable = false
      continue
    }
    books.add(book)
    for (const check of applicableChecks(book, kind, record.facts)) applicable.add(check.id)
    for (const check of askedChecks(book, kind, record.facts, record.depth)) if (check.required) required.add(check.id)
  }
  const definitions = definitionsIn([...books], kind)
  return { all, heads, depth: deepest(heads), definitions, applicable, required, isDerivable }
}

function definitionsIn(books: readonly Book[], kind: SubjectKind): ReadonlyMap<string, readonly BookCheck[]> {
  const definitions = new Map<string, BookCheck[]>()
  for (const book of books) {
    for (const check of book.checks) {
      if (check.subject !== kind) continue
      const known = definitions.get(check.id)
      if (known) known.push(check)
      else definitions.set(check.id, [check])
    }
  }
  return definitions
}

function deepest(heads: readonly PresentedEntry[]): Depth | null {
  const ranks = heads.map(({ record }) => DEPTHS.indexOf(record.depth))
  return ranks.length === 0 ? null : (DEPTHS[Math.max(...ranks)] ?? null)
}

/** The checks that apply under this one `presented`; null where its book is not at hand. */
export function checksUnder({ record }: PresentedEntry, kind: SubjectKind, context: FoldContext): readonly BookCheck[] | null {
  const book = context.openBook(record.checklist, record.limits)
  return book && kind !== 'event' ? applicableChecks(book, kind, record.facts) : null
}

/** What a `presented` pins, as one text that two equal pins share (rule F7). */
export function pinsOf({ record }: PresentedEntry): string {
  const facts = Object.entries(record.facts).sort(([a], [b]) => (a < b ? -1 : 1))
  const { declaration } = record
  return JSON.stringify([record.checklist, record.limits, declaration && [declaration.id, declaration.version], facts, record.depth])
}
