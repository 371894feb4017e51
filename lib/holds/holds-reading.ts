import type { Db } from '@/db/client'
import type { Book } from '@/lib/checklist/book'
import type { LogEntry } from '@/lib/inspection/log-entry'
import type { SubjectState } from '@/lib/inspection/state'
import type { SubjectKey } from '@/lib/inspection/subject'

/** An event's log as the list of holds needs it. The log is the sync's own, so the route hands its reading in. */
export interface HoldsReading {
  readonly day: string
  readonly stateOf: (key: SubjectKey) => SubjectState
  /** Records of the subject and of the event itself. */
  readonly recordsOf: (key: SubjectKey) => readonly LogEntry[]
  readonly entryNow: (entryId: string) => { readonly number: string } | null
  readonly bookOf: (checklistHash: string, limitsHash: string) => Book | null
}

/** Reads the log at this instant; null where there is no such event. */
export type ReadHolds = (database: Db, eventId: string, now: number) => HoldsReading | null
