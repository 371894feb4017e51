import { readDay } from './day-log'
import type { LogEntry } from './log-entry'

/** A session as the timetable has it: the group's own count over the event, from 1. */
export interface PlannedSession {
  readonly group: string
  readonly session: number
  readonly startsAt: number
  readonly endsAt: number
}

/** A block of the timetable, of which only sessions on track are read. */
export interface TimetableBlock {
  readonly kind: string
  readonly group: string | null
  readonly session: number | null
  readonly startsAt: number
  readonly endsAt: number
}

/** A group's sessions in order of time. */
export function sessionsOf(timetable: readonly TimetableBlock[], group: string): readonly PlannedSession[] {
  return timetable
    .flatMap((block) =>
      block.kind === 'session' && block.group === group && block.session !== null
        ? [{ group, session: block.session, startsAt: block.startsAt, endsAt: block.endsAt }]
        : [],
    )
    .sort((a, b) => a.session - b.session)
}

/** The highest session of a group that was said to be over; 0 before the first. `entries` are the event's own records. */
export function lastSessionOver(entries: readonly LogEntry[], group: string): number {
  const said = readDay(entries).said.flatMap(({ record: { says } }) =>
    says.what === 'session-over' && says.group === group ? [says.session] : [],
  )
  return Math.max(0, ...said)
}

/**
 * The session that ends next: the first not said to be over. The timetable's own clock does not move it on, since a day may run late.
 */
export function sessionToEnd(entries: readonly LogEntry[], group: string): number {
  return lastSessionOver(entries, group) + 1
}

/**
 * The next whole session a car of the group can run, for a recall after it: the first that begins after `now` and was not said to be over. Without
 * such a one in the timetable, the one after the last that was: due earlier rather than never.
 */
export function nextWholeSession(entries: readonly LogEntry[], timetable: readonly TimetableBlock[], group: string, now: number): number {
  const over = lastSessionOver(entries, group)
  const ahead = sessionsOf(timetable, group).find(({ session, startsAt }) => session > over && startsAt > now)
  return ahead?.session ?? over + 1
}
