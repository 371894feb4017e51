import type { Db } from '@/db/client'
import type { Book } from '@/lib/checklist/book'
import type { LogEntry } from '@/lib/inspection/log-entry'
import type { SubjectState } from '@/lib/inspection/state'
import type { SubjectKey } from '@/lib/inspection/subject'

/** An event's log as an entry's page needs it; the log is the sync's own, so the route hands its reading in. */
export interface DayReading {
  readonly stateOf: (key: SubjectKey) => SubjectState
  /** Records of the subject and of the event itself. */
  readonly recordsOf: (key: SubjectKey) => readonly LogEntry[]
  readonly entryNow: (entryId: string) => { readonly number: string; readonly plateTail: string; readonly group: string } | null
  readonly bookOf: (checklistHash: string, limitsHash: string) => Book | null
}

export type ReadDay = (database: Db, eventId: string, now: number) => DayReading | null
