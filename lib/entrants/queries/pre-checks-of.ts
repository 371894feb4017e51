import 'server-only'
import { and, asc, desc, eq, isNotNull } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { car, declaration, entry, entryPerson, type event, person } from '@/db/schema'
import type { Book } from '@/lib/checklist/book'
import type { EventDeclarations, eventDeclarations } from '@/lib/contracts/event-declarations'
import type { Command } from '@/lib/platform/command'
import { ownEvent } from '@/lib/platform/own-event'
import { refuse } from '@/lib/platform/refusal'
import { civilDate } from '@/lib/rules/civil-date'
import { type DeclaredItem, declaredItems, sumOf } from '../declared-items'
import { mendDeclared } from '../mend-of'
import type { ReadDay } from '../read-day'
import { readSigned, type Signed } from './declarations-of'
import { atHome } from './may-declare'

type Row = EventDeclarations['rows'][number]

/** Who has declared, and what would not be passed, of an event of one's own club. */
export function seeDeclarations(readDay: ReadDay): Command<typeof eventDeclarations> {
  return ({ params }, actor, { database, now }) => {
    const own = ownEvent(database, actor, params.event)
    const book = own && readDay(database, own.id, now)?.bookOf(own.checklistHash, own.limitsHash)
    if (!own || !book) return refuse('missing')
    const rows = preChecksOf(database, own, book)
    return { entries: rows.length, declared: rows.filter(({ version }) => version !== null).length, rows: [...rows] }
  }
}

/** The pre-check of every entry of an event that is not withdrawn, by number; for the organiser's page and for mail. */
export function preChecksOf(database: Db, own: typeof event.$inferSelect, book: Book): readonly Row[] {
  const aboard = driversOf(database, own.id)
  const signed = signedByEntry(database, own.id)
  return database
    .select({ id: entry.id, number: entry.number, model: car.model })
    .from(entry)
    .innerJoin(car, eq(car.id, entry.carId))
    .where(and(eq(entry.eventId, own.id), eq(entry.withdrawn, false)))
    .orderBy(asc(entry.code))
    .all()
    .map((row) => rowOf(row, aboard.get(row.id) ?? [], signed.get(row.id) ?? null, own.lastDay, book))
}

interface Driver {
  readonly id: string
  readonly name: string
}

function rowOf(
  { id, number, model }: { readonly id: string; readonly number: string; readonly model: string },
  drivers: readonly Driver[],
  signed: Signed | null,
  lastDay: string,
  book: Book,
): Row {
  const parts = signed?.parts ?? { facts: {}, answers: {} }
  const people = drivers.map((driver) => driver.id)
  const items: readonly DeclaredItem[] = signed ? declaredItems(atHome(book).checks, parts, people, civilDate(lastDay)) : []
  const nameOf = (who: string) => drivers.find((driver) => driver.id === who)?.name ?? ''
  return {
    entry: id,
    number,
    model,
    drivers: drivers.map(({ name }) => name),
    version: signed?.version ?? null,
    signedAt: signed?.signedAt ?? null,
    says: sumOf(items).says,
    worries: mendDeclared(items, book, nameOf).map(({ weight, prompt, place, whose, words }) => ({
      weight,
      prompt: `${whose ?? place}: ${prompt}`,
      words,
    })),
  }
}

function driversOf(database: Db, eventId: string): ReadonlyMap<string, readonly Driver[]> {
  const rows = database
    .select({ entryId: entryPerson.entryId, id: person.id, name: person.name })
    .from(entryPerson)
    .innerJoin(person, eq(person.id, entryPerson.personId))
    .where(and(eq(person.eventId, eventId), eq(entryPerson.role, 'driver')))
    .orderBy(asc(person.name))
    .all()
  const byEntry = new Map<string, Driver[]>()
  for (const { entryId, ...driver } of rows) byEntry.set(entryId, [...(byEntry.get(entryId) ?? []), driver])
  return byEntry
}

function signedByEntry(database: Db, eventId: string): ReadonlyMap<string, Signed | null> {
  const rows = database
    .select({ declaration })
    .from(declaration)
    .innerJoin(entry, eq(entry.id, declaration.entryId))
    .where(and(eq(entry.eventId, eventId), isNotNull(declaration.signedAt)))
    .orderBy(desc(declaration.version))
    .all()
  const newest = new Map<string, Signed | null>()
  for (const { declaration: row } of rows) if (!newest.has(row.entryId)) newest.set(row.entryId, readSigned(row))
  return newest
}
