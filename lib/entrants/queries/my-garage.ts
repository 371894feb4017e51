import 'server-only'
import { and, asc, desc, eq, or, sql } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { car, entry, entryPerson, event, kit, person } from '@/db/schema'
import type { Book } from '@/lib/checklist/book'
import type { Figures } from '@/lib/contracts/declaration'
import type { KitKind } from '@/lib/contracts/my-garage'
import type { AccountActor } from '@/lib/platform/actor'
import type { ReadDay } from '../read-day'
import { signedOf } from './declarations-of'
import { addressOf } from './my-entry-row'

export interface MyEntryLine {
  readonly id: string
  readonly number: string
  readonly model: string
  readonly event: string
  readonly venue: string
  readonly firstDay: string
  readonly lastDay: string
  readonly declared: boolean
}

/** The entries this account sits in, the newest event first. */
export function myEntries(database: Db, actor: AccountActor): readonly MyEntryLine[] {
  const email = addressOf(database, actor)
  const isMe = or(
    sql`lower(trim(${person.email})) = ${email}`,
    and(eq(person.accountId, actor.accountId), sql`trim(coalesce(${person.email}, '')) = ''`),
  )
  const rows = database
    .selectDistinct({
      id: entry.id,
      number: entry.number,
      model: car.model,
      event: event.name,
      venue: event.venue,
      firstDay: event.firstDay,
      lastDay: event.lastDay,
    })
    .from(entryPerson)
    .innerJoin(person, eq(person.id, entryPerson.personId))
    .innerJoin(entry, eq(entry.id, entryPerson.entryId))
    .innerJoin(car, eq(car.id, entry.carId))
    .innerJoin(event, eq(event.id, entry.eventId))
    .where(and(eq(entry.clubId, actor.clubId), isMe))
    .orderBy(desc(event.firstDay), asc(entry.number))
    .all()
  return rows.map((row) => ({ ...row, declared: signedOf(database, row.id) !== null }))
}

export interface MyCar {
  readonly id: string
  readonly model: string
  readonly colour: string
  readonly plate: string
  readonly facts: Figures
}

const carColumns = { id: car.id, model: car.model, colour: car.colour, plate: car.plate, facts: car.facts }

/** The cars of this account. */
export function myCars(database: Db, actor: AccountActor): readonly MyCar[] {
  const mine = and(eq(car.clubId, actor.clubId), eq(car.ownerAccountId, actor.accountId))
  return database.select(carColumns).from(car).where(mine).orderBy(asc(car.model), asc(car.plate)).all()
}

/** One of them; null for anybody else's as for one that never was. */
export function myCar(database: Db, actor: AccountActor, carId: string): MyCar | null {
  return myCars(database, actor).find(({ id }) => id === carId) ?? null
}

export interface MyKit {
  readonly id: string
  readonly kind: KitKind
  readonly name: string
  readonly values: Figures
  readonly photoHash: string | null
  readonly retired: boolean
}

/** The kit of this account, what was put away last. */
export function myKit(database: Db, actor: AccountActor): readonly MyKit[] {
  return database
    .select({ id: kit.id, kind: kit.kind, name: kit.name, values: kit.values, photoHash: kit.photoHash, retired: kit.retired })
    .from(kit)
    .where(and(eq(kit.clubId, actor.clubId), eq(kit.accountId, actor.accountId)))
    .orderBy(asc(kit.retired), asc(kit.kind), asc(kit.name))
    .all()
}

export interface GarageBook {
  readonly book: Book
  /** Which event's rules these are, and the day kit is judged on. */
  readonly event: string
  readonly lastDay: string
}

/** The rules that cars and kit are shown under outside an entry: those of this account's newest event, else of the club's. Null for a club without one. */
export function garageBook(readDay: ReadDay, database: Db, actor: AccountActor, now: number): GarageBook | null {
  const [own] = myEntries(database, actor)
  const newest = database.select().from(event).where(eq(event.clubId, actor.clubId)).orderBy(desc(event.firstDay)).all()
  const row = newest.find(({ name, firstDay }) => name === own?.event && firstDay === own.firstDay) ?? newest[0]
  const book = row && readDay(database, row.id, now)?.bookOf(row.checklistHash, row.limitsHash)
  return row && book ? { book, event: row.name, lastDay: row.lastDay } : null
}
