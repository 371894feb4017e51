import type { DayProblem } from './day-problem'
import type { DeviceCheck } from './day-client'
import type { DeviceStore } from './device-store'
import type { Enrolment } from './enrolment'
import { dayProblem } from './problem-of'

/** Room a day needs with plenty to spare: 5,000 records and a photo-less snapshot are under 10 MB. */
export const ENOUGH_BYTES = 50_000_000
/** Below this a person is told before the next car, bytes. */
export const LITTLE_BYTES = 10_000_000
/** A clock further out than this is told to the person, ms. */
const CLOCK_LIMIT_MS = 120_000

/** Looks whether this device can be trusted to work for hours without the network. */
export async function checkDevice(store: DeviceStore, enrolment: Enrolment, loaded: boolean, offset: number | null): Promise<DeviceCheck> {
  const persisted = await store.persist()
  const room = await store.room()
  const problems: DayProblem[] = []
  if (!loaded) problems.push(dayProblem('not-loaded'))
  if (room.leftBytes !== null && room.leftBytes < ENOUGH_BYTES) problems.push(dayProblem('storage-low'))
  if (!persisted) problems.push(dayProblem('not-persisted'))
  if (offset !== null && Math.abs(offset) > CLOCK_LIMIT_MS) problems.push(dayProblem('clock-wrong'))
  if (!store.locksReachTabs) problems.push(dayProblem('no-web-locks'))
  return {
    readyOffline: loaded && (room.leftBytes === null || room.leftBytes >= LITTLE_BYTES / 2),
    persisted,
    leftBytes: room.leftBytes,
    webLocks: store.locksReachTabs,
    key: enrolment.key.kind,
    clockOffsetMs: offset,
    problems,
  }
}
