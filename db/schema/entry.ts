import { index, integer, primaryKey, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { account } from './account'
import { club } from './club'
import { event, runGroup } from './event'

/** A person at an event: driver, passenger, instructor or crew. */
export const person = sqliteTable(
  'person',
  {
    id: text('id').primaryKey(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    eventId: text('event_id')
      .notNull()
      .references(() => event.id),
    accountId: text('account_id'),
    name: text('name').notNull(),
    email: text('email'),
    mobile: text('mobile'),
    /** Under age at the event: a consent is asked. No birth date is kept. */
    minor: integer('minor', { mode: 'boolean' }).notNull().default(false),
  },
  (table) => [index('person_event').on(table.eventId)],
)

/** A car of the club's history, whatever events it comes to. */
export const car = sqliteTable(
  'car',
  {
    id: text('id').primaryKey(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    model: text('model').notNull(),
    colour: text('colour').notNull(),
    /** Upper case, no spaces. */
    plate: text('plate').notNull(),
    /** The entrant whose car it is; null while nobody has claimed it. */
    ownerAccountId: text('owner_account_id').references(() => account.id),
    /** Facts and labels as its owner last gave them. */
    facts: text('facts', { mode: 'json' }).$type<Readonly<Record<string, string | number | boolean | null>>>().notNull().default({}),
  },
  (table) => [index('car_plate').on(table.clubId, table.plate)],
)

/** One car at one event. Its id is for ever; number, plate and group may change. */
export const entry = sqliteTable(
  'entry',
  {
    id: text('id').primaryKey(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    eventId: text('event_id')
      .notNull()
      .references(() => event.id),
    carId: text('car_id')
      .notNull()
      .references(() => car.id),
    /** Its number in pass tokens, 1 to 65535, given per event, never reused. */
    code: integer('code').notNull(),
    /** As on the door: `007` is not `7`. */
    number: text('number').notNull(),
    /** As printed on the car, upper case with its spaces. */
    plate: text('plate').notNull(),
    groupId: text('group_id')
      .notNull()
      .references(() => runGroup.id),
    facts: text('facts', { mode: 'json' }).$type<Readonly<Record<string, string | number | boolean | null>>>().notNull(),
    note: text('note').notNull(),
    passengerSeats: integer('passenger_seats').notNull(),
    withdrawn: integer('withdrawn', { mode: 'boolean' }).notNull(),
    /** Moved on by every change of the row, so that two people who edit it see each other. */
    version: integer('version').notNull().default(1),
  },
  (table) => [
    uniqueIndex('entry_code').on(table.eventId, table.code),
    uniqueIndex('entry_number').on(table.eventId, table.number),
    index('entry_event').on(table.eventId),
  ],
)

/** Who sits in an entry. */
export const entryPerson = sqliteTable(
  'entry_person',
  {
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    entryId: text('entry_id')
      .notNull()
      .references(() => entry.id),
    personId: text('person_id')
      .notNull()
      .references(() => person.id),
    role: text('role', { enum: ['driver', 'passenger', 'instructor'] }).notNull(),
  },
  (table) => [primaryKey({ columns: [table.entryId, table.personId, table.role] })],
)

/** What an entrant declared, one immutable row a version. */
export const declaration = sqliteTable(
  'declaration',
  {
    id: text('id').primaryKey(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    entryId: text('entry_id')
      .notNull()
      .references(() => entry.id),
    version: integer('version').notNull(),
    body: text('body', { mode: 'json' }).$type<Readonly<Record<string, unknown>>>().notNull(),
    signedAt: integer('signed_at'),
  },
  (table) => [uniqueIndex('declaration_version').on(table.entryId, table.version)],
)

/** A declaration that is being written: one an entry and account, gone when it is signed. The signed ones are immutable and stand above. */
export const declarationDraft = sqliteTable(
  'declaration_draft',
  {
    entryId: text('entry_id')
      .notNull()
      .references(() => entry.id),
    accountId: text('account_id')
      .notNull()
      .references(() => account.id),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    body: text('body', { mode: 'json' }).$type<Readonly<Record<string, unknown>>>().notNull(),
    updatedAt: integer('updated_at').notNull(),
  },
  (table) => [primaryKey({ columns: [table.entryId, table.accountId] })],
)

/** A link that lets the person of an entry in without a password. Only the SHA-256 of its token is kept. */
export const entryLink = sqliteTable(
  'entry_link',
  {
    tokenHash: text('token_hash').primaryKey(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    entryId: text('entry_id')
      .notNull()
      .references(() => entry.id),
    personId: text('person_id')
      .notNull()
      .references(() => person.id),
    createdAt: integer('created_at').notNull(),
    expiresAt: integer('expires_at').notNull(),
    revokedAt: integer('revoked_at'),
  },
  (table) => [index('entry_link_entry').on(table.entryId)],
)

/** A piece of an entrant's kit with its labels: helmet, suit, head restraint, belts that move from car to car. */
export const kit = sqliteTable(
  'kit',
  {
    id: text('id').primaryKey(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    accountId: text('account_id')
      .notNull()
      .references(() => account.id),
    kind: text('kind', { enum: ['helmet', 'head-restraint', 'suit', 'gloves', 'other'] }).notNull(),
    name: text('name').notNull(),
    /** Values of the label by the field of the check that judges it. */
    values: text('values', { mode: 'json' }).$type<Readonly<Record<string, string | number | boolean | null>>>().notNull(),
    photoHash: text('photo_hash'),
    retired: integer('retired', { mode: 'boolean' }).notNull().default(false),
    updatedAt: integer('updated_at').notNull(),
  },
  (table) => [index('kit_account').on(table.accountId)],
)

/** A pass token printed ahead by the server. It opens nothing until a scrutineer brings it alive with a pass record. */
export const printedPass = sqliteTable(
  'printed_pass',
  {
    eventId: text('event_id')
      .notNull()
      .references(() => event.id),
    /** Counter of the server's own kid, 0; never reused. */
    counter: integer('counter').notNull(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    entryId: text('entry_id')
      .notNull()
      .references(() => entry.id),
    token: text('token').notNull(),
    /** Venue day it is for. */
    day: text('day').notNull(),
    printedAt: integer('printed_at').notNull(),
  },
  (table) => [primaryKey({ columns: [table.eventId, table.counter] }), index('printed_pass_entry').on(table.entryId, table.day)],
)

/** When an entry is called to the bay, as it was told; a later plan changes it only when it is told anew. */
export const callUp = sqliteTable(
  'call_up',
  {
    entryId: text('entry_id')
      .notNull()
      .references(() => entry.id),
    day: text('day').notNull(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    startsAt: integer('starts_at').notNull(),
    endsAt: integer('ends_at').notNull(),
  },
  (table) => [primaryKey({ columns: [table.entryId, table.day] })],
)

/** A list that was imported: its text's hash and what came of it. */
export const entryImport = sqliteTable(
  'entry_import',
  {
    id: text('id').primaryKey(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    eventId: text('event_id')
      .notNull()
      .references(() => event.id),
    textHash: text('text_hash').notNull(),
    fileName: text('file_name').notNull(),
    added: integer('added').notNull(),
    changed: integer('changed').notNull(),
    unchanged: integer('unchanged').notNull(),
    byAccountId: text('by_account_id').notNull(),
    at: integer('at').notNull(),
  },
  (table) => [index('entry_import_event').on(table.eventId)],
)
