import 'server-only'
import { asc, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { car, entry, entryPerson, type event, person, runGroup } from '@/db/schema'
import type { HoldsFacts } from '../holds-of'

/** The event's rows as the list of holds needs them; no contact of anybody. */
export function holdsFacts(database: Db, row: typeof event.$inferSelect): HoldsFacts {
  const groups = database
    .select({ id: runGroup.id, name: runGroup.name })
    .from(runGroup)
    .where(eq(runGroup.eventId, row.id))
    .orderBy(asc(runGroup.order))
    .all()
  const people = database.select({ id: person.id, name: person.name }).from(person).where(eq(person.eventId, row.id)).all()
  return {
    eventId: row.id,
    checklistHash: row.checklistHash,
    limitsHash: row.limitsHash,
    event: { timeZone: row.timeZone },
    groups,
    names: new Map(people.map(({ id, name }) => [id, name])),
    entries: entriesOf(database, row.id),
  }
}

function entriesOf(database: Db, eventId: string): HoldsFacts['entries'] {
  const aboard = new Map<string, string[]>()
  const rows = database
    .select({ entryId: entryPerson.entryId, personId: entryPerson.personId })
    .from(entryPerson)
    .innerJoin(entry, eq(entry.id, entryPerson.entryId))
    .where(eq(entry.eventId, eventId))
    .all()
  for (const { entryId, personId } of rows) aboard.set(entryId, [...(aboard.get(entryId) ?? []), personId])
  return database
    .select({ id: entry.id, number: entry.number, plate: entry.plate, model: car.model })
    .from(entry)
    .innerJoin(car, eq(car.id, entry.carId))
    .where(eq(entry.eventId, eventId))
    .all()
    .map((each) => ({ ...each, people: aboard.get(each.id) ?? [] }))
}
