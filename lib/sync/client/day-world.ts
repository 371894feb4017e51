import type { DayTools } from './day-tools'
import type { Enrolment } from './enrolment'
import type { NetworkEvents } from './loop'
import type { SyncTransport } from './sync-transport'

/** The world outside a day client: the browser's, or a test's. */
export interface DayWorld {
  readonly tools: DayTools
  readonly transport: (enrolment: Enrolment) => SyncTransport
  readonly network: NetworkEvents | null
}
