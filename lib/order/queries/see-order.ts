import 'server-only'
import { and, asc, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { bayPlan, callUp, car, entry, type event, runGroup, timetableBlock } from '@/db/schema'
import type { BayOrderView, seeBayOrder } from '@/lib/contracts/bay-order'
import type { Command } from '@/lib/platform/command'
import { ownEvent } from '@/lib/platform/own-event'
import { refuse } from '@/lib/platform/refusal'
import { addDays, civilDate, type CivilDate } from '@/lib/rules/civil-date'
import { venueDay } from '@/lib/rules/venue-day'
import { venueInstant } from '@/lib/rules/venue-instant'
import { venueClock } from '@/lib/rules/venue-clock'
import { type CarInOrder, type DayToOrder, type Hole, orderOf } from '../order-of'
import { BAY_BEFORE_MIN, planProposal } from '../plan-proposal'

type EventRow = typeof event.$inferSelect

/** Why an entry is doubtful, as its declaration has it; null for one that is not. By entry, of the whole event. */
export type ReadDoubts = (database: Db, own: EventRow, now: number) => ReadonlyMap<string, CarInOrder['doubt']>

/** The order of a day of an event of one's own club. */
export function seeOrder(readDoubts: ReadDoubts): Command<typeof seeBayOrder> {
  return ({ params, query }, actor, { database, now }) => {
    const own = ownEvent(database, actor, params.event)
    if (!own) return refuse('missing')
    return readOrder(readDoubts, database, own, query.day ?? null, now) ?? refuse('missing')
  }
}

/** As `seeOrder`, for a page that has already been guarded; null for a day the event does not have. */
export function readOrder(readDoubts: ReadDoubts, database: Db, own: EventRow, asked: string | null, now: number): BayOrderView | null {
  const days = daysOf(own)
  const today = venueDay(now, own.timeZone)
  const day = asked ?? (days.includes(today) ? today : own.firstDay)
  return days.includes(day) ? orderOf(dayToOrder(readDoubts, database, own, civilDate(day), days, now)) : null
}

function dayToOrder(readDoubts: ReadDoubts, database: Db, own: EventRow, day: CivilDate, days: readonly string[], now: number): DayToOrder {
  const blocks = database
    .select()
    .from(timetableBlock)
    .where(and(eq(timetableBlock.eventId, own.id), eq(timetableBlock.day, day)))
    .orderBy(asc(timetableBlock.startsAt))
    .all()
  const firstOf = (group: string) => blocks.find(({ kind, groupId }) => kind === 'session' && groupId === group)?.startsAt ?? null
  const groups = database
    .select({ id: runGroup.id, name: runGroup.name })
    .from(runGroup)
    .where(eq(runGroup.eventId, own.id))
    .orderBy(asc(runGroup.order))
    .all()
    .map((group) => ({ ...group, firstSessionAt: firstOf(group.id) }))
  const saved = database
    .select()
    .from(bayPlan)
    .where(and(eq(bayPlan.eventId, own.id), eq(bayPlan.day, day)))
    .get()
  const firstSession = blocks.find(({ kind }) => kind === 'session')?.startsAt
  const opensAt =
    saved?.opensAt ?? (firstSession === undefined ? venueInstant(day, '07:30', own.timeZone) : firstSession - BAY_BEFORE_MIN * 60_000)
  const { lanes, windowMin, carMin, carSdMin } = saved ?? planProposal(own.defaultDepth)
  return {
    day,
    days,
    timeZone: own.timeZone,
    opensAt,
    plan: { day, opensAt: venueClock(opensAt, own.timeZone), lanes, windowMin, carMin, carSdMin },
    isPlanned: saved !== undefined,
    publishedAt: saved?.publishedAt ?? null,
    groups,
    cars: carsOf(database, own, readDoubts(database, own, now)),
    holes: blocks.flatMap(holeOf),
    told: toldOf(database, own.id, day),
  }
}

// Only what is everybody's stops the bay; one group's briefing stops that group's people, not the scrutineers.
function holeOf({ kind, groupId, startsAt, endsAt }: typeof timetableBlock.$inferSelect): Hole[] {
  return kind === 'session' || groupId !== null ? [] : [{ kind, from: startsAt, to: endsAt }]
}

function carsOf(database: Db, own: EventRow, doubts: ReadonlyMap<string, CarInOrder['doubt']>): readonly CarInOrder[] {
  return database
    .select({ entry: entry.id, number: entry.number, model: car.model, group: entry.groupId })
    .from(entry)
    .innerJoin(car, eq(car.id, entry.carId))
    .where(and(eq(entry.eventId, own.id), eq(entry.withdrawn, false)))
    .all()
    .toSorted((a, b) => a.number.localeCompare(b.number, 'en', { numeric: true }))
    .map((row) => ({ ...row, doubt: doubts.get(row.entry) ?? null }))
}

function toldOf(database: Db, eventId: string, day: string): DayToOrder['told'] {
  const rows = database
    .select({ entry: callUp.entryId, from: callUp.startsAt, to: callUp.endsAt })
    .from(callUp)
    .innerJoin(entry, eq(entry.id, callUp.entryId))
    .where(and(eq(entry.eventId, eventId), eq(callUp.day, day)))
    .all()
  return new Map(rows.map(({ entry: id, from, to }) => [id, { from, to }]))
}

function daysOf({ firstDay, lastDay }: EventRow): readonly string[] {
  const days: string[] = []
  for (let day = civilDate(firstDay); day <= lastDay; day = addDays(day, 1)) days.push(day)
  return days
}
