import 'server-only'
import { and, asc, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { car, entry, entryPerson, type event, mailOutbox, person } from '@/db/schema'
import { venueDay } from '@/lib/rules/venue-day'
import type { MailReaders } from '../mail-readers'
import type { MailingFacts, Receiver } from '../plan-mailing'

type EventRow = typeof event.$inferSelect

/** All that decides what a mailing writes. */
export function mailingFacts(database: Db, own: EventRow, readers: MailReaders, now: number): MailingFacts {
  const receivers = driversOf(database, own.id).flatMap(({ to, ...rest }) => (to === null ? [] : [{ ...rest, to }]))
  const written = new Set(
    database
      .select({ sameAs: mailOutbox.sameAs })
      .from(mailOutbox)
      .where(and(eq(mailOutbox.clubId, own.clubId), eq(mailOutbox.eventId, own.id)))
      .all()
      .map(({ sameAs }) => sameAs),
  )
  const today = venueDay(now, own.timeZone)
  return {
    event: own,
    receivers,
    preChecks: readers.preChecks(database, own, now),
    results: readers.results(database, own, now, [...new Set(receivers.map((receiver) => receiver.entry.id))]),
    // After the event its last day is what results are of.
    day: today > own.lastDay ? own.lastDay : today,
    isWritten: (sameAs) => written.has(sameAs),
  }
}

/** Drivers of the event's entries that are not withdrawn, by entry; without an address `to` is null. */
export function driversOf(database: Db, eventId: string): readonly (Omit<Receiver, 'to'> & { readonly to: string | null })[] {
  return database
    .select({ entry, model: car.model, person })
    .from(entryPerson)
    .innerJoin(entry, eq(entry.id, entryPerson.entryId))
    .innerJoin(car, eq(car.id, entry.carId))
    .innerJoin(person, eq(person.id, entryPerson.personId))
    .where(and(eq(entry.eventId, eventId), eq(entry.withdrawn, false), eq(entryPerson.role, 'driver')))
    .orderBy(asc(entry.code), asc(person.name))
    .all()
    .map((row) => ({
      entry: { id: row.entry.id, number: row.entry.number, model: row.model },
      person: { id: row.person.id, name: row.person.name },
      to: addressOf(row.person.email),
    }))
}

/** An address as far as a glance tells; what a list says in its place ("phone me") is none. */
function addressOf(email: string | null): string | null {
  const text = (email ?? '').trim().toLowerCase()
  return /^[^\s@,;<>"]+@[^\s@,;<>"]+$/.test(text) ? text : null
}
