import 'server-only'
import { eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { entry } from '@/db/schema'
import { missingData, type MissingData } from '../missing-data'
import { existingEntries } from './existing-entries'

/** What each entry of an event lacks, by its id; those that lack nothing are left out. No contact of anybody is in it. */
export function seeMissing(database: Db, eventId: string): Readonly<Record<string, readonly MissingData[]>> {
  const facts = new Map(
    database
      .select({ id: entry.id, facts: entry.facts })
      .from(entry)
      .where(eq(entry.eventId, eventId))
      .all()
      .map((row) => [row.id, Object.keys(row.facts).length > 0]),
  )
  const found = existingEntries(database, eventId).map(({ id, colour, people }) => {
    const drivers = people.filter(({ role }) => role === 'driver')
    return [id, missingData({ colour, drivers, hasFacts: facts.get(id) ?? false })] as const
  })
  return Object.fromEntries(found.filter(([, missing]) => missing.length > 0))
}
