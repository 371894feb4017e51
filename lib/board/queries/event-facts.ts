import 'server-only'
import { asc, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { car, entry, entryPerson, type event, person, runGroup, timetableBlock } from '@/db/schema'
import { plateTail } from '@/lib/pass/plate-tail'
import type { EntryFacts, EventFacts } from '../board-of'

/** The event's rows as the board needs them; no contact of anybody. */
export function eventFacts(database: Db, row: typeof event.$inferSelect): EventFacts {
  const groups = database
    .select({ id: runGroup.id, name: runGroup.name })
    .from(runGroup)
    .where(eq(runGroup.eventId, row.id))
    .orderBy(asc(runGroup.order))
    .all()
  const { timeZone, checklistHash, limitsHash } = row
  const timetable = database
    .select({
      day: timetableBlock.day,
      kind: timetableBlock.kind,
      group: timetableBlock.groupId,
      startsAt: timetableBlock.startsAt,
      endsAt: timetableBlock.endsAt,
    })
    .from(timetableBlock)
    .where(eq(timetableBlock.eventId, row.id))
    .all()
  return { timeZone, checklistHash, limitsHash, groups, timetable, entries: entryFacts(database, row.id) }
}

function entryFacts(database: Db, eventId: string): readonly EntryFacts[] {
  const aboard = peopleAboard(database, eventId)
  return database
    .select({ entry, car })
    .from(entry)
    .innerJoin(car, eq(car.id, entry.carId))
    .where(eq(entry.eventId, eventId))
    .all()
    .map((each) => ({
      id: each.entry.id,
      number: each.entry.number,
      plate: each.entry.plate,
      plateTail: plateTail(each.entry.plate),
      model: each.car.model,
      colour: each.car.colour,
      group: each.entry.groupId,
      withdrawn: each.entry.withdrawn,
      people: aboard.get(each.entry.id) ?? [],
    }))
}

function peopleAboard(database: Db, eventId: string): ReadonlyMap<string, EntryFacts['people']> {
  const rows = database
    .select({ entryId: entryPerson.entryId, role: entryPerson.role, id: person.id, name: person.name })
    .from(entryPerson)
    .innerJoin(person, eq(person.id, entryPerson.personId))
    .where(eq(person.eventId, eventId))
    .orderBy(asc(person.name))
    .all()
  const aboard = new Map<string, EntryFacts['people'][number][]>()
  for (const { entryId, role, id, name } of rows) {
    const own = aboard.get(entryId)
    const one = { id, name, isDriver: role === 'driver' }
    if (own) own.push(one)
    else aboard.set(entryId, [one])
  }
  return aboard
}
