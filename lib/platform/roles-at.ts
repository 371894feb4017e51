import 'server-only'
import { and, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { crewMember, person } from '@/db/schema'
import type { Role } from '@/lib/permissions/policy'
import type { Actor } from './actor'

/**
 * The roles an actor holds at an event (null: in the club as a whole). Asked before anything is looked up, so that it says nothing of
 * whether the event exists: an account's club roles hold anywhere, and the command then answers `missing` for another club's event.
 */
export function rolesAt(database: Db, actor: Actor, eventId: string | null): readonly Role[] {
  switch (actor.kind) {
    case 'nobody':
      return []
    case 'device':
      return eventId === null || eventId === actor.eventId ? unique(actor.people.flatMap(({ roles }) => roles)) : []
    case 'account':
      return eventId === null ? actor.clubRoles : unique([...actor.clubRoles, ...crewRolesOf(database, actor.accountId, eventId)])
  }
}

function crewRolesOf(database: Db, accountId: string, eventId: string): readonly Role[] {
  return database
    .select({ role: crewMember.role })
    .from(crewMember)
    .innerJoin(person, eq(person.id, crewMember.personId))
    .where(and(eq(crewMember.eventId, eventId), eq(person.accountId, accountId), eq(crewMember.state, 'accepted')))
    .all()
    .map(({ role }) => role)
}

function unique(roles: readonly Role[]): readonly Role[] {
  return [...new Set(roles)]
}
