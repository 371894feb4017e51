import 'server-only'
import type { Db } from '@/db/client'
import type { Book } from '@/lib/checklist/book'
import type { LogEntry } from '@/lib/inspection/log-entry'
import { isKnown } from '@/lib/inspection/record'
import type { FoldContext, SubjectState } from '@/lib/inspection/state'
import { subjectKey, type SubjectKey } from '@/lib/inspection/subject'
import { assert } from '@/lib/platform/assert'
import { entryNow, type ChangeableEntry } from '../core/entry-now'
import { eventFrame, foldContext, type EventFrame } from './event-frame'
import { eventLog, type EventLog } from './event-log'
import { eventStates } from './event-states'
import { pinnedBook } from './pinned-books'

/** An event's log read at one moment, for screens: every subject folded for the venue's day. */
export interface DayReading {
  readonly seq: number
  readonly day: string
  /** How a subject stands; one without a record stands at *not presented*. */
  readonly stateOf: (key: SubjectKey) => SubjectState
  /** Records of the subject whose permission was taken away and that nobody adopted. */
  readonly setAsideOf: (key: SubjectKey) => readonly LogEntry[]
  /** Records of the subject and of the event itself. */
  readonly recordsOf: (key: SubjectKey) => readonly LogEntry[]
  /** An entry as the records about it leave it; null for one of another event. */
  readonly entryNow: (entryId: string) => ChangeableEntry | null
  readonly bookOf: (checklistHash: string, limitsHash: string) => Book | null
}

const NONE: readonly LogEntry[] = []

/** Reads an event's log; null where there is no such event. Subjects are folded when asked for, and again only when something of them changed. */
export function dayReading(database: Db, eventId: string, now: number): DayReading | null {
  const read = database.$client.transaction(() => {
    const frame = eventFrame(database, eventId)
    return frame === null ? null : { frame, log: eventLog(database, eventId) }
  })()
  if (read === null) return null
  const { frame, log } = read
  const context = foldContext(database, frame, now)
  return {
    seq: log.seq,
    day: context.day,
    stateOf: (key) => stateOf(key, frame, log, context),
    setAsideOf: (key) => setAsideIn(log.bySubject.get(key) ?? NONE),
    recordsOf: (key) => recordsOf(key, eventId, log),
    entryNow: (entryId) => entryAsRecorded(entryId, frame, log),
    bookOf: (checklistHash, limitsHash) => pinnedBook(database, checklistHash, limitsHash),
  }
}

function stateOf(key: SubjectKey, frame: EventFrame, log: EventLog, context: FoldContext): SubjectState {
  const state = eventStates(frame, log, [key], context).get(key)
  assert(state !== undefined, `asked how ${key} stands, which is no subject that is judged`)
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

function recordsOf(key: SubjectKey, eventId: string, log: EventLog): readonly LogEntry[] {
  const ofEvent = subjectKey({ event: eventId })
  const own = log.bySubject.get(key) ?? NONE
  return key === ofEvent ? own : [...own, ...(log.bySubject.get(ofEvent) ?? NONE)]
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
