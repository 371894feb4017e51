import 'server-only'
import { and, asc, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { car, entry, entryPerson, person } from '@/db/schema'
import type { EntryEdit } from '@/lib/contracts/entry-edit'
import type { LogEntry } from '@/lib/inspection/log-entry'
import { subjectKey } from '@/lib/inspection/subject'
import type { DayReading } from '../day-reading'

/** An entry's row with its values as rows and records leave them. */
export interface EntryValues {
  readonly row: typeof entry.$inferSelect
  readonly values: EntryEdit
  readonly hasRecords: boolean
  /** The log's lines about this car, in the order the server took them. */
  readonly records: readonly LogEntry[]
}

/** Reads an entry of this event; null where there is none. What a record changed since holds over the row. */
export function entryValues(database: Db, eventId: string, entryId: string, reading: DayReading): EntryValues | null {
  const found = database
    .select({ row: entry, car })
    .from(entry)
    .innerJoin(car, eq(car.id, entry.carId))
    .where(and(eq(entry.id, entryId), eq(entry.eventId, eventId)))
    .get()
  if (!found) return null
  const { row } = found
  const key = subjectKey({ car: row.id })
  const now = reading.entryNow(row.id)
  const records = reading.recordsOf(key).filter(({ record }) => 'car' in record.subject)
  const hasRecords = records.length > 0
  const values: EntryEdit = {
    number: now?.number ?? row.number,
    plate: row.plate,
    group: now?.group ?? row.groupId,
    model: found.car.model,
    colour: found.car.colour,
    passengerSeats: row.passengerSeats,
    note: row.note,
    facts: { ...row.facts },
    people: peopleIn(database, row.id),
    withdrawn: row.withdrawn || (hasRecords && reading.stateOf(key).withdrawn),
  }
  return { row, values, hasRecords, records }
}

function peopleIn(database: Db, entryId: string): EntryEdit['people'] {
  return database
    .select({ person: person.id, role: entryPerson.role, name: person.name, email: person.email, mobile: person.mobile })
    .from(entryPerson)
    .innerJoin(person, eq(person.id, entryPerson.personId))
    .where(eq(entryPerson.entryId, entryId))
    .orderBy(asc(entryPerson.role), asc(person.id))
    .all()
    .map((one) => ({ ...one, email: one.email ?? '', mobile: one.mobile ?? '' }))
}
