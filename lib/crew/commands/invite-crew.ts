import 'server-only'
import { and, eq, sql } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { account, crewMember, event as eventTable, passwordLink } from '@/db/schema'
import { transaction } from '@/db/transaction'
import type { inviteCrew as contract } from '@/lib/contracts/crew-invite'
import type { Command } from '@/lib/platform/command'
import { enqueueMail } from '@/lib/platform/enqueue-mail'
import { newId } from '@/lib/platform/ids'
import { announce } from '@/lib/platform/live'
import { ownEvent } from '@/lib/platform/own-event'
import { hashPassword } from '@/lib/platform/password'
import { personOfAccount } from '@/lib/platform/person-of-account'
import { refuse } from '@/lib/platform/refusal'
import { secretToken } from '@/lib/platform/secret-token'
import { sha256 } from '@/lib/platform/sha256'
import { writeAudit } from '@/lib/platform/write-audit'
import type { CrewRole } from '@/lib/permissions/policy'
import { invitationText } from '../invitation-text'

const LINK_LIFETIME_MS = 7 * 86_400_000

type EventRow = typeof eventTable.$inferSelect
interface Invited {
  readonly accountId: string
  readonly name: string
  readonly email: string
}

/** Makes the account where there is none, the person and the accepted role, and the mail that tells of it: all in one transaction, or nothing. */
export const inviteCrew: Command<typeof contract> = async ({ params, body }, actor, { database, now, origin }) => {
  const event = ownEvent(database, actor, params.event)
  if (!event) return refuse('missing')
  // A password nobody knows, so that nobody signs in before the link was used. Dear, so outside the transaction.
  const nobodysPassword = await hashPassword(secretToken())
  const email = body.email.toLowerCase()
  const answer = transaction(database, (tx) => {
    const known = tx
      .select()
      .from(account)
      .where(and(eq(account.clubId, event.clubId), eq(account.email, email)))
      .get()
    const invited: Invited = { accountId: known?.id ?? newId(), name: known?.name ?? body.name, email }
    if (!known)
      tx.insert(account)
        .values({
          id: invited.accountId,
          clubId: event.clubId,
          email,
          name: body.name,
          passwordHash: nobodysPassword,
          roles: [],
          createdAt: now,
        })
        .run()
    const isAdded = giveRole(tx, event, invited, body.role, actor.accountId, now)
    if (isAdded) {
      const link = known ? `${origin}/sign-in` : `${origin}/password/${passwordLinkFor(tx, event.clubId, invited.accountId, now)}`
      const mail = invitationText({ name: invited.name, role: body.role, event: event.name, by: actor.name, link, isNew: !known })
      const sameAs = `crew-invitation:${event.id}:${invited.accountId}:${body.role}:${now}`
      enqueueMail(tx, { ...mail, kind: 'crew-invitation', to: email, clubId: event.clubId, eventId: event.id, entryId: null, sameAs }, now)
      const detail = { account: invited.accountId, role: body.role }
      writeAudit(tx, { clubId: event.clubId, eventId: event.id, at: now, accountId: actor.accountId, action: 'crew-invited', detail })
    }
    return { isNew: !known, isAdded }
  })
  if (answer.isAdded) announce(event.id)
  return answer
}

/** Gives the role; false where it stands already. One that had ended or was refused stands again: an organiser says so. */
function giveRole(tx: Db, event: EventRow, { accountId, name }: Invited, role: CrewRole, by: string, now: number): boolean {
  const personId = personOfAccount(tx, event, { accountId, name })
  const held = tx
    .select()
    .from(crewMember)
    .where(and(eq(crewMember.eventId, event.id), eq(crewMember.personId, personId), eq(crewMember.role, role)))
    .get()
  if (held?.state === 'accepted') return false
  const decided = { state: 'accepted', decidedAt: now, decidedByAccountId: by } as const
  if (held) tx.update(crewMember).set(decided).where(eq(crewMember.id, held.id)).run()
  else
    tx.insert(crewMember)
      .values({ ...decided, id: newId(), clubId: event.clubId, eventId: event.id, personId, role, askedAt: now })
      .run()
  tx.update(eventTable)
    .set({ snapshotVersion: sql`${eventTable.snapshotVersion} + 1` })
    .where(eq(eventTable.id, event.id))
    .run()
  return true
}

function passwordLinkFor(tx: Db, clubId: string, accountId: string, now: number): string {
  const token = secretToken()
  tx.insert(passwordLink)
    .values({ tokenHash: sha256(token), clubId, accountId, createdAt: now, expiresAt: now + LINK_LIFETIME_MS })
    .run()
  return token
}
