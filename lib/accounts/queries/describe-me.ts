import 'server-only'
import { and, desc, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { account, crewMember, event, person } from '@/db/schema'
import type { InputOf, OutputOf } from '@/lib/contracts/contract'
import type { me } from '@/lib/contracts/me'
import { can } from '@/lib/permissions/policy'
import type { AccountActor } from '@/lib/platform/actor'
import type { Deps } from '@/lib/platform/command'
import { rolesAt } from '@/lib/platform/roles-at'
import { listSessions } from '@/lib/platform/session'

/** The signed-in person with the events in which they have something to do. */
export function describeMe(_: InputOf<typeof me>, actor: AccountActor, { database }: Pick<Deps, 'database'>): OutputOf<typeof me> {
  const email = database.select({ email: account.email }).from(account).where(eq(account.id, actor.accountId)).get()?.email ?? ''
  const signIns = listSessions(database, actor.accountId).map(({ idHash, ...signIn }) => ({
    ...signIn,
    current: idHash === actor.signInHash,
  }))
  return {
    accountId: actor.accountId,
    name: actor.name,
    email,
    clubRoles: [...actor.clubRoles],
    events: myEvents(database, actor),
    signIns,
  }
}

/** Events of the account, latest first, with the roles held there. Empty for somebody who holds none. */
export function myEvents(database: Db, actor: AccountActor): OutputOf<typeof me>['events'] {
  const rows = can(actor.clubRoles, 'event:see') ? eventsOfClub(database, actor) : eventsOfCrew(database, actor)
  return rows.map((row) => ({ ...row, roles: [...rolesAt(database, actor, row.id)] }))
}

const columns = { id: event.id, name: event.name, venue: event.venue, firstDay: event.firstDay, lastDay: event.lastDay }

function eventsOfClub(database: Db, actor: AccountActor) {
  return database.select(columns).from(event).where(eq(event.clubId, actor.clubId)).orderBy(desc(event.firstDay), event.id).all()
}

function eventsOfCrew(database: Db, actor: AccountActor) {
  return database
    .selectDistinct(columns)
    .from(event)
    .innerJoin(crewMember, eq(crewMember.eventId, event.id))
    .innerJoin(person, eq(person.id, crewMember.personId))
    .where(and(eq(person.accountId, actor.accountId), eq(crewMember.state, 'accepted'), eq(event.clubId, actor.clubId)))
    .orderBy(desc(event.firstDay), event.id)
    .all()
}
