import type { DayClient } from '@/lib/sync/client/day-client'

/** Who made a record, by name, as far as this device knows. */
export function crewName(day: DayClient, actor: string): string {
  return day.snapshot()?.crew.find(({ id }) => id === actor)?.name ?? 'somebody of the crew'
}
