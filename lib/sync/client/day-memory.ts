import type { Book } from '@/lib/checklist/book'
import type { DaySnapshot } from '@/lib/contracts/day-snapshot'
import { foldSubject } from '@/lib/inspection/fold-subject'
import type { LogEntry } from '@/lib/inspection/log-entry'
import { isKnown, type AnyRecord, type RecordOf } from '@/lib/inspection/record'
import type { FoldContext, SubjectState } from '@/lib/inspection/state'
import { subjectKey, type SubjectKey } from '@/lib/inspection/subject'
import { logEntryOf, sendingOrder, type StoredRecord } from '../core/held-record'
import { openPinnedBook } from '../core/open-pinned-book'

/** All this device holds of the day, opened: what is read many times a second and never waits for the disk. */
export interface DayMemory {
  readonly stored: ReadonlyMap<string, StoredRecord>
  readonly snapshot: () => DaySnapshot | null
  readonly setSnapshot: (snapshot: DaySnapshot | null) => void
  /** Takes records in, new or changed. */
  readonly put: (records: readonly StoredRecord[]) => void
  readonly remove: (hash: string) => void
  readonly clear: () => void
  readonly log: (key: SubjectKey) => readonly LogEntry[]
  readonly state: (key: SubjectKey, day: string) => SubjectState
  /** Whether a record held here names this photograph. */
  readonly namesPhoto: (hash: string) => boolean
  /** Records that seated somebody who was new: their names are notes. The same list until another comes. */
  readonly newcomers: () => readonly RecordOf<'entry-changed'>[]
  /** Moves on with each change of this subject or of the event itself. */
  readonly versionOf: (key: SubjectKey) => string
  readonly book: (checklistHash: string, limitsHash: string) => Book | null
  /** The server's numbers of all records of these subjects and of the event itself; null for those it has not numbered. */
  readonly seqs: (keys: readonly SubjectKey[]) => Iterable<number | null>
}

interface Shelf {
  readonly records: Map<string, { readonly stored: StoredRecord; readonly entry: LogEntry }>
  version: number
  log: readonly LogEntry[] | null
}

const NOTHING: readonly LogEntry[] = []

export function dayMemory(): DayMemory {
  const stored = new Map<string, StoredRecord>()
  const shelves = new Map<SubjectKey, Shelf>()
  const folded = new Map<SubjectKey, { readonly tag: string; readonly state: SubjectState }>()
  const books = new Map<string, Book | null>()
  const photos = new Set<string>()
  let newcomers: ReadonlyMap<string, RecordOf<'entry-changed'>> = new Map()
  let newcomersRead: readonly RecordOf<'entry-changed'>[] = []
  let snapshot: DaySnapshot | null = null
  let declared: ReadonlySet<SubjectKey> = new Set()
  let snapshots = 0

  function shelfOf(key: SubjectKey): Shelf {
    const known = shelves.get(key)
    if (known !== undefined) return known
    const made: Shelf = { records: new Map(), version: 0, log: null }
    shelves.set(key, made)
    return made
  }

  function put(records: readonly StoredRecord[]): void {
    for (const record of records) {
      const entry = logEntryOf(record)
      stored.set(record.hash, record)
      // No record at all: kept on the disk and sent on, read by nobody.
      if (entry === null) continue
      for (const hash of photosOf(entry.record)) photos.add(hash)
      if (seatsSomebodyNew(entry.record) && !newcomers.has(record.hash)) setNewcomers(new Map(newcomers).set(record.hash, entry.record))
      const shelf = shelfOf(subjectKey(entry.record.subject))
      shelf.records.set(record.hash, { stored: record, entry })
      shelf.version += 1
      shelf.log = null
    }
  }

  function setNewcomers(next: ReadonlyMap<string, RecordOf<'entry-changed'>>): void {
    newcomers = next
    newcomersRead = [...next.values()]
  }

  function remove(hash: string): void {
    stored.delete(hash)
    if (newcomers.has(hash)) setNewcomers(new Map([...newcomers].filter(([other]) => other !== hash)))
    for (const shelf of shelves.values()) {
      if (!shelf.records.delete(hash)) continue
      shelf.version += 1
      shelf.log = null
    }
  }

  function log(key: SubjectKey): readonly LogEntry[] {
    const shelf = shelves.get(key)
    if (shelf === undefined) return NOTHING
    shelf.log ??= [...shelf.records.values()].sort((a, b) => sendingOrder(a.stored, b.stored)).map(({ entry }) => entry)
    return shelf.log
  }

  function* seqs(keys: readonly SubjectKey[]): Iterable<number | null> {
    for (const key of [...keys, eventKey()]) for (const { stored: record } of shelves.get(key)?.records.values() ?? []) yield record.seq
  }

  function eventKey(): SubjectKey {
    return snapshot === null ? 'event:' : subjectKey({ event: snapshot.event.id })
  }

  function versionOf(key: SubjectKey): string {
    return `${shelves.get(key)?.version ?? 0}.${shelves.get(eventKey())?.version ?? 0}.${snapshots}`
  }

  function book(checklistHash: string, limitsHash: string): Book | null {
    const name = `${checklistHash} ${limitsHash}`
    const known = books.get(name)
    if (known !== undefined) return known
    const opened = snapshot === null ? null : openPinnedBook(snapshot, checklistHash, limitsHash)
    books.set(name, opened)
    return opened
  }

  function state(key: SubjectKey, day: string): SubjectState {
    const tag = `${versionOf(key)} ${day}`
    const known = folded.get(key)
    if (known?.tag === tag) return known.state
    const context: FoldContext = { day, lastDay: snapshot?.event.lastDay ?? day, declared, openBook: book }
    const made = foldSubject([...log(key), ...log(eventKey())], key, context)
    folded.set(key, { tag, state: made })
    return made
  }

  function setSnapshot(next: DaySnapshot | null): void {
    snapshot = next
    snapshots += 1
    books.clear()
    declared = new Set(next?.entries.filter((entry) => entry.declaration !== null).map((entry) => subjectKey({ car: entry.id })) ?? [])
  }

  function clear(): void {
    stored.clear()
    setNewcomers(new Map())
    // The shelves stay, emptied and moved on: a fold made from them must not be taken for current.
    for (const shelf of shelves.values()) {
      shelf.records.clear()
      shelf.version += 1
      shelf.log = null
    }
  }

  return {
    stored,
    snapshot: () => snapshot,
    setSnapshot,
    put,
    remove,
    clear,
    log,
    state,
    namesPhoto: (hash) => photos.has(hash),
    newcomers: () => newcomersRead,
    versionOf,
    book,
    seqs,
  }
}

/** Whether somebody was seated by it who had no row yet: then its one note is their name. */
function seatsSomebodyNew(record: AnyRecord): record is RecordOf<'entry-changed'> {
  if (!isKnown(record) || record.kind !== 'entry-changed' || record.change.what !== 'people') return false
  return record.change.seated !== undefined && record.notes?.length === 1
}

/** What was photographed: what a finding shows, and the sheet that was keyed in from paper. */
function photosOf(record: AnyRecord): readonly string[] {
  if (!isKnown(record)) return []
  const sheet = 'paper' in record ? record.paper?.sheet : undefined
  return [...('photos' in record ? (record.photos ?? []) : []), ...(sheet === undefined ? [] : [sheet])]
}
