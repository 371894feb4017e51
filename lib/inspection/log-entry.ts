import type { AnyRecord } from './record'

/**
 * Why the server took a record's permission away (rule T1). `unknown-enrolment` alone has no effect at all:
 * nobody vouches for the key, so not even its stops count.
 */
export type QuarantineCode =
  | 'wrong-role'
  | 'device-retired'
  | 'device-lost'
  | 'milder-than-rule'
  | 'unseen-of-another'
  | 'shown-differs'
  | 'unknown-enrolment'
  | 'not-all-heads-named'

/** `provisional` is a device's own record before the server has answered; it counts as accepted would (the same `can()` decided). */
export type Disposition =
  { readonly state: 'accepted' } | { readonly state: 'provisional' } | { readonly state: 'quarantined'; readonly code: QuarantineCode }

/** One line of the log as the fold reads it: the record, the SHA-256 of its JWS, and what the server said of it. */
export interface LogEntry {
  readonly hash: string
  readonly record: AnyRecord
  readonly disposition: Disposition
}
