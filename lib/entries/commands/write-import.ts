import 'server-only'
import { and, eq, inArray, sql } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { car, entry, entryImport as importTable, entryPerson, event, person, runGroup } from '@/db/schema'
import { assert } from '@/lib/platform/assert'
import { revokeLinksOfOldAddress } from '@/lib/platform/make-entry-link'
import { newId } from '@/lib/platform/ids'
import { writeAudit } from '@/lib/platform/write-audit'
import { foldWord, plateKey } from '../entry-row'
import type { EntryChange } from '../plan-import'
import type { ListPlan } from '../plan-list'
import type { PlannedEntry } from '../planned-entry'
import type { OnePerson } from '../resolve-people'

/** The audit's word for an import. */
export const IMPORTED = 'entries-imported'
/** Rows of one INSERT: SQLite takes 32,766 values at once. */
const BATCH = 500

export interface ImportToWrite {
  readonly target: typeof event.$inferSelect
  readonly planned: ListPlan
  readonly groups: readonly (typeof runGroup.$inferSelect)[]
  readonly now: number
  readonly accountId: string
  readonly fileName: string
  readonly fileHash: string
  readonly planHash: string
}

interface Writing extends ImportToWrite {
  readonly tx: Db
  readonly groupIds: Map<string, string>
  readonly carIds: Map<string, string>
  readonly personIds: Map<OnePerson, string>
  /** People the event has already, by name with e-mail and by name with mobile. */
  readonly known: ReadonlyMap<string, string>
  readonly cars: (typeof car.$inferInsert)[]
  readonly people: (typeof person.$inferInsert)[]
  readonly entries: (typeof entry.$inferInsert)[]
  readonly seats: (typeof entryPerson.$inferInsert)[]
}

/** Writes what was planned; inside the caller's transaction. */
export function writeImport(tx: Db, to: ImportToWrite): void {
  const { target, planned, groups } = to
  const { plan } = planned
  assert(target.nextEntryCode + plan.add.length <= 65_536, 'an event has at most 65535 entry codes')
  const writing: Writing = {
    ...to,
    tx,
    groupIds: new Map(groups.map(({ name, id }) => [name, id])),
    carIds: knownCars(tx, target.clubId),
    personIds: new Map(),
    known: knownPeople(tx, target.id),
    cars: [],
    people: [],
    entries: [],
    seats: [],
  }
  plan.add.forEach((one, index) => addEntry(writing, one, target.nextEntryCode + index))
  // In two steps: numbers may change places within one list.
  for (const { entry: known } of plan.change.filter(({ fields }) => fields.includes('number')))
    tx.update(entry)
      .set({ number: `~${known.id}` })
      .where(eq(entry.id, known.id))
      .run()
  const changes = plan.change.map((change) => () => changeEntry(writing, change))
  const carsOfChanges = plan.change.map(({ planned: one }) => carFor(writing, one))
  assert(carsOfChanges.length === changes.length, 'a change without a car')
  inBatches(writing.cars, (rows) => tx.insert(car).values(rows).run())
  for (const change of changes) change()
  inBatches(writing.people, (rows) => tx.insert(person).values(rows).run())
  inBatches(writing.entries, (rows) => tx.insert(entry).values(rows).run())
  inBatches(writing.seats, (rows) => tx.insert(entryPerson).values(rows).onConflictDoNothing().run())
  finish(writing)
}

function inBatches<T>(rows: readonly T[], write: (batch: T[]) => unknown): void {
  for (let from = 0; from < rows.length; from += BATCH) write(rows.slice(from, from + BATCH))
}

function finish({ tx, target, planned: { plan }, now, accountId, fileName, fileHash, planHash }: Writing): void {
  const { clubId, id: eventId } = target
  const [added, changed, unchanged] = [plan.add.length, plan.change.length, plan.unchanged]
  if (added + changed > 0)
    tx.update(event)
      .set({ nextEntryCode: target.nextEntryCode + added, snapshotVersion: sql`${event.snapshotVersion} + 1` })
      .where(eq(event.id, eventId))
      .run()
  const id = newId()
  tx.insert(importTable)
    .values({ id, clubId, eventId, textHash: fileHash, fileName, added, changed, unchanged, byAccountId: accountId, at: now })
    .run()
  const entries = plan.change.map(({ entry: one }) => one.id)
  writeAudit(tx, {
    clubId,
    eventId,
    at: now,
    accountId,
    action: IMPORTED,
    detail: { import: id, added, changed, unchanged, planHash, entries },
  })
}

