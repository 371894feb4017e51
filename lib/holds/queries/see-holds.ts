import 'server-only'
import type { Db } from '@/db/client'
import type { event } from '@/db/schema'
import type { Holds, holds } from '@/lib/contracts/holds'
import type { Command } from '@/lib/platform/command'
import { ownEvent } from '@/lib/platform/own-event'
import { refuse } from '@/lib/platform/refusal'
import { holdsOf } from '../holds-of'
import type { ReadHolds } from '../holds-reading'
import { holdsFacts } from './holds-facts'

/** Holds, recalls and dispensations of an event of one's own club, by the reading of its log that is handed in. */
export function seeHolds(readHolds: ReadHolds): Command<typeof holds> {
  return ({ params }, actor, { database, now }) => {
    const own = ownEvent(database, actor, params.event)
    if (!own) return refuse('missing')
    return readEventHolds(readHolds, database, own, now) ?? refuse('missing')
  }
}

/** As `seeHolds`, for a page that has already been guarded; null where the event is gone. */
export function readEventHolds(readHolds: ReadHolds, database: Db, own: typeof event.$inferSelect, now: number): Holds | null {
  const reading = readHolds(database, own.id, now)
  return reading === null ? null : holdsOf(holdsFacts(database, own), reading, now)
}
