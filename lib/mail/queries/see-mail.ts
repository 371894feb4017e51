import 'server-only'
import { and, desc, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { entry, mailOutbox } from '@/db/schema'
import { type eventMail, MAILINGS, type MailView } from '@/lib/contracts/mail'
import type { Command } from '@/lib/platform/command'
import { env } from '@/lib/platform/env'
import { ownEvent } from '@/lib/platform/own-event'
import { refuse } from '@/lib/platform/refusal'
import type { MailReaders } from '../mail-readers'
import { planMailing } from '../plan-mailing'
import { driversOf, mailingFacts } from './mailing-facts'

const ORDER = { 'given-up': 0, waits: 1, sent: 2 } as const

/** The mail of an event of one's own club. */
export function seeMail(readers: MailReaders): Command<typeof eventMail> {
  return ({ params }, actor, { database, now }) => {
    const own = ownEvent(database, actor, params.event)
    if (!own) return refuse('missing')
    const facts = mailingFacts(database, own, readers, now)
    const counts = MAILINGS.map((what) => [what, planMailing(what, facts).length] as const)
    const drivers = driversOf(database, own.id)
    return {
      sender: env().smtp === null ? 'inbox' : 'smtp',
      due: Object.fromEntries(counts) as Record<(typeof MAILINGS)[number], number>,
      drivers: drivers.length,
      withoutAddress: drivers.filter(({ to }) => to === null).map((each) => ({ number: each.entry.number, name: each.person.name })),
      mails: [...mailsOf(database, own.id)].sort((a, b) => ORDER[a.state] - ORDER[b.state]),
    }
  }
}

/** Every mail of an event, the newest first. */
function mailsOf(database: Db, eventId: string): readonly MailView[] {
  return database
    .select({ mail: mailOutbox, number: entry.number })
    .from(mailOutbox)
    .leftJoin(entry, eq(entry.id, mailOutbox.entryId))
    .where(eq(mailOutbox.eventId, eventId))
    .orderBy(desc(mailOutbox.createdAt), desc(mailOutbox.id))
    .all()
    .map(mailViewOf)
}

/** One mail of an event; null where there is none of this id. */
export function mailOf(database: Db, eventId: string, mailId: string): MailView | null {
  const row = database
    .select({ mail: mailOutbox, number: entry.number })
    .from(mailOutbox)
    .leftJoin(entry, eq(entry.id, mailOutbox.entryId))
    .where(and(eq(mailOutbox.eventId, eventId), eq(mailOutbox.id, mailId)))
    .get()
  return row ? mailViewOf(row) : null
}

function mailViewOf({ mail, number }: { readonly mail: typeof mailOutbox.$inferSelect; readonly number: string | null }): MailView {
  const { id, kind, to, subject, createdAt, tries, sentAt, failedAt, lastError } = mail
  const state = sentAt !== null ? 'sent' : failedAt !== null ? 'given-up' : 'waits'
  const nextTryAt = state === 'waits' ? mail.nextTryAt : null
  return { id, kind, number: number ?? '', to, subject, createdAt, state, tries, nextTryAt, sentAt, why: lastError }
}
