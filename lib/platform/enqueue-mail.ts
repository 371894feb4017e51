import 'server-only'
import { and, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { mailOutbox } from '@/db/schema'
import { newId } from '@/lib/platform/ids'

export interface MailToSend extends Pick<typeof mailOutbox.$inferInsert, 'kind' | 'to' | 'subject' | 'text'> {
  readonly clubId: string
  readonly eventId: string | null
  readonly entryId: string | null
  /** What makes it the same mail, such as `invitation:<entry>`: a second one is not written. */
  readonly sameAs: string
}

/** Writes a mail into the outbox, inside the transaction that causes it. Gives false where the same mail is there already. */
export function enqueueMail(tx: Db, mail: MailToSend, now: number): boolean {
  const known = tx
    .select({ id: mailOutbox.id })
    .from(mailOutbox)
    .where(and(eq(mailOutbox.clubId, mail.clubId), eq(mailOutbox.sameAs, mail.sameAs)))
    .get()
  if (known) return false
  tx.insert(mailOutbox)
    .values({ ...mail, id: newId(), createdAt: now, nextTryAt: now })
    .run()
  return true
}
