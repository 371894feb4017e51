import { readDay } from '@/lib/inspection/day-log'
import type { RecallTrigger } from '@/lib/inspection/record'
import { lastSessionOver, sessionsOf, sessionToEnd } from '@/lib/inspection/sessions'
import type { DayClient } from '@/lib/sync/client/day-client'

/** A group's session that can be said to be over next. */
export interface SessionSwitch {
  readonly group: string
  readonly name: string
  readonly session: number
  /** The timetable says it is past, by this device's clock. */
  readonly isPast: boolean
  /** How many the timetable has; 0 where it has none. */
  readonly planned: number
  /** The last that was said to be over; 0 for none. */
  readonly over: number
}

/** What the day's switches say, as far as this device knows. */
export interface DaySwitches {
  readonly isWet: boolean
  /** Corrected clock, ms, of the wet switch in force that was first; null while it is dry. */
  readonly wetSince: number | null
  readonly sessions: readonly SessionSwitch[]
}

/** Reads the switches of the day. `clock` is the device's own, ms. */
export function daySwitches(day: DayClient, clock: number): DaySwitches {
  const log = day.dayLog()
  const { wetOn, wetInForce } = readDay(log)
  const inForce = wetOn.filter(({ hash }) => wetInForce.has(hash)).map(({ record }) => record.at + record.offset)
  const now = clock + day.status().clockOffset
  const snapshot = day.snapshot()
  const groups = [...(snapshot?.groups ?? [])].sort((a, b) => a.order - b.order)
  return {
    isWet: inForce.length > 0,
    wetSince: inForce.length > 0 ? Math.min(...inForce) : null,
    sessions: groups.map(({ id, name }) => {
      const session = sessionToEnd(log, id)
      const planned = sessionsOf(snapshot?.timetable ?? [], id)
      const isPast = planned.some((one) => one.session === session && one.endsAt <= now)
      return { group: id, name, session, isPast, planned: planned.length, over: lastSessionOver(log, id) }
    }),
  }
}

/** Says that a session is over: recalls after it fall due on this device at once. */
export function saySessionOver(day: DayClient, { group, session }: Pick<SessionSwitch, 'group' | 'session'>): Promise<unknown> {
  return day.record([{ kind: 'day', subject: eventOf(day), says: { what: 'session-over', group, session } }])
}

/** Declares wet, or that it is over. */
export function sayWet(day: DayClient, on: boolean): Promise<unknown> {
  return day.record([{ kind: 'day', subject: eventOf(day), says: { what: 'wet', on } }])
}

/** Says for everybody what this device's clock says already: the recall is due by a record from then on. Only for triggers that a clock can meet. */
export function sayDue(day: DayClient, trigger: RecallTrigger): Promise<unknown> {
  if (trigger.when === 'session-over') return saySessionOver(day, trigger)
  if (trigger.when !== 'time') return Promise.resolve()
  return day.record([{ kind: 'day', subject: eventOf(day), says: { what: 'time', at: trigger.at } }])
}

function eventOf(day: DayClient): { readonly event: string } {
  return { event: day.status().event?.id ?? '' }
}
