import 'server-only'
import { eq } from 'drizzle-orm'
import { crewMember, event, person } from '@/db/schema'
import type { InputOf, OutputOf } from '@/lib/contracts/contract'
import type { joinState } from '@/lib/contracts/join'
import type { Actor } from '@/lib/platform/actor'
import type { Deps } from '@/lib/platform/command'
import { type Refusal, refuse } from '@/lib/platform/refusal'
import { sha256 } from '@/lib/platform/sha256'
import { eventView } from '../event-view'

/** Whether the holder of a claim has been accepted yet. */
export function describeClaim(
  { body }: InputOf<typeof joinState>,
  _: Actor,
  { database }: Pick<Deps, 'database'>,
): OutputOf<typeof joinState> | Refusal {
  const row = database
    .select({ member: crewMember, person, event })
    .from(crewMember)
    .innerJoin(person, eq(person.id, crewMember.personId))
    .innerJoin(event, eq(event.id, crewMember.eventId))
    .where(eq(crewMember.claimHash, sha256(body.claim)))
    .get()
  if (!row) return refuse('claim-unknown')
  return { state: row.member.state, name: row.person.name, person: row.person.id, role: row.member.role, event: eventView(row.event) }
}
