import type { CivilDate } from '@/lib/rules/civil-date'

export interface DatedEvent {
  readonly id: string
  readonly firstDay: string
  readonly lastDay: string
  /** The venue's day now: events are in different zones. */
  readonly today: CivilDate
}

/** The event somebody most likely means: one of today, else the next to come, else the last that was. Null without any. */
export function nearestEvent<E extends DatedEvent>(events: readonly E[]): E | null {
  const byDay = events.toSorted((a, b) => (a.firstDay < b.firstDay ? -1 : a.firstDay > b.firstDay ? 1 : a.id < b.id ? -1 : 1))
  const running = byDay.find(({ firstDay, lastDay, today }) => firstDay <= today && today <= lastDay)
  const coming = byDay.find(({ firstDay, today }) => firstDay > today)
  return running ?? coming ?? byDay.at(-1) ?? null
}
