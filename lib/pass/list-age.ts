import type { PassList } from './pass-list'
import type { PitDevice } from './pit-device'

type Clock = Pick<PitDevice, 'now' | 'readBackAt'>

/** How old a list is, ms, counted from the last read-back that agreed with it (rule P5). Negative where the clock is before the list. */
export function listAge(list: Pick<PassList, 'at'>, { now, readBackAt }: Clock): number {
  return now - Math.max(list.at, readBackAt ?? list.at)
}

/**
 * Whether a list is too old to be relied on (rule P3). Asked the other way round, a limit or an instant that is no number would make any list a
 * fresh one.
 */
export function isStale(list: Pick<PassList, 'at'>, device: Clock & Pick<PitDevice, 'listStaleMinutes'>): boolean {
  return !(listAge(list, device) <= device.listStaleMinutes * 60_000)
}
