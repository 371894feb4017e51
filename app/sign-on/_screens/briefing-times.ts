import { clockTime } from '@/app/_crew/say-when'
import type { DaySnapshot } from '@/lib/contracts/day-snapshot'

export interface BriefingTime {
  /** `08:15`, at the venue. */
  readonly time: string
  /** `08:15, Novice`; a briefing of everybody has its time alone. */
  readonly label: string
  /** Null: everybody's. */
  readonly group: string | null
}

/** The briefings of that venue day by the timetable, in order of time. */
export function briefingTimes(snapshot: DaySnapshot, day: string): readonly BriefingTime[] {
  const names = new Map(snapshot.groups.map(({ id, name }) => [id, name]))
  return snapshot.timetable
    .filter((block) => block.kind === 'briefing' && block.day === day)
    .map(({ startsAt, group }) => {
      const time = clockTime(startsAt, snapshot.event.timeZone)
      const name = group === null ? undefined : names.get(group)
      return { time, group, label: name === undefined ? time : `${time}, ${name}` }
    })
}