function addEntry(writing: Writing, one: PlannedEntry, code: number): void {
  const { target } = writing
  const id = newId()
  const { number, plate, note, passengerSeats } = one
  writing.entries.push({
    id,
    clubId: target.clubId,
    eventId: target.id,
    carId: carFor(writing, one),
    code,
    number,
    plate,
    groupId: groupFor(writing, one.group),
    facts: {},
    note,
    passengerSeats,
    withdrawn: false,
  })
  for (const seat of one.people) seatIn(writing, id, writing.planned.people.of(seat), seat.role)
}

function changeEntry(writing: Writing, { entry: known, planned: one, people }: EntryChange): void {
  const { tx } = writing
  const { number, plate, note, passengerSeats } = one
  tx.update(entry)
    .set({
      carId: carFor(writing, one),
      number,
      plate,
      groupId: groupFor(writing, one.group),
      note,
      passengerSeats,
      version: sql`${entry.version} + 1`,
    })
    .where(eq(entry.id, known.id))
    .run()
  for (const { id, name, email, mobile } of people.contacts) {
    revokeLinksOfOldAddress(tx, id, email || null, writing.now)
    tx.update(person)
      .set({ name, email: email || null, mobile: mobile || null })
      .where(eq(person.id, id))
      .run()
  }
  if (people.remove.length > 0)
    tx.delete(entryPerson)
      .where(and(eq(entryPerson.entryId, known.id), eq(entryPerson.role, 'driver'), inArray(entryPerson.personId, [...people.remove])))
      .run()
  for (const { who, role } of people.add) seatIn(writing, known.id, who, role)
}

function seatIn(writing: Writing, entryId: string, who: OnePerson, role: 'driver' | 'passenger' | 'instructor'): void {
  writing.seats.push({ clubId: writing.target.clubId, entryId, personId: personFor(writing, who), role })
}

/** One human has one id, in whatever cars they sit and whichever list named them first. */
function personFor(writing: Writing, who: OnePerson): string {
  const { target, personIds, known } = writing
  const here =
    personIds.get(who) ??
    namesOf(who)
      .map((key) => known.get(key))
      .find((id) => id !== undefined)
  const id = here ?? newId()
  if (here === undefined)
    writing.people.push({
      id,
      clubId: target.clubId,
      eventId: target.id,
      accountId: null,
      name: who.name,
      email: who.email || null,
      mobile: who.mobile || null,
    })
  personIds.set(who, id)
  return id
}

function knownPeople(tx: Db, eventId: string): ReadonlyMap<string, string> {
  const rows = tx.select().from(person).where(eq(person.eventId, eventId)).all()
  return new Map(
    rows.flatMap(({ id, name, email, mobile }) =>
      namesOf({ name, email: email ?? '', mobile: mobile ?? '' }).map((key) => [key, id] as const),
    ),
  )
}

/** The same name with the same e-mail is one person; with the same mobile too, where there is no e-mail to say otherwise. */
function namesOf({ name, email, mobile }: { readonly name: string; readonly email: string; readonly mobile: string }): readonly string[] {
  const digits = mobile.replace(/\D/g, '')
  if (email !== '') return [`${foldWord(name)}\n${email}`]
  return digits === '' ? [] : [`${foldWord(name)}\n${digits}`]
}

function groupFor({ tx, target, groupIds }: Writing, name: string): string {
  const known = groupIds.get(name)
  if (known !== undefined) return known
  const id = newId()
  tx.insert(runGroup)
    .values({ id, clubId: target.clubId, eventId: target.id, name, order: groupIds.size + 1, firstSessionAt: null })
    .run()
  groupIds.set(name, id)
  return id
}

/** The club's car with this plate; a car of another model or colour under the same plate is another car. */
function carFor({ target, carIds, cars }: Writing, { plate, model, colour }: PlannedEntry): string {
  const key = carKey(plateKey(plate), model, colour)
  const known = carIds.get(key)
  if (known !== undefined) return known
  const id = newId()
  cars.push({ id, clubId: target.clubId, model, colour, plate: plateKey(plate) })
  carIds.set(key, id)
  return id
}

function knownCars(tx: Db, clubId: string): Map<string, string> {
  const rows = tx
    .select({ id: car.id, plate: car.plate, model: car.model, colour: car.colour })
    .from(car)
    .where(eq(car.clubId, clubId))
    .all()
  return new Map(rows.map(({ id, plate, model, colour }) => [carKey(plate, model, colour), id]))
}

function carKey(plate: string, model: string, colour: string): string {
  return `${plate}\n${model}\n${colour}`
}
