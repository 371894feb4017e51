import 'server-only'
import { and, asc, eq, sql } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { event, runGroup, timetableBlock } from '@/db/schema'
import { transaction } from '@/db/transaction'
import type { saveTimetable as contract, TimetableBlockBody } from '@/lib/contracts/events'
import type { Command } from '@/lib/platform/command'
import { newId } from '@/lib/platform/ids'
import { announce } from '@/lib/platform/live'
import { ownEvent } from '@/lib/platform/own-event'
import { refuse } from '@/lib/platform/refusal'
import { writeAudit } from '@/lib/platform/write-audit'
import { civilDate } from '@/lib/rules/civil-date'
import { venueInstant } from '@/lib/rules/venue-instant'
import { inOrder, timetableProblems } from '../timetable-of-day'

type EventRow = typeof event.$inferSelect

/** Puts one day's timetable in the place of what stood there, all or nothing; devices and the board learn of it at once. */
export const saveTimetable: Command<typeof contract> = ({ params, body }, actor, { database, now }) => {
  const own = ownEvent(database, actor, params.event)
  if (!own) return refuse('missing')
  if (body.day < own.firstDay || body.day > own.lastDay)
    return refuse('invalid', { issues: [{ path: 'day', message: 'The event is not on that day.' }] })
  const groups = new Set(
    database
      .select({ id: runGroup.id })
      .from(runGroup)
      .where(eq(runGroup.eventId, own.id))
      .all()
      .map(({ id }) => id),
  )
  const problems = timetableProblems(body.blocks, groups)
  if (problems.length > 0)
    return refuse('invalid', {
      issues: problems.map(({ line, field, words }) => ({ path: `blocks.${String(line)}.${field}`, message: words })),
    })
  transaction(database, (tx) => {
    writeTimetable(tx, own, body.day, body.blocks)
    tx.update(event)
      .set({ snapshotVersion: sql`${event.snapshotVersion} + 1` })
      .where(eq(event.id, own.id))
      .run()
    const detail = { day: body.day, blocks: body.blocks.length }
    writeAudit(tx, { clubId: own.clubId, eventId: own.id, at: now, accountId: actor.accountId, action: 'timetable-saved', detail })
  })
  announce(own.id)
  return { blocks: body.blocks.length }
}

/** Writes a day's lines and counts each group's sessions anew over the whole event; inside the caller's transaction. Also for seeds. */
export function writeTimetable(tx: Db, own: EventRow, day: string, blocks: readonly TimetableBlockBody[]): void {
  tx.delete(timetableBlock)
    .where(and(eq(timetableBlock.eventId, own.id), eq(timetableBlock.day, day)))
    .run()
  const at = (time: string) => venueInstant(civilDate(day), time, own.timeZone)
  for (const { kind, group, startsAt, endsAt, noiseLimitDb } of inOrder(blocks))
    tx.insert(timetableBlock)
      .values({
        id: newId(),
        clubId: own.clubId,
        eventId: own.id,
        day,
        kind,
        groupId: group,
        startsAt: at(startsAt),
        endsAt: at(endsAt),
        noiseLimitDb,
      })
      .run()
  countSessions(tx, own)
}

/** A recall says “after session 3 of the group”: the count runs over all days, so a change of the first day moves the second's. */
function countSessions(tx: Db, own: EventRow): void {
  const counts = new Map<string, number>()
  const first = new Map<string, number>()
  const sessions = tx
    .select()
    .from(timetableBlock)
    .where(and(eq(timetableBlock.eventId, own.id), eq(timetableBlock.kind, 'session')))
    .orderBy(asc(timetableBlock.startsAt))
    .all()
  for (const { id, groupId, startsAt } of sessions) {
    if (groupId === null) continue
    const session = (counts.get(groupId) ?? 0) + 1
    counts.set(groupId, session)
    if (session === 1) first.set(groupId, startsAt)
    tx.update(timetableBlock).set({ session }).where(eq(timetableBlock.id, id)).run()
  }
  for (const { id } of tx.select({ id: runGroup.id }).from(runGroup).where(eq(runGroup.eventId, own.id)).all())
    tx.update(runGroup)
      .set({ firstSessionAt: first.get(id) ?? null })
      .where(eq(runGroup.id, id))
      .run()
}
