import 'server-only'
import { and, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { car, entry, entryPerson, person, record, runGroup } from '@/db/schema'
import { subjectKey } from '@/lib/inspection/subject'
import type { ExistingEntry } from '../plan-import'

/** What an entry's rows are called in the database, for a change. */
export interface ExistingEntryRow extends ExistingEntry {
  readonly carId: string
  readonly personId: string | null
}

/** The event's entries as an import compares them, in no order. */
export function existingEntries(database: Db, eventId: string): readonly ExistingEntryRow[] {
  const looked = new Set(
    database
      .selectDistinct({ key: record.subjectKey })
      .from(record)
      .where(eq(record.eventId, eventId))
      .all()
      .map((row) => row.key),
  )
  const drivers = new Map(
    database
      .select({ entryId: entryPerson.entryId, person })
      .from(entryPerson)
      .innerJoin(person, eq(person.id, entryPerson.personId))
      .where(and(eq(person.eventId, eventId), eq(entryPerson.role, 'driver')))
      .all()
      // The first driver is the one the list named; later ones were added here.
      .reverse()
      .map((row) => [row.entryId, row.person]),
  )
  return database
    .select({ entry, car, group: runGroup.name })
    .from(entry)
    .innerJoin(car, eq(car.id, entry.carId))
    .innerJoin(runGroup, eq(runGroup.id, entry.groupId))
    .where(eq(entry.eventId, eventId))
    .all()
    .map((row) => toExisting(row, drivers.get(row.entry.id) ?? null, looked))
}

function toExisting(
  row: { entry: typeof entry.$inferSelect; car: typeof car.$inferSelect; group: string },
  driver: typeof person.$inferSelect | null,
  looked: ReadonlySet<string>,
): ExistingEntryRow {
  return {
    id: row.entry.id,
    carId: row.car.id,
    personId: driver?.id ?? null,
    number: row.entry.number,
    plate: row.entry.plate,
    model: row.car.model,
    colour: row.car.colour,
    group: row.group,
    passengerSeats: row.entry.passengerSeats,
    note: row.entry.note,
    name: driver?.name ?? '',
    email: driver?.email ?? '',
    mobile: driver?.mobile ?? '',
    hasRecords: looked.has(subjectKey({ car: row.entry.id })),
  }
}
