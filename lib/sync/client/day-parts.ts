import type { DaySnapshot } from '@/lib/contracts/day-snapshot'
import type { DayStatus } from './day-client'
import type { DayDisk } from './day-disk'
import type { DayEntries } from './day-entries'
import type { DayProblem } from './day-problem'
import type { DayTools } from './day-tools'
import type { DeviceStore, StoreRoom } from './device-store'
import type { Enrolment } from './enrolment'
import type { Loop } from './loop'
import type { KeptPhoto } from './day-photos'
import type { PhotoSending } from './photo-sending'
import type { PhotoShelf } from './photo-shelf'
import type { SyncTransport } from './sync-transport'
import type { Unlocking } from './unlocking'

/** What the parts of an open day share. */
export interface DayParts {
  readonly store: DeviceStore
  readonly tools: DayTools
  readonly transport: SyncTransport
  readonly enrolment: Enrolment
  readonly disk: DayDisk
  readonly cars: DayEntries
  /** The event as last loaded, with whoever was seated at the desk since. */
  readonly snapshot: () => DaySnapshot | null
  readonly hands: Unlocking
  readonly photos: PhotoShelf
  /** Waits to be sent, and a record names it. */
  readonly isPhotoDue: (photo: KeptPhoto) => boolean
  readonly sending: PhotoSending
  readonly day: () => string
  /** Something changed: whoever listens reads again. */
  readonly bump: () => void
  /** Resolves once all that other tabs have told of is taken in. */
  readonly heard: () => Promise<void>
  readonly now: DayNow
}

/** What is true of this page at this moment and lies on no disk. */
export interface DayNow {
  version: number
  room: StoreRoom
  link: DayStatus['link']
  busy: DayStatus['busy']
  problem: DayProblem | null
  loop: Loop | null
}
