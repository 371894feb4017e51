import 'server-only'
import { and, asc, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { crewMember, person } from '@/db/schema'
import type { InputOf, OutputOf } from '@/lib/contracts/contract'
import type { CrewMemberView, listCrew } from '@/lib/contracts/crew'
import type { AccountActor } from '@/lib/platform/actor'
import type { Deps } from '@/lib/platform/command'
import { ownEvent } from '@/lib/platform/own-event'
import { type Refusal, refuse } from '@/lib/platform/refusal'

const ORDER = { waiting: 0, accepted: 1, ended: 2, refused: 3 } as const

/** Everybody who is or asks to be crew: who waits first, longest wait on top. */
export function seeCrew(
  { params }: InputOf<typeof listCrew>,
  actor: AccountActor,
  { database }: Pick<Deps, 'database'>,
): OutputOf<typeof listCrew> | Refusal {
  const event = ownEvent(database, actor, params.event)
  if (!event) return refuse('missing')
  const rows = crewRows(database, event.id)
  return { crew: rows.map(crewView).toSorted((a, b) => ORDER[a.state] - ORDER[b.state] || a.askedAt - b.askedAt) }
}

/** One member of the event's crew; null when there is none of this id there. */
export function crewMemberOf(database: Db, eventId: string, memberId: string): CrewMemberView | null {
  const row = crewRows(database, eventId, memberId)[0]
  return row ? crewView(row) : null
}

function crewRows(database: Db, eventId: string, memberId?: string) {
  const ofEvent = eq(crewMember.eventId, eventId)
  return database
    .select({ member: crewMember, person })
    .from(crewMember)
    .innerJoin(person, eq(person.id, crewMember.personId))
    .where(memberId === undefined ? ofEvent : and(ofEvent, eq(crewMember.id, memberId)))
    .orderBy(asc(crewMember.askedAt))
    .all()
}

function crewView({ member, person: who }: ReturnType<typeof crewRows>[number]): CrewMemberView {
  const { id, role, state, askedAt, decidedAt } = member
  return { id, person: who.id, name: who.name, role, state, hasAccount: who.accountId !== null, askedAt, decidedAt }
}
