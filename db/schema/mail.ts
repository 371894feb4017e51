import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { club } from './club'

/** Mail to be sent, written in the transaction that causes it, so that neither is there without the other. Sent mail stays, for the demo's inbox and the report. */
export const mailOutbox = sqliteTable(
  'mail_outbox',
  {
    id: text('id').primaryKey(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    eventId: text('event_id'),
    entryId: text('entry_id'),
    kind: text('kind', { enum: ['invitation', 'declaration-reminder', 'would-not-be-passed', 'result', 'crew-invitation'] }).notNull(),
    to: text('to').notNull(),
    subject: text('subject').notNull(),
    text: text('text').notNull(),
    /** What makes it the same mail: it is written once. */
    sameAs: text('same_as').notNull(),
    createdAt: integer('created_at').notNull(),
    nextTryAt: integer('next_try_at').notNull(),
    tries: integer('tries').notNull().default(0),
    sentAt: integer('sent_at'),
    /** Given up, for good; a person may ask again. */
    failedAt: integer('failed_at'),
    lastError: text('last_error'),
  },
  (table) => [uniqueIndex('mail_outbox_same').on(table.clubId, table.sameAs), index('mail_outbox_next').on(table.nextTryAt)],
)
