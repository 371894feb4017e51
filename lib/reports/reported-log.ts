import type { Book } from '@/lib/checklist/book'
import type { AnyRecord } from '@/lib/inspection/record'

/** A record with where it lies in the log; the sync's own reading is handed in by the route. */
export interface ReportedRecord {
  readonly seq: number
  readonly jws: string
  readonly hash: string
  readonly chain: string
  readonly disposition: 'accepted' | 'quarantined'
  readonly code: string | null
  readonly receivedAt: number
  readonly record: AnyRecord
}

/** What a line needs besides its record. */
export interface ReportWords {
  readonly timeZone: string
  /** Names of people by id. */
  readonly people: ReadonlyMap<string, string>
  readonly devices: ReadonlyMap<string, string>
  /** For prompts, reasons and stations; null where the checklist cannot be opened. */
  readonly book: Book | null
}
