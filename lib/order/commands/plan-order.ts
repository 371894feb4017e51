import 'server-only'
import { eq, sql } from 'drizzle-orm'
import { bayPlan, callUp, event } from '@/db/schema'
import { transaction } from '@/db/transaction'
import type { planBay } from '@/lib/contracts/bay-order'
import type { Command } from '@/lib/platform/command'
import { announce } from '@/lib/platform/live'
import { ownEvent } from '@/lib/platform/own-event'
import { refuse } from '@/lib/platform/refusal'
import { writeAudit } from '@/lib/platform/write-audit'
import { civilDate } from '@/lib/rules/civil-date'
import { venueInstant } from '@/lib/rules/venue-instant'
import { readOrder, type ReadDoubts } from '../queries/see-order'

/** Keeps how the bay of a day is planned; with `publish` each car's window is told: written down, so that a later plan does not move it by itself. */
export function planOrder(readDoubts: ReadDoubts): Command<typeof planBay> {
  return ({ params, body }, actor, { database, now }) => {
    const own = ownEvent(database, actor, params.event)
    if (!own || body.day < own.firstDay || body.day > own.lastDay) return refuse('missing')
    const { day, lanes, windowMin, carMin, carSdMin, publish } = body
    const plan = { opensAt: venueInstant(civilDate(day), body.opensAt, own.timeZone), lanes, windowMin, carMin, carSdMin }
    const order = transaction(database, (tx) => {
      const told = publish ? { publishedAt: now } : {}
      tx.insert(bayPlan)
        .values({ ...plan, ...told, eventId: own.id, clubId: own.clubId, day })
        .onConflictDoUpdate({ target: [bayPlan.eventId, bayPlan.day], set: { ...plan, ...told } })
        .run()
      const planned = readOrder(readDoubts, tx, own, day, now)
      if (planned === null || !publish) return planned
      for (const { from, to, cars } of planned.windows)
        for (const { entry } of cars) {
          const window = { startsAt: from, endsAt: to }
          tx.insert(callUp)
            .values({ ...window, entryId: entry, clubId: own.clubId, day })
            .onConflictDoUpdate({ target: [callUp.entryId, callUp.day], set: window })
            .run()
        }
      tx.update(event)
        .set({ snapshotVersion: sql`${event.snapshotVersion} + 1` })
        .where(eq(event.id, own.id))
        .run()
      const detail = { day, windows: planned.windows.length, cars: planned.windows.reduce((sum, { cars }) => sum + cars.length, 0) }
      writeAudit(tx, { clubId: own.clubId, eventId: own.id, at: now, accountId: actor.accountId, action: 'bay-order-told', detail })
      return readOrder(readDoubts, tx, own, day, now)
    })
    if (publish) announce(own.id)
    return order ?? refuse('missing')
  }
}
