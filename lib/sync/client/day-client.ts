import type { Book } from '@/lib/checklist/book'
import type { DaySnapshot } from '@/lib/contracts/day-snapshot'
import type { LogEntry } from '@/lib/inspection/log-entry'
import type { RecordOf } from '@/lib/inspection/record'
import type { SubjectState } from '@/lib/inspection/state'
import type { SubjectKey } from '@/lib/inspection/subject'
import type { PassList } from '@/lib/pass/pass-list'
import type { PassPayload } from '@/lib/pass/pass-payload'
import type { Role } from '@/lib/permissions/policy'
import type { DayPhotos } from './day-photos'
import type { DayProblem } from './day-problem'
import type { Draft, DraftNote, SavedRecord } from './draft'

/**
 * One event's day on one device: everything the crew's screens read and write. They know no store, no network, no key.
 *
 * Reading is synchronous and from memory: `status()`, `state()`, `entries()`, `passList()` give the same object until something that it is made of
 * changes, so they may be used directly with `useSyncExternalStore` (hooks in `lib/sync/client/use-day.ts`).
 * Writing is `record()` and its two kin for passes and bands: one action, one transaction, saved or rejected whole (rule M1).
 *
 * Not its business: words for verdicts, what to ask next, how anything looks.
 */
export interface DayClient {
  /** Tells `listener` after any change; returns how to stop. */
  readonly subscribe: (listener: () => void) => () => void
  /** Moves on with every change; for memoising whatever is made of several reads. */
  readonly version: () => number
  readonly status: () => DayStatus

  /** The event as last loaded; null before the day was loaded. */
  readonly snapshot: () => DaySnapshot | null
  /** Cars of the event with all that this device's records changed about them, in the organiser's order. Empty before the day was loaded. */
  readonly entries: () => readonly DayEntry[]
  readonly entry: (entry: string) => DayEntry | null
  /** How a car (`car:<entry>`), a person (`person:<id>`) or a fit (`fit:<entry>:<person>`) stands; folded again only when its records or the day changed. */
  readonly state: (key: SubjectKey) => SubjectState
  /** All records of a subject that this device holds, in the order they count: for its history. */
  readonly log: (key: SubjectKey) => readonly LogEntry[]
  /** Where a wet switch, ended session or the like stands: the records about the event itself. */
  readonly dayLog: () => readonly LogEntry[]
  /** An opened checklist with its limits; without hashes the ones in force. Null where this device has not loaded them. */
  readonly book: (checklistHash?: string, limitsHash?: string) => Book | null
  /** The server's list, overlaid with the blocks, kills and new passes of this device's own log; null before the first pull. */
  readonly passList: () => PassList | null
  /** Text of a note by its hash; null when it was erased or has not come. */
  readonly note: (hash: string) => string | null

  /**
   * Saves what one action says, as one or more records: all or none. Resolves once they are on the disk; only then may "Saved" be shown (rule M1).
   * Rejects with a `DayError` (codes `storage-full`, `storage-failed`, `locked`, `not-allowed`, `not-loaded`, `no-key`, `unreadable-draft`); then
   * nothing of it was saved, and the screen keeps what was entered.
   */
  readonly record: <const D extends readonly Draft[]>(drafts: D, notes?: readonly DraftNote[]) => Promise<SavedRecords<D>>
  /** Issues a pass for a car that stands at passed or passed with advisories (else `not-passed`); it replaces this car's live ones and answers all it must. */
  readonly issuePass: (request: IssuePass) => Promise<Issued<'pass'>>
  /** Issues a band for a person who stands at passed or passed with advisories (else `not-passed`). */
  readonly issueBand: (request: IssueBand) => Promise<Issued<'band'>>

  readonly photos: DayPhotos

  /** Who may be unlocked here: the people of this device's enrolment. */
  readonly people: () => readonly DevicePerson[]
  /** Sets a person's six digits on this device. The PIN says who holds the phone; it protects nothing (rule M3). */
  readonly setPin: (person: string, pin: string) => Promise<void>
  /** Rejects with `wrong-pin`. Stays unlocked over a reload for up to `UNLOCKED_FOR_MS`, and less when nobody touches it for `IDLE_FOR_MS`. */
  readonly unlock: (person: string, pin: string) => Promise<void>
  readonly lock: () => Promise<void>
  /** To be told of taps, so that the idle time starts anew; cheap. */
  readonly touched: () => void

