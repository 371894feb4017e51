import 'server-only'
import { and, eq, ne } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { passState, subjectState } from '@/db/schema'
import { transaction } from '@/db/transaction'
import { venueDay } from '@/lib/rules/venue-day'
import { eventFrame } from './event-frame'
import { eventLog } from './event-log'
import { refreshProjections } from './projections'

/** Throws the caches of an event away and makes them anew from its log. The log itself is only read. */
export function rebuildProjections(database: Db, eventId: string, now: number): void {
  transaction(database, () => {
    const frame = eventFrame(database, eventId)
    if (frame === null) return
    database.delete(subjectState).where(eq(subjectState.eventId, eventId)).run()
    database.delete(passState).where(eq(passState.eventId, eventId)).run()
    const log = eventLog(database, eventId)
    refreshProjections(database, frame, log, [...log.bySubject.keys()], now)
  })
}

/** Folds an event again where its caches are of another venue day: at midnight what perishes was not seen. To be called before they are read. */
export function freshenProjections(database: Db, eventId: string, now: number): void {
  transaction(database, () => {
    const frame = eventFrame(database, eventId)
    if (frame === null) return
    const day = venueDay(now, frame.event.timeZone)
    const stale = database
      .select({ key: subjectState.subjectKey })
      .from(subjectState)
      .where(and(eq(subjectState.eventId, eventId), ne(subjectState.day, day)))
      .all()
    if (stale.length === 0) return
    const log = eventLog(database, eventId)
    refreshProjections(
      database,
      frame,
      log,
      stale.map(({ key }) => key),
      now,
    )
  })
}
