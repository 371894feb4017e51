import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import { club } from './club'

/** A photograph: the row names it, the store holds its bytes. Named by the SHA-256 of what the phone sent, as records and declarations name it. */
export const photo = sqliteTable(
  'photo',
  {
    hash: text('hash').primaryKey(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    /** The event it was taken at; null for a label in an entrant's own kit. */
    eventId: text('event_id'),
    /** Who put it there, where it was no crew device. */
    accountId: text('account_id'),
    deviceId: text('device_id'),
    /** SHA-256 of what is stored: re-encoded, without metadata. */
    storedHash: text('stored_hash').notNull(),
    width: integer('width').notNull(),
    height: integer('height').notNull(),
    bytes: integer('bytes').notNull(),
    receivedAt: integer('received_at').notNull(),
  },
  (table) => [index('photo_event').on(table.eventId)],
)