  /** Pulls the whole day, checks the device, and says how far it is. Rejects with `offline`, `storage-full` …; what was loaded stays. */
  readonly loadDay: (progress?: (progress: LoadProgress) => void) => Promise<DeviceCheck>
  /** Sends what is unsent, once. Never rejects: the outcome says what happened. */
  readonly push: () => Promise<DrainOutcome>
  readonly pull: () => Promise<DrainOutcome>
  /** Push, then pull, until both have nothing left or fail. */
  readonly drain: () => Promise<DrainOutcome>
  /** Keeps the device in step by itself (live, on coming online, by polling); returns how to stop. Safe to call in every tab. */
  readonly start: () => () => void

  /** Records the server would not take: they stay here until sent or discarded. */
  readonly attention: () => readonly NeedsAttention[]
  /** Tries one of them again with the next push. */
  readonly retry: (id: string) => Promise<void>
  /** Throws one of them away for good; `typed` must be `DISCARD_WORDS`, else rejects with `wrong-words`. */
  readonly discard: (id: string, typed: string) => Promise<void>
  readonly close: () => void
}

/** What a person types to throw away a record that was never sent (rule S6). */
export const DISCARD_WORDS = 'discard'
/** Longest time a person stays unlocked, reloads included. */
export const UNLOCKED_FOR_MS = 4 * 3_600_000
/** Without a tap for this long the device locks. */
export const IDLE_FOR_MS = 20 * 60_000

export interface DayStatus {
  readonly event: {
    readonly id: string
    readonly name: string
    readonly venue: string
    readonly firstDay: string
    readonly lastDay: string
  } | null
  readonly device: { readonly id: string; readonly name: string; readonly kid: number }
  /** Venue day by the corrected clock (`2026-05-09`); the event's first day before it and its last after it are not clamped. */
  readonly day: string
  readonly loaded: boolean
  readonly unlocked: DevicePerson | null
  readonly unsent: number
  /** Device clock, ms, of the oldest unsent record; null when all is sent. */
  readonly unsentSince: number | null
  /** Photographs that a record names and the server does not have yet. */
  readonly photosUnsent: number
  readonly needsAttention: number
  readonly lastPullAt: number | null
  readonly lastPushAt: number | null
  /** Server seq up to which this device holds the log. */
  readonly seq: number
  /** Server time the pass list was made, corrected to this clock, ms; null without one. Its age is now minus this. */
  readonly listMadeAt: number | null
  /** Server time minus device clock, ms, as last known. */
  readonly clockOffset: number
  /** The device clock was set back since the last contact: the pit exit answers CHECK. */
  readonly clockWentBackwards: boolean
  readonly link: 'live' | 'polling' | 'offline'
  readonly busy: 'pushing' | 'pulling' | 'loading' | null
  readonly storage: { readonly leftBytes: number | null; readonly persisted: boolean | null }
  /** The worst thing a person has to know now; null when all is well. */
  readonly problem: DayProblem | null
}

export interface DevicePerson {
  readonly id: string
  readonly name: string
  readonly roles: readonly Role[]
  readonly hasPin: boolean
}

export type DayEntry = DaySnapshot['entries'][number] & { readonly groupName: string; readonly changedHere: boolean }

export type SavedRecords<D extends readonly Draft[]> = { readonly [I in keyof D]: SavedRecord<RecordOf<D[I]['kind']>> }

export interface IssuePass {
  readonly entry: string
  readonly passengerSeatUsable: boolean
  readonly shown?: { readonly number: string; readonly plateTail: string }
}

export interface IssueBand {
  readonly person: string
  readonly bandNumber: string
}

export interface Issued<K extends 'pass' | 'band'> {
  readonly saved: SavedRecord<RecordOf<K>>
  readonly payload: PassPayload
  /** The token's base32 text, and the text of its QR code. */
  readonly token: string
  readonly qrText: string
  readonly typedCode: string
}

export interface LoadProgress {
  readonly step: 'event' | 'records' | 'checklists' | 'device' | 'done'
  readonly records: number
  readonly entries: number
  readonly of: number | null
}

/** What this device can do, said to the person before they walk out of the signal. */
export interface DeviceCheck {
  readonly readyOffline: boolean
  readonly persisted: boolean | null
  readonly leftBytes: number | null
  readonly webLocks: boolean
  readonly key: 'device' | 'software' | 'none'
  readonly clockOffsetMs: number | null
  /** Worst first; each with what to do. Empty when all is well. */
  readonly problems: readonly DayProblem[]
}

export type DrainOutcome =
  | { readonly state: 'done'; readonly sent: number; readonly received: number }
  | { readonly state: 'other-tab' }
  | { readonly state: 'failed'; readonly problem: DayProblem; readonly sent: number; readonly received: number }

export interface NeedsAttention {
  readonly id: string
  readonly kind: string
  readonly subject: SubjectKey
  readonly at: number
  readonly code: string
  readonly why: string
}
