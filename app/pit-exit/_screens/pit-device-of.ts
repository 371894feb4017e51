import type { DaySnapshot } from '@/lib/contracts/day-snapshot'
import type { PassList } from '@/lib/pass/pass-list'
import type { PitBlock, PitDevice } from '@/lib/pass/pit-device'
import type { DayStatus } from '@/lib/sync/client/day-client'
import type { PitMemory } from './pit-memory'

/** The organiser's limit while the event itself has not been loaded, min. */
const STALE_MINUTES = 30

/**
 * What this device knows besides the list, from its clock, the event and what the marshal told it. `clock` is the device's own, ms; `recalls` are those its
 * clock alone makes due.
 */
export function pitDeviceOf(
  clock: number,
  status: DayStatus,
  snapshot: DaySnapshot | null,
  list: PassList | null,
  memory: PitMemory,
  recalls: readonly PitBlock[] = [],
): PitDevice {
  const agreed = memory.readBacks.filter(({ agrees }) => agrees).map(({ at }) => at)
  return {
    now: clock + status.clockOffset,
    day: status.day,
    timeZone: snapshot?.event.timeZone ?? 'UTC',
    clockWentBackwards: status.clockWentBackwards,
    listStaleMinutes: snapshot?.event.listStaleMinutes ?? STALE_MINUTES,
    readBackAt: agreed.length > 0 ? Math.max(...agreed) : null,
    runningGroup: memory.runningGroup,
    blocks: [...recalls, ...heardBlocks(memory, list)],
  }
}

/** Numbers heard on the radio stop a car until a list that was made later says what became of it. */
function heardBlocks({ readBacks }: PitMemory, list: PassList | null): readonly PitBlock[] {
  const newer = readBacks.filter(({ at }) => list === null || at > list.at)
  return newer.flatMap(({ at, numbers }) =>
    numbers.map((number): PitBlock => ({ about: { number }, words: 'Named on the radio as not to run', at })),
  )
}
