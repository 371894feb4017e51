import 'server-only'
import type { Db } from '@/db/client'
import type { Book } from '@/lib/checklist/book'
import { readDay, type DayLog } from '@/lib/inspection/day-log'
import { foldLog } from '@/lib/inspection/fold-subject'
import type { LogEntry } from '@/lib/inspection/log-entry'
import { isKnown } from '@/lib/inspection/record'
import { readOwn } from '@/lib/inspection/read-log'
import type { FoldContext, SubjectState } from '@/lib/inspection/state'
import { subjectKey, type SubjectKey } from '@/lib/inspection/subject'
import { entryNow, type ChangeableEntry } from '../core/entry-now'
import { eventFrame, foldContext, type EventFrame } from './event-frame'
import { eventLog, type EventLog } from './event-log'
import { pinnedBook } from './pinned-books'

/** An event's log read at one moment, for screens: every subject folded for the venue's day. */
export interface DayReading {
  readonly seq: number
  readonly day: string
  /** How a subject stands; one without a record stands at *not presented*. */
  readonly stateOf: (key: SubjectKey) => SubjectState
  /** Records of the subject whose permission was taken away and that nobody adopted. */
  readonly setAsideOf: (key: SubjectKey) => readonly LogEntry[]
  /** An entry as the records about it leave it; null for one of another event. */
  readonly entryNow: (entryId: string) => ChangeableEntry | null
  readonly bookOf: (checklistHash: string, limitsHash: string) => Book | null
}

interface Folded {
  readonly entries: readonly LogEntry[]
  readonly length: number
  readonly state: SubjectState
}

interface Kept {
  /** What every subject's state hangs on besides its own records. */
  readonly tag: string
  readonly folded: Map<SubjectKey, Folded>
}

const holder = globalThis as typeof globalThis & { lockwireReadings?: WeakMap<object, Map<string, Kept>> }
const NONE: readonly LogEntry[] = []

/** Reads an event's log; null where there is no such event. A subject is folded again only when it has a new record or the day has changed. */
export function dayReading(database: Db, eventId: string, now: number): DayReading | null {
  const read = database.$client.transaction(() => {
    const frame = eventFrame(database, eventId)
    return frame === null ? null : { frame, log: eventLog(database, eventId) }
  })()
  if (read === null) return null
  const { frame, log } = read
  const context = foldContext(database, frame, now)
  const folded = keptFor(database, eventId, tagOf(frame, log, context)).folded
  let day: DayLog | null = null
  const ofEvent = () => (day ??= readDay(log.bySubject.get(subjectKey({ event: eventId })) ?? NONE))
  return {
    seq: log.seq,
    day: context.day,
    stateOf: (key) => stateOf(key, log, folded, ofEvent, context),
    setAsideOf: (key) => setAsideIn(log.bySubject.get(key) ?? NONE),
    entryNow: (entryId) => entryAsRecorded(entryId, frame, log),
    bookOf: (checklistHash, limitsHash) => pinnedBook(database, checklistHash, limitsHash),
  }
}

function stateOf(
  key: SubjectKey,
  log: EventLog,
  folded: Map<SubjectKey, Folded>,
  ofEvent: () => DayLog,
  context: FoldContext,
): SubjectState {
  const entries = log.bySubject.get(key) ?? NONE
  const known = folded.get(key)
  // The same growing list as before, no longer than before; one read anew after a restore is another list.
  if (known !== undefined && known.entries === entries && known.length === entries.length) return known.state
  const state = foldLog(readOwn(entries, key), ofEvent(), context)
  folded.set(key, { entries, length: entries.length, state })
  return state
}

function setAsideIn(entries: readonly LogEntry[]): readonly LogEntry[] {
  const adopted = new Set(
    entries.flatMap(({ record, disposition }) =>
      isKnown(record) && record.kind === 'adopted' && disposition.state !== 'quarantined' ? [record.adopts] : [],
    ),
  )
  return entries.filter(({ hash, disposition }) => disposition.state === 'quarantined' && !adopted.has(hash))
}

function entryAsRecorded(entryId: string, frame: EventFrame, log: EventLog): ChangeableEntry | null {
  const entry = frame.entries.get(entryId)
  if (entry === undefined) return null
  const records = log.bySubject.get(subjectKey({ car: entryId })) ?? NONE
  return entryNow(
    entry,
    records.map(({ record, disposition }) => ({ record, quarantined: disposition.state === 'quarantined' })),
  )
}

function tagOf(frame: EventFrame, log: EventLog, { day }: FoldContext): string {
  return `${day} ${frame.event.snapshotVersion} ${log.eventVersion}`
}

function keptFor(database: Db, eventId: string, tag: string): Kept {
  holder.lockwireReadings ??= new WeakMap()
  const readings = holder.lockwireReadings.get(database.$client) ?? new Map<string, Kept>()
  holder.lockwireReadings.set(database.$client, readings)
  const known = readings.get(eventId)
  if (known?.tag === tag) return known
  const kept = { tag, folded: new Map<SubjectKey, Folded>() }
  readings.set(eventId, kept)
  return kept
}
