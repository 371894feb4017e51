import type { Db } from '@/db/client'
import type { Book } from '@/lib/checklist/book'
import type { LogEntry } from '@/lib/inspection/log-entry'
import type { SubjectState } from '@/lib/inspection/state'
import type { SubjectKey } from '@/lib/inspection/subject'

/** What a record may have changed about an entry since its row was written. */
export interface EntryAsRecorded {
  readonly number: string
  readonly plateTail: string
  readonly group: string
}

/** An event's log as the board needs it. The log is the sync's own, so the route hands its reading in. */
export interface DayReading {
  /** Highest seq it reflects, and the venue day it is folded for. */
  readonly seq: number
  readonly day: string
  /** How a subject stands; one without a record stands at *not presented*. */
  readonly stateOf: (key: SubjectKey) => SubjectState
  /** Records of the subject whose permission was taken away and that nobody adopted. */
  readonly setAsideOf: (key: SubjectKey) => readonly LogEntry[]
  /** An entry as the records about it leave it; null for one of another event. */
  readonly entryNow: (entryId: string) => EntryAsRecorded | null
  readonly bookOf: (checklistHash: string, limitsHash: string) => Book | null
}

/** Reads the log at this instant; null where there is no such event. */
export type ReadDay = (database: Db, eventId: string, now: number) => DayReading | null
