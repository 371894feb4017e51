import type { DeviceCertificate } from '@/lib/contracts/device-certificate'
import type { DeviceKey } from './device-key'

/** What makes this browser a crew device of one event; kept under `enrolment` in its store. */
export interface Enrolment {
  readonly certificate: string
  readonly says: DeviceCertificate
  readonly key: DeviceKey
}

/** Keys of the single values in a device's store; records are `r:<hash>`, notes `n:<hash>`, PINs `p:<person>`. */
export const KEYS = {
  enrolment: 'enrolment',
  /** deviceSeq and pass counter: moved on only together with what they numbered. */
  make: 'm:make',
  /** Where the device stands in the server's log. */
  pull: 'm:pull',
  unlocked: 'm:unlocked',
  snapshot: 's:snapshot',
  list: 's:list',
} as const

/** `m:make`. */
export interface MakeCounters {
  readonly deviceSeq: number
  readonly passCounter: number
}
export const NO_COUNTERS: MakeCounters = { deviceSeq: 0, passCounter: 0 }

/** `m:pull`. */
export interface PullState {
  readonly seq: number
  readonly chain: string
  readonly lastPullAt: number | null
  readonly lastPushAt: number | null
  /** Server time minus device clock, ms. */
  readonly offset: number
  /** The whole log was here once. */
  readonly loaded: boolean
  /** Latest device clock of any contact: a clock before it went backwards. */
  readonly latestWall: number
}
export const NO_PULL: PullState = { seq: 0, chain: '', lastPullAt: null, lastPushAt: null, offset: 0, loaded: false, latestWall: 0 }
