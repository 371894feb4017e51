import type { Db } from '@/db/client'
import type { event } from '@/db/schema'
import type { Verdict } from '@/lib/inspection/state'

type EventRow = typeof event.$inferSelect

/** What the pre-check says of an entry's newest signed declaration. */
export interface PreCheckRow {
  readonly entry: string
  readonly number: string
  readonly model: string
  readonly drivers: readonly string[]
  /** Null: nothing was signed. */
  readonly version: number | null
  readonly worries: readonly { readonly weight: 'fail' | 'advisory'; readonly prompt: string; readonly words: string }[]
}

/** How an entry stands at the end, and what is open on it, each in words. */
export interface ResultRow {
  readonly entry: string
  readonly verdict: Verdict
  readonly open: readonly string[]
}

/** Other features' readings, handed in: features never import each other. */
export type ReadPreChecks = (database: Db, own: EventRow, now: number) => readonly PreCheckRow[]
export type ReadResults = (database: Db, own: EventRow, now: number, entries: readonly string[]) => readonly ResultRow[]

export interface MailReaders {
  readonly preChecks: ReadPreChecks
  readonly results: ReadResults
}
