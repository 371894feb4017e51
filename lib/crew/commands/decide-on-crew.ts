import 'server-only'
import { eq, sql } from 'drizzle-orm'
import { crewMember, event as eventTable } from '@/db/schema'
import { transaction } from '@/db/transaction'
import type { InputOf, OutputOf } from '@/lib/contracts/contract'
import type { decideCrew } from '@/lib/contracts/crew'
import type { AccountActor } from '@/lib/platform/actor'
import type { Deps } from '@/lib/platform/command'
import { announce } from '@/lib/platform/live'
import { ownEvent } from '@/lib/platform/own-event'
import { isRefusal, type Refusal, refuse } from '@/lib/platform/refusal'
import { writeAudit } from '@/lib/platform/write-audit'
import { crewMemberOf } from '../queries/see-crew'

const DECISIONS = {
  accept: { from: 'waiting', to: 'accepted', action: 'crew-accepted' },
  refuse: { from: 'waiting', to: 'refused', action: 'crew-refused' },
  end: { from: 'accepted', to: 'ended', action: 'crew-ended' },
} as const

/** Accepts or refuses who waits, or ends a role. A decision stands: who was refused or ended asks again by a new code. */
export function decideOnCrew(
  { params, body }: InputOf<typeof decideCrew>,
  actor: AccountActor,
  { database, now }: Pick<Deps, 'database' | 'now'>,
): OutputOf<typeof decideCrew> | Refusal {
  const event = ownEvent(database, actor, params.event)
  if (!event) return refuse('missing')
  const { from, to, action } = DECISIONS[body.decision]
  const result = transaction(database, (tx) => {
    const member = crewMemberOf(tx, event.id, body.member)
    if (!member) return refuse('missing')
    // Asked twice (a lost answer, two organisers of one mind): the answer is the same and nothing is written again.
    if (member.state === to) return member
    if (member.state !== from) return refuse('crew-decided')
    tx.update(crewMember).set({ state: to, decidedAt: now, decidedByAccountId: actor.accountId }).where(eq(crewMember.id, member.id)).run()
    tx.update(eventTable)
      .set({ snapshotVersion: sql`${eventTable.snapshotVersion} + 1` })
      .where(eq(eventTable.id, event.id))
      .run()
    const detail = { member: member.id, role: member.role }
    writeAudit(tx, { clubId: event.clubId, eventId: event.id, at: now, accountId: actor.accountId, action, detail })
    return { ...member, state: to, decidedAt: now }
  })
  if (!isRefusal(result)) announce(event.id)
  return result
}
