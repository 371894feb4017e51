import { index, integer, primaryKey, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { club } from './club'
import { event } from './event'

/** The day's log (SYNC S3): numbered per event without gaps, chained, append-only by trigger. */
export const record = sqliteTable(
  'record',
  {
    eventId: text('event_id')
      .notNull()
      .references(() => event.id),
    seq: integer('seq').notNull(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    id: text('id').notNull(),
    /** The signed text, byte for byte as it came. */
    jws: text('jws').notNull(),
    /** SHA-256 of the JWS, hex. */
    hash: text('hash').notNull(),
    /** SHA-256(prev chain ‖ jws ‖ disposition), hex. */
    chain: text('chain').notNull(),
    disposition: text('disposition', { enum: ['accepted', 'quarantined'] }).notNull(),
    code: text('code'),
    kind: text('kind').notNull(),
    subjectKey: text('subject_key').notNull(),
    deviceId: text('device_id').notNull(),
    deviceSeq: integer('device_seq').notNull(),
    receivedAt: integer('received_at').notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.eventId, table.seq] }),
    uniqueIndex('record_id').on(table.id),
    index('record_hash').on(table.hash),
    index('record_subject').on(table.eventId, table.subjectKey),
    index('record_device').on(table.deviceId, table.deviceSeq),
  ],
)

/** Salted free text named by records; the only thing of a record that may be erased. */
export const note = sqliteTable(
  'note',
  {
    hash: text('hash').primaryKey(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    eventId: text('event_id')
      .notNull()
      .references(() => event.id),
    salt: text('salt').notNull(),
    text: text('text').notNull(),
    /** Seq of the event's log when it came, so that a pull finds it. */
    seq: integer('seq').notNull(),
  },
  (table) => [index('note_event').on(table.eventId, table.seq)],
)

/** By what id each pass and band may be looked up. How it stands is never kept: the fold says it. */
export const issuedPass = sqliteTable(
  'issued_pass',
  {
    eventId: text('event_id')
      .notNull()
      .references(() => event.id),
    recordHash: text('record_hash').notNull(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    subjectKey: text('subject_key').notNull(),
    passId: text('pass_id').notNull(),
  },
  (table) => [primaryKey({ columns: [table.eventId, table.recordHash] }), index('issued_pass_id').on(table.eventId, table.passId)],
)

/** What was scanned at the pit exit and what was answered. Append-only by trigger; not part of the log. */
export const scan = sqliteTable(
  'scan',
  {
    id: text('id').primaryKey(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    eventId: text('event_id')
      .notNull()
      .references(() => event.id),
    deviceId: text('device_id').notNull(),
    at: integer('at').notNull(),
    answer: text('answer', { enum: ['PASSED', 'HOLD', 'CHECK'] }).notNull(),
    code: text('code').notNull(),
    entryId: text('entry_id'),
    passId: text('pass_id'),
    /** How it was asked: camera, number, typed. */
    how: text('how', { enum: ['camera', 'number', 'typed'] }).notNull(),
    aboard: text('aboard', { mode: 'json' }).$type<readonly string[]>().notNull(),
  },
  (table) => [index('scan_event').on(table.eventId, table.at)],
)

/** Who did what outside the log: imports, acceptances, retirements. Append-only by trigger. */
export const audit = sqliteTable(
  'audit',
  {
    id: text('id').primaryKey(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    eventId: text('event_id'),
    at: integer('at').notNull(),
    accountId: text('account_id'),
    action: text('action').notNull(),
    detail: text('detail', { mode: 'json' }).$type<Readonly<Record<string, unknown>>>().notNull(),
  },
  (table) => [index('audit_event').on(table.eventId, table.at)],
)
