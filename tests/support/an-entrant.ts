import { eq } from 'drizzle-orm'
import { MARRAM } from '@/db/scenarios/marram'
import { seedMarram } from '@/db/scenarios/seed-marram'
import { seedMarramEntries } from '@/db/scenarios/seed-marram-entries'
import { account, entry, entryPerson, person } from '@/db/schema'
import type { Db } from '@/db/client'
import { newId } from '@/lib/platform/ids'
import { makeEntryLink } from '@/lib/platform/make-entry-link'
import type { AccountActor } from '@/lib/platform/actor'
import { venueDay } from '@/lib/rules/venue-day'

/** Sat 9 May 2026, 08:00 at the venue. */
export const SATURDAY = Date.UTC(2026, 4, 9, 7)

/** The demo's event and list, with one more driver whose address nobody had before. */
export async function anEntry(database: Db, number = 0) {
  const seeded = await seedMarram(database, SATURDAY)
  seedMarramEntries(database, seeded, SATURDAY)
  const row = database.select().from(entry).where(eq(entry.eventId, seeded.eventId)).all()[number]!
  const { clubId, eventId } = row
  const aboard = { clubId, eventId, id: newId(), name: 'Ida Rook', email: 'Ida.Rook@Example.org' }
  database.insert(person).values(aboard).run()
  database.insert(entryPerson).values({ clubId, entryId: row.id, personId: aboard.id, role: 'driver' }).run()
  const link = makeEntryLink(database, row, aboard, SATURDAY)
  return { ...seeded, row, person: aboard, link, lastDay: venueDay(SATURDAY + 86_400_000, MARRAM.timeZone) }
}

/** An account as a request of its own would know it. */
export function actorOf(database: Db, email: string): AccountActor {
  const row = database.select().from(account).where(eq(account.email, email)).get()
  if (!row) throw new Error(`no account of ${email}`)
  return { kind: 'account', accountId: row.id, clubId: row.clubId, name: row.name, clubRoles: row.roles, signInHash: '' }
}
