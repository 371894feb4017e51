import 'server-only'
import { and, eq, or, sql } from 'drizzle-orm'
import { alias } from 'drizzle-orm/sqlite-core'
import type { Db } from '@/db/client'
import { car, crewMember, declaration, entry, entryPerson, kit, person, type photo } from '@/db/schema'
import { can } from '@/lib/permissions/policy'
import type { AccountActor, DeviceActor } from '@/lib/platform/actor'
import { rolesAt } from '@/lib/platform/roles-at'

type Photo = typeof photo.$inferSelect

/**
 * Who may see a photograph of their own club: the club's organisers; who put it there; the entrant whose kit or declaration names it; and the
 * crew of an event that it belongs to. It belongs to the event it was taken at, to one where a declaration names it, and to one where a car
 * is entered that was also entered where it was taken: that is where earlier findings are shown again.
 */
export function maySeePhoto(database: Db, shown: Photo, actor: AccountActor | DeviceActor): boolean {
  if (actor.kind === 'device') return mayAt(database, actor, actor.eventId) && belongsTo(database, shown, actor.eventId)
  if (can(actor.clubRoles, 'photo:see')) return true
  if (shown.accountId === actor.accountId || isNamedBy(database, shown, actor.accountId)) return true
  return crewEvents(database, actor.accountId).some((event) => mayAt(database, actor, event) && belongsTo(database, shown, event))
}

function mayAt(database: Db, actor: AccountActor | DeviceActor, event: string): boolean {
  return can(rolesAt(database, actor, event), 'photo:see')
}

function crewEvents(database: Db, accountId: string): readonly string[] {
  return database
    .selectDistinct({ event: crewMember.eventId })
    .from(crewMember)
    .innerJoin(person, eq(person.id, crewMember.personId))
    .where(and(eq(person.accountId, accountId), eq(crewMember.state, 'accepted')))
    .all()
    .map(({ event }) => event)
}

function belongsTo(database: Db, shown: Photo, event: string): boolean {
  return shown.eventId === event || isDeclaredAt(database, shown, event) || isOfCarAt(database, shown, event)
}

/** A hash stands in a declaration's JSON as it is: hex needs no escape, and nothing else in it is 64 hex digits long by chance. */
function names(shown: Photo) {
  return sql`instr(${declaration.body}, ${shown.hash}) > 0`
}

function isDeclaredAt(database: Db, shown: Photo, event: string): boolean {
  const row = database
    .select({ id: declaration.id })
    .from(declaration)
    .innerJoin(entry, eq(entry.id, declaration.entryId))
    .where(and(eq(entry.eventId, event), names(shown)))
    .get()
  return row !== undefined
}

function isOfCarAt(database: Db, shown: Photo, event: string): boolean {
  if (shown.eventId === null) return false
  const earlier = alias(entry, 'earlier')
  const row = database
    .select({ id: entry.id })
    .from(entry)
    .innerJoin(earlier, eq(earlier.carId, entry.carId))
    .where(and(eq(entry.eventId, event), eq(earlier.eventId, shown.eventId)))
    .get()
  return row !== undefined
}

function isNamedBy(database: Db, shown: Photo, accountId: string): boolean {
  const inKit = database
    .select({ id: kit.id })
    .from(kit)
    .where(and(eq(kit.accountId, accountId), or(eq(kit.photoHash, shown.hash), sql`instr(${kit.values}, ${shown.hash}) > 0`)))
    .get()
  if (inKit) return true
  const declared = database
    .select({ id: declaration.id })
    .from(declaration)
    .innerJoin(entry, eq(entry.id, declaration.entryId))
    .innerJoin(car, eq(car.id, entry.carId))
    .leftJoin(entryPerson, eq(entryPerson.entryId, entry.id))
    .leftJoin(person, eq(person.id, entryPerson.personId))
    .where(and(names(shown), or(eq(car.ownerAccountId, accountId), eq(person.accountId, accountId))))
    .get()
  return declared !== undefined
}
