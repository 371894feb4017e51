import 'server-only'
import { and, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { event } from '@/db/schema'

/** The event, if it is one of the actor's own club; null for a foreign one as for one that never was. */
export function ownEvent(database: Db, actor: { readonly clubId: string }, eventId: string): typeof event.$inferSelect | null {
  const row = database
    .select()
    .from(event)
    .where(and(eq(event.id, eventId), eq(event.clubId, actor.clubId)))
    .get()
  return row ?? null
}
