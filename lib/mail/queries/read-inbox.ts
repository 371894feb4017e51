import 'server-only'
import { and, desc, eq, isNotNull } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { mailOutbox } from '@/db/schema'

const MOST = 200

export interface InboxMail {
  readonly id: string
  readonly to: string
  readonly subject: string
  readonly text: string
  readonly sentAt: number
}

/** The club's mail as it would have arrived, the newest first; for the demo's inbox page. */
export function readInbox(database: Db, clubId: string): readonly InboxMail[] {
  return database
    .select()
    .from(mailOutbox)
    .where(and(eq(mailOutbox.clubId, clubId), isNotNull(mailOutbox.sentAt)))
    .orderBy(desc(mailOutbox.sentAt), desc(mailOutbox.id))
    .limit(MOST)
    .all()
    .map(({ id, to, subject, text, sentAt }) => ({ id, to, subject, text, sentAt: sentAt ?? 0 }))
}
