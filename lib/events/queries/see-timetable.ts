import 'server-only'
import { and, asc, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { type event, runGroup, timetableBlock } from '@/db/schema'
import type { TimetableBlockBody } from '@/lib/contracts/events'
import { addDays, civilDate } from '@/lib/rules/civil-date'
import { venueClock } from '@/lib/rules/venue-clock'

export interface TimetableView {
  readonly days: readonly string[]
  readonly groups: readonly { readonly id: string; readonly name: string }[]
  /** Lines by day, in order of time. */
  readonly byDay: Readonly<Record<string, readonly TimetableBlockBody[]>>
}

/** An event's timetable as it is typed: times of the venue's clocks. */
export function readTimetable(database: Db, own: typeof event.$inferSelect): TimetableView {
  const groups = database
    .select({ id: runGroup.id, name: runGroup.name })
    .from(runGroup)
    .where(eq(runGroup.eventId, own.id))
    .orderBy(asc(runGroup.order))
    .all()
  const days: string[] = []
  for (let day = civilDate(own.firstDay); day <= own.lastDay; day = addDays(day, 1)) days.push(day)
  return { days, groups, byDay: Object.fromEntries(days.map((day) => [day, linesOf(database, own, day)])) }
}

function linesOf(database: Db, { id, timeZone }: typeof event.$inferSelect, day: string): readonly TimetableBlockBody[] {
  return database
    .select()
    .from(timetableBlock)
    .where(and(eq(timetableBlock.eventId, id), eq(timetableBlock.day, day)))
    .orderBy(asc(timetableBlock.startsAt), asc(timetableBlock.id))
    .all()
    .map(({ kind, groupId, startsAt, endsAt, noiseLimitDb }) => ({
      kind,
      group: groupId,
      startsAt: venueClock(startsAt, timeZone),
      endsAt: venueClock(endsAt, timeZone),
      noiseLimitDb,
    }))
}
