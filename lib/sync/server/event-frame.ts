import 'server-only'
import { eq, inArray } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { declaration, entry, event } from '@/db/schema'
import type { FoldContext } from '@/lib/inspection/state'
import { subjectKey, type SubjectKey } from '@/lib/inspection/subject'
import { plateTail } from '@/lib/pass/plate-tail'
import { venueDay } from '@/lib/rules/venue-day'
import type { ChangeableEntry } from '../core/entry-now'
import { logStatements } from './log-statements'
import { pinnedBook } from './pinned-books'

/** What is known of an event besides its log: ordinary rows, read once per version of the snapshot. */
export interface EventFrame {
  readonly event: typeof event.$inferSelect
  readonly entries: ReadonlyMap<string, ChangeableEntry>
  readonly declared: ReadonlySet<SubjectKey>
}

const holder = globalThis as typeof globalThis & { lockwireFrames?: WeakMap<object, Map<string, EventFrame>> }

/** The frame of an event; null where there is no such event. Kept until the event's snapshot version moves on: whoever changes those rows moves it. */
export function eventFrame(database: Db, eventId: string): EventFrame | null {
  const version = logStatements(database).snapshotVersion.get(eventId)
  if (version === undefined) return null
  holder.lockwireFrames ??= new WeakMap()
  const frames = holder.lockwireFrames.get(database.$client) ?? new Map<string, EventFrame>()
  holder.lockwireFrames.set(database.$client, frames)
  const known = frames.get(eventId)
  if (known?.event.snapshotVersion === version.snapshotVersion) return known
  const frame = readFrame(database, eventId)
  if (frame !== null) frames.set(eventId, frame)
  return frame
}

/** The frame as the rows are at this moment, not kept: inside a transaction that changes them, which may yet be rolled back. */
export function readFrame(database: Db, eventId: string): EventFrame | null {
  const row = database.select().from(event).where(eq(event.id, eventId)).get()
  if (row === undefined) return null
  const rows = database.select().from(entry).where(eq(entry.eventId, eventId)).all()
  const entries = new Map(rows.map(({ id, number, plate, groupId }) => [id, { number, plateTail: plateTail(plate), group: groupId }]))
  return { event: row, entries, declared: declaredOf(database, eventId) }
}

function declaredOf(database: Db, eventId: string): ReadonlySet<SubjectKey> {
  const own = database.select({ id: entry.id }).from(entry).where(eq(entry.eventId, eventId))
  const rows = database
    .select({ entryId: declaration.entryId, signedAt: declaration.signedAt })
    .from(declaration)
    .where(inArray(declaration.entryId, own))
    .all()
  return new Set(rows.filter(({ signedAt }) => signedAt !== null).map(({ entryId }) => subjectKey({ car: entryId })))
}

/** What the fold is told of the event at this instant. */
export function foldContext(database: Db, frame: EventFrame, now: number): FoldContext {
  return {
    day: venueDay(now, frame.event.timeZone),
    lastDay: frame.event.lastDay,
    declared: frame.declared,
    openBook: (checklistHash, limitsHash) => pinnedBook(database, checklistHash, limitsHash),
  }
}
