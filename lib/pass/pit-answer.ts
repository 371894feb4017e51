/** Every reason there is for HOLD or CHECK. A few stand under both: what matters is which list they come from. */
export type PitCode =
  | 'no-list'
  | 'foreign-code'
  | 'damaged-code'
  | 'mistyped-code'
  | 'band-scanned'
  | 'wrong-event'
  | 'unknown-key'
  | 'key-may-not-issue'
  | 'bad-signature'
  | 'unknown-entry'
  | 'unknown-number'
  | 'number-twice'
  | 'unknown-code'
  | 'code-twice'
  | 'wrong-day'
  | 'dead-pass'
  | 'quarantined-pass'
  | 'not-alive'
  | 'pass-differs'
  | 'number-differs'
  | 'blocked'
  | 'no-live-pass'
  | 'verdict'
  | 'nobody-named'
  | 'nobody-may-drive'
  | 'unnamed-aboard'
  | 'aboard-may-not'
  | 'no-driver-aboard'
  | 'no-passenger-seat'
  | 'list-stale'
  | 'list-other-day'
  | 'clock'
  | 'not-on-list'
  | 'conditions'
  | 'other-group'
  | 'no-group-set'
  | 'some-may-not'

/** One reason: a line or more of why, and what the marshal does about it. */
export interface PitReason {
  readonly code: PitCode
  readonly why: readonly string[]
  readonly todo: string
}

/** Somebody named for the car, and whether they may go out in it. */
export interface PitPerson {
  readonly person: string
  readonly name: string
  readonly bandNumber: string | null
  readonly drives: boolean
  readonly may: boolean
  /** Why not; empty when they may. */
  readonly why: string
}

/** What the pit exit says, and everything the marshal compares. Made by `decideAtPitExit`; no screen decides anything further. */
export interface PitAnswer {
  readonly answer: 'PASSED' | 'HOLD' | 'CHECK'
  /** Code of the first reason (`dead-pass`, `list-stale`); `passed` when there is none. */
  readonly code: PitCode | 'passed'
  /** Why, in words; one line each, most important first. */
  readonly why: readonly string[]
  /** What the marshal does now. */
  readonly todo: string
  /** What `why` and `todo` are made of: the holds of a HOLD, the doubts of a CHECK. */
  readonly reasons: readonly PitReason[]
  readonly number: string | null
  readonly plateTail: string | null
  readonly plate: string | null
  readonly colour: string | null
  readonly model: string | null
  readonly groupName: string | null
  readonly people: readonly PitPerson[]
  /** Null where no pass was found that says. */
  readonly passengerSeatUsable: boolean | null
  readonly entry: string | null
  readonly pass: string | null
}
