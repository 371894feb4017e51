import 'server-only'
import { and, asc, eq, inArray, isNull, lte } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { mailOutbox } from '@/db/schema'
import { transaction } from '@/db/transaction'
import { log } from '@/lib/platform/log'
import { nextTry } from '../next-try'
import { MailFailure, type MailSender } from '../port'

/** Taken by one sender for this long: should it be killed in the middle, another takes it up again, ms. */
const CLAIM_MS = 600_000
const AT_ONCE = 4

type Row = typeof mailOutbox.$inferSelect

export interface MailWorld {
  readonly database: Db
  readonly sender: MailSender
  readonly now: () => number
  /** 0 to 1, for jitter. */
  readonly random: () => number
}

export interface SentMail {
  readonly sent: number
  /** To be tried again, or given up. */
  readonly failed: number
}

/**
 * Sends a few of the mails that are due, each claimed before it is sent, so that two senders never send one at the same time. A mail that is
 * not taken is kept: tried again with growing waits, given up after a day or when the server will never take it, and shown to the organiser.
 */
export async function sendDueMail(world: MailWorld): Promise<SentMail> {
  const outcomes = await Promise.all(claim(world).map((row) => sendOne(world, row)))
  return { sent: outcomes.filter(Boolean).length, failed: outcomes.filter((isSent) => !isSent).length }
}

function claim({ database, now }: MailWorld): readonly Row[] {
  const at = now()
  return transaction(database, (tx) => {
    const due = tx
      .select()
      .from(mailOutbox)
      .where(and(isNull(mailOutbox.sentAt), isNull(mailOutbox.failedAt), lte(mailOutbox.nextTryAt, at)))
      .orderBy(asc(mailOutbox.nextTryAt), asc(mailOutbox.id))
      .limit(AT_ONCE)
      .all()
    const ids = due.map(({ id }) => id)
    tx.update(mailOutbox)
      .set({ nextTryAt: at + CLAIM_MS })
      .where(inArray(mailOutbox.id, ids))
      .run()
    return due
  })
}

async function sendOne(world: MailWorld, { id, to, subject, text, tries }: Row): Promise<boolean> {
  try {
    await world.sender.send({ id, to, subject, text })
    note(world, id, { tries: tries + 1, sentAt: world.now(), lastError: null })
    return true
  } catch (error) {
    note(world, id, { tries: tries + 1, ...afterFailure(error, tries + 1, world) })
    return false
  }
}

function afterFailure(error: unknown, tries: number, { now, random }: MailWorld): Partial<Row> {
  // A bug of ours must not lose a mail either: it is tried again like any other, and logged.
  if (!(error instanceof MailFailure)) log.error({ err: error }, 'sending a mail threw')
  const [when, lastError] = error instanceof MailFailure ? [error.when, error.words] : ['later', 'Something in Lockwire went wrong.']
  const wait = when === 'never' ? null : nextTry(tries, random())
  return wait === null ? { lastError, failedAt: now() } : { lastError, nextTryAt: now() + wait }
}

function note({ database }: MailWorld, id: string, set: Partial<Row>): void {
  database.update(mailOutbox).set(set).where(eq(mailOutbox.id, id)).run()
}
