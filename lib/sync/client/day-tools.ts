import type { Sha256Hex } from '../core/chain'

/** What the engine takes from the outside world, so that a test can be the world. */
export interface DayTools {
  /** Device clock, ms since the epoch. */
  readonly now: () => number
  /** A new UUIDv7. */
  readonly newId: () => string
  readonly sha256: Sha256Hex
  /** Random bytes for salts. */
  readonly randomBytes: (count: number) => Uint8Array<ArrayBuffer>
  /** 0 to 1, for jitter. */
  readonly random: () => number
  readonly setTimer: (work: () => void, ms: number) => unknown
  readonly clearTimer: (timer: unknown) => void
}
