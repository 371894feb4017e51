import 'server-only'
import type { Db } from '@/db/client'
import type { event } from '@/db/schema'
import { transaction } from '@/db/transaction'
import type { writeMailing } from '@/lib/contracts/mail'
import type { Command } from '@/lib/platform/command'
import { enqueueMail } from '@/lib/platform/enqueue-mail'
import { makeEntryLink } from '@/lib/platform/make-entry-link'
import { ownEvent } from '@/lib/platform/own-event'
import { refuse } from '@/lib/platform/refusal'
import { writeAudit } from '@/lib/platform/write-audit'
import type { MailReaders } from '../mail-readers'
import { type PlannedMail, planMailing } from '../plan-mailing'
import { mailingFacts } from '../queries/mailing-facts'

/** Writes what the person has seen counted, all in one transaction; where the count is another one by now, nothing. */
export function writeMailingBy(readers: MailReaders): Command<typeof writeMailing> {
  return ({ params, body }, actor, { database, now, origin }) => {
    const own = ownEvent(database, actor, params.event)
    if (!own) return refuse('missing')
    return transaction(database, (tx) => {
      const planned = planMailing(body.what, mailingFacts(tx, own, readers, now))
      if (planned.length !== body.expected) return refuse('mail-count-changed')
      writePlanned(tx, own, planned, origin, now)
      const detail = { what: body.what, mails: planned.length }
      writeAudit(tx, { clubId: own.clubId, eventId: own.id, at: now, accountId: actor.accountId, action: 'mail-written', detail })
      return { written: planned.length }
    })
  }
}

/** Writes planned mails into the outbox, each with a link of its own. Gives how many were new. */
export function writePlanned(tx: Db, own: typeof event.$inferSelect, planned: readonly PlannedMail[], origin: string, now: number): number {
  return planned.filter(({ kind, sameAs, receiver, text }) => {
    const { entry, person, to } = receiver
    // A result says all there is to say; everything else leads to the entry.
    const link = kind === 'result' ? '' : origin + makeEntryLink(tx, { ...own, ...entry, eventId: own.id }, person, now).path
    return enqueueMail(tx, { kind, sameAs, to, ...text(link), clubId: own.clubId, eventId: own.id, entryId: entry.id }, now)
  }).length
}
