import type { KnownRecord, RecordKind, RecordOf } from '@/lib/inspection/record'

/** What the client fills in by itself when a record is made (rules M1, M3, M5); a screen cannot set it. */
type FilledIn = 'v' | 'id' | 'event' | 'device' | 'deviceSeq' | 'actor' | 'at' | 'offset' | 'day' | 'seen'
/** What the client works out from the subject's state where the screen does not say it. */
type WorkedOut = 'basis' | 'answers' | 'shown' | 'effect'

/** Read-only all the way down, so that a draft may be a constant. */
type Frozen<T> = T extends readonly (infer E)[] ? readonly Frozen<E>[] : T extends object ? { readonly [P in keyof T]: Frozen<T[P]> } : T

/**
 * A record of kind `K` before it is one: what was seen, without envelope.
 *
 * - `effect` follows from the kind and its outcome (`effectOf`); leave it away.
 * - `basis` and `answers` are worked out by rule M5 from all this device holds at the moment of saving; leave them away, unless the person
 *   names heads by hand (a chief's ruling on some of several).
 * - `shown` is number and plate tail as this client's `entries()` give them at the moment of saving. A screen that was drawn earlier and kept open passes
 *   what *it* showed, so that a change of number in between is noticed (case 18).
 */
export type DraftOf<K extends RecordKind> = Frozen<Omit<RecordOf<K>, FilledIn | WorkedOut> & Partial<Pick<RecordOf<K>, WorkedOut>>>

/** Any draft. Written as a plain object: `{ kind: 'finding', subject: { car }, check: 'brakes.pads', outcome: 'ok' }`. */
export type Draft = { [K in RecordKind]: DraftOf<K> }[RecordKind]

/** Free text that goes with an action. `ref` is a name of the caller's choosing; put `note:<ref>` where the draft wants the text's hash. */
export interface DraftNote {
  readonly ref: string
  readonly text: string
}

/** A record that is on this device's disk for good, before any server has heard of it. */
export interface SavedRecord<R extends KnownRecord = KnownRecord> {
  readonly id: string
  /** SHA-256 of its JWS, hex: what `basis`, `answers`, `voids` and `holds` of later records name. */
  readonly hash: string
  readonly record: R
}
