import type { Verdict } from '@/lib/inspection/state'
import type { PassId } from './pass-payload'

/**
 * The pass list: the server's result per entry and per pass, as the pit exit needs it. It only grows (rule F8):
 * an entry or pass once on it stays, its state changes.
 */
export interface PassList {
  /** Highest server seq it reflects; "list 14" on the screen is `version`. */
  readonly seq: number
  readonly version: number
  /** Server time it was made, ms. */
  readonly at: number
  readonly eventCode: number
  readonly day: string
  readonly entries: readonly ListedEntry[]
  readonly keys: readonly ListedKey[]
}

export interface ListedEntry {
  readonly entry: string
  /** The number in the token. */
  readonly code: number
  readonly number: string
  readonly plate: string
  readonly plateTail: string
  readonly colour: string
  readonly model: string
  readonly group: string
  readonly groupName: string
  readonly verdict: Verdict
  /** Blocks in words the marshal reads, newest first; empty when nothing stops it. */
  readonly blocks: readonly ListedBlock[]
  readonly passes: readonly ListedPass[]
  readonly people: readonly ListedPerson[]
}

/** Stands in `seeAgain` of a block that nothing seen again ends. */
export const CHIEF_ONLY = 'only the chief lifts it'

export interface ListedBlock {
  readonly kind: 'withdrawn' | 'hold' | 'recall' | 'fail' | 'wet' | 'unknown' | 'verdict'
  /** `fluid dropped`, `shoulder straps: too steep`. */
  readonly words: string
  /** What is to be seen again, by station title; `CHIEF_ONLY` alone where no look ends it. */
  readonly seeAgain: readonly string[]
  /** What whoever stands at the car must do besides (quarantine); absent in the list of an older build. */
  readonly warning?: string
  readonly at: number | null
  readonly stickerRemoved: boolean | null
}

export interface ListedPass {
  readonly id: PassId
  readonly typedCode: string
  readonly state: 'live' | 'dead' | 'quarantined' | 'printed-ahead'
  readonly why: string
  readonly validFrom: string
  readonly days: number
  readonly conditions: readonly string[]
  readonly passengerSeatUsable: boolean
}

export interface ListedPerson {
  readonly person: string
  readonly name: string
  readonly role: 'driver' | 'passenger' | 'instructor'
  readonly bandNumber: string | null
  readonly band: 'live' | 'dead' | 'none' | 'held'
  /** Why there is no live band or why the fit bars them; empty when nothing does. */
  readonly why: string
  readonly fit: 'not-asked' | 'passed' | 'open' | 'failed'
}

export interface ListedKey {
  readonly kid: number
  /** Raw Ed25519 public key, base64url. */
  readonly publicKey: string
  /** Whether this device was ever allowed to issue passes; bands are no business of the pit exit's scanner. */
  readonly mayIssue: boolean
  readonly state: 'active' | 'retired' | 'lost'
}
