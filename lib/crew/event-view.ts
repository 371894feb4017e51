import type { event } from '@/db/schema'

/** What somebody who joins is told of the event. */
export function eventView({ id, name, venue, firstDay, lastDay }: typeof event.$inferSelect) {
  return { id, name, venue, firstDay, lastDay }
}
