import 'server-only'
import { and, asc, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { account, car, entry, entryPerson, event, person, runGroup } from '@/db/schema'
import type { AccountActor } from '@/lib/platform/actor'

export interface MyEntryRow {
  readonly entry: typeof entry.$inferSelect
  readonly car: typeof car.$inferSelect
  readonly event: typeof event.$inferSelect
  readonly group: typeof runGroup.$inferSelect
  readonly people: readonly MyEntryPerson[]
}

export interface MyEntryPerson {
  readonly id: string
  readonly name: string
  readonly role: 'driver' | 'passenger' | 'instructor'
  readonly isMe: boolean
}

/** An entry in which this account sits; null for anybody else's as for one that never was. */
export function myEntryRow(database: Db, actor: AccountActor, entryId: string): MyEntryRow | null {
  const people = peopleOf(database, actor, entryId)
  if (!people.some(({ isMe }) => isMe)) return null
  const row = database
    .select({ entry, car, event, group: runGroup })
    .from(entry)
    .innerJoin(car, eq(car.id, entry.carId))
    .innerJoin(event, eq(event.id, entry.eventId))
    .innerJoin(runGroup, eq(runGroup.id, entry.groupId))
    .where(and(eq(entry.id, entryId), eq(entry.clubId, actor.clubId)))
    .get()
  return row === undefined ? null : { ...row, people }
}

/** Whether this account may declare the entry: it drives it. A passenger only looks. */
export function isMyDrive({ people }: Pick<MyEntryRow, 'people'>): boolean {
  return people.some(({ isMe, role }) => isMe && role === 'driver')
}

function peopleOf(database: Db, actor: AccountActor, entryId: string): readonly MyEntryPerson[] {
  const email = addressOf(database, actor)
  return database
    .select({ id: person.id, name: person.name, role: entryPerson.role, accountId: person.accountId, email: person.email })
    .from(entryPerson)
    .innerJoin(person, eq(person.id, entryPerson.personId))
    .where(and(eq(entryPerson.entryId, entryId), eq(entryPerson.clubId, actor.clubId)))
    .orderBy(asc(person.name))
    .all()
    .map(({ id, name, role, ...rest }) => ({ id, name, role, isMe: isPersonOf(rest, actor.accountId, email) }))
}

/** The address of an account, lower-cased. */
export function addressOf(database: Db, actor: AccountActor): string {
  return database.select({ email: account.email }).from(account).where(eq(account.id, actor.accountId)).get()?.email ?? ''
}

/** Whether a person of an event is this account: of its address; without an address, linked to it. An address that was corrected counts at once. */
export function isPersonOf(
  row: { readonly accountId: string | null; readonly email: string | null },
  accountId: string,
  email: string,
): boolean {
  const written = row.email?.trim().toLowerCase() ?? ''
  return written === '' ? row.accountId === accountId : written === email
}
