import 'server-only'
import { and, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { account, crewMember, person } from '@/db/schema'
import { transaction } from '@/db/transaction'
import type { InputOf, OutputOf } from '@/lib/contracts/contract'
import type { openEntryLink } from '@/lib/contracts/entry-link'
import type { AccountActor, Actor } from '@/lib/platform/actor'
import type { Deps } from '@/lib/platform/command'
import { newId } from '@/lib/platform/ids'
import { hashPassword } from '@/lib/platform/password'
import { isRefusal, type Refusal, refuse } from '@/lib/platform/refusal'
import { secretToken } from '@/lib/platform/secret-token'
import { endSession, startSession } from '@/lib/platform/session'
import { writeAudit } from '@/lib/platform/write-audit'
import { findEntryLink, type FoundLink, isOwner } from '../queries/find-entry-link'

/**
 * Signs in the person a link was sent to, who becomes an entrant of the club by it. It opens no account that may do more than an entrant:
 * whoever can read a mailbox, or write an address into an entry, must not become an organiser or crew by it.
 */
export async function openLink(
  { params }: InputOf<typeof openEntryLink>,
  actor: Actor,
  deps: Deps,
): Promise<OutputOf<typeof openEntryLink> | Refusal> {
  const { database, now } = deps
  const found = findEntryLink(database, params.token, now)
  if (found === null) return refuse('entry-link-over')
  if (actor.kind === 'account' && isOwner(database, actor, found)) {
    transaction(database, (tx) => becomeEntrant(tx, actor.accountId, found))
    return { entry: found.entry.id }
  }
  // Nobody knows this password; it is there because every account has one, and can be chosen anew by mail.
  const nobodys = await hashPassword(secretToken())
  const accountId = transaction(database, (tx) => accountFor(tx, found, nobodys, now))
  if (isRefusal(accountId)) return accountId
  if (actor.kind === 'account') endOther(deps, actor)
  deps.replyHeaders.append('set-cookie', await startSession(database, accountId, deps.userAgent))
  const { clubId, eventId, id } = found.entry
  writeAudit(database, { clubId, eventId, at: now, accountId, action: 'signed-in-by-entry-link', detail: { entry: id } })
  return { entry: id }
}

function endOther({ database }: Deps, actor: AccountActor): void {
  endSession(database, actor.signInHash)
}

function accountFor(tx: Db, found: FoundLink, passwordHash: string, now: number): string | Refusal {
  const { person: sentTo } = found
  const email = sentTo.email?.trim().toLowerCase() ?? ''
  const isMeant = email === '' ? eq(account.id, sentTo.accountId ?? '') : eq(account.email, email)
  const known = tx
    .select()
    .from(account)
    .where(and(eq(account.clubId, sentTo.clubId), isMeant))
    .get()
  if (known === undefined && email === '') return refuse('entry-link-no-address')
  if (known && mayMore(tx, known)) return refuse('entry-link-needs-password')
  const id = known?.id ?? newId()
  if (!known) {
    const { clubId, name } = sentTo
    tx.insert(account)
      .values({ id, clubId, email, name, passwordHash, roles: ['entrant'], createdAt: now })
      .run()
  }
  becomeEntrant(tx, id, found)
  return id
}

/** Organisers, admins, and whoever is or was crew anywhere. */
function mayMore(tx: Db, row: typeof account.$inferSelect): boolean {
  if (row.roles.some((role) => role !== 'entrant')) return true
  const crew = tx
    .select({ id: crewMember.id })
    .from(crewMember)
    .innerJoin(person, eq(person.id, crewMember.personId))
    .where(eq(person.accountId, row.id))
    .get()
  return crew !== undefined
}

function becomeEntrant(tx: Db, accountId: string, { person: sentTo }: FoundLink): void {
  const row = tx.select({ roles: account.roles }).from(account).where(eq(account.id, accountId)).get()
  if (row && !row.roles.includes('entrant'))
    tx.update(account)
      .set({ roles: [...row.roles, 'entrant'] })
      .where(eq(account.id, accountId))
      .run()
  if (sentTo.accountId !== accountId) tx.update(person).set({ accountId }).where(eq(person.id, sentTo.id)).run()
}
