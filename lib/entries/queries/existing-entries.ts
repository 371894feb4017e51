import 'server-only'
import { and, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { car, entry, entryPerson, person, record, runGroup } from '@/db/schema'
import { subjectKey } from '@/lib/inspection/subject'
import type { ExistingEntry, ExistingPerson } from '../plan-import'

/** The event's entries as an import compares them, by their code. */
export function existingEntries(database: Db, eventId: string): readonly ExistingEntry[] {
  const looked = new Set(
    database
      .selectDistinct({ key: record.subjectKey })
      .from(record)
      .where(eq(record.eventId, eventId))
      .all()
      .map((row) => row.key),
  )
  const people = peopleByEntry(database, eventId)
  return database
    .select({ entry, car, group: runGroup.name })
    .from(entry)
    .innerJoin(car, eq(car.id, entry.carId))
    .innerJoin(runGroup, eq(runGroup.id, entry.groupId))
    .where(eq(entry.eventId, eventId))
    .orderBy(entry.code)
    .all()
    .map(({ entry: { id, number, plate, passengerSeats, note }, car: { model, colour }, group }) => ({
      id,
      number,
      plate,
      model,
      colour,
      group,
      passengerSeats,
      note,
      people: people.get(id) ?? [],
      hasRecords: looked.has(subjectKey({ car: id })),
    }))
}

function peopleByEntry(database: Db, eventId: string): ReadonlyMap<string, ExistingPerson[]> {
  const rows = database
    .select({
      entryId: entryPerson.entryId,
      role: entryPerson.role,
      id: person.id,
      name: person.name,
      email: person.email,
      mobile: person.mobile,
    })
    .from(entryPerson)
    .innerJoin(person, eq(person.id, entryPerson.personId))
    .innerJoin(entry, and(eq(entry.id, entryPerson.entryId), eq(entry.eventId, eventId)))
    // Ids sort by when they were made: the first driver is the one the list named.
    .orderBy(person.id)
    .all()
  const people = new Map<string, ExistingPerson[]>()
  for (const { entryId, id, name, email, mobile, role } of rows) {
    const own = people.get(entryId) ?? []
    own.push({ id, name, email: email ?? '', mobile: mobile ?? '', role })
    people.set(entryId, own)
  }
  return people
}
