import 'server-only'
import type { Db } from '@/db/client'
import type { event } from '@/db/schema'
import type { Board, board } from '@/lib/contracts/board'
import type { Command } from '@/lib/platform/command'
import { ownEvent } from '@/lib/platform/own-event'
import { refuse } from '@/lib/platform/refusal'
import { boardOf } from '../board-of'
import type { ReadDay } from '../day-reading'
import { eventFacts } from './event-facts'

/** The board of an event of one's own club, by the reading of its log that is handed in. */
export function seeBoard(readDay: ReadDay): Command<typeof board> {
  return ({ params }, actor, { database, now }) => {
    const own = ownEvent(database, actor, params.event)
    if (!own) return refuse('missing')
    return readBoard(readDay, database, own, now) ?? refuse('missing')
  }
}

/** As `seeBoard`, for a page that has already been guarded; null where the event is gone. */
export function readBoard(readDay: ReadDay, database: Db, own: typeof event.$inferSelect, now: number): Board | null {
  const reading = readDay(database, own.id, now)
  return reading === null ? null : boardOf(eventFacts(database, own), reading, now)
}
