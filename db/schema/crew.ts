import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { club } from './club'
import { person } from './entry'
import { event } from './event'

/** A person's role at an event. Nobody without account becomes chief or organiser (rule M4). */
export const crewMember = sqliteTable(
  'crew_member',
  {
    id: text('id').primaryKey(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    eventId: text('event_id')
      .notNull()
      .references(() => event.id),
    personId: text('person_id')
      .notNull()
      .references(() => person.id),
    role: text('role', { enum: ['chief', 'scrutineer', 'helper', 'sign-on', 'marshal'] }).notNull(),
    state: text('state', { enum: ['waiting', 'accepted', 'refused', 'ended'] }).notNull(),
    /** SHA-256 of the secret the joining phone keeps until it is enrolled; null for people with an account. */
    claimHash: text('claim_hash'),
    askedAt: integer('asked_at').notNull(),
    decidedAt: integer('decided_at'),
    decidedByAccountId: text('decided_by_account_id'),
  },
  (table) => [
    uniqueIndex('crew_member_role').on(table.eventId, table.personId, table.role),
    index('crew_member_claim').on(table.claimHash),
  ],
)

export const joinCode = sqliteTable(
  'join_code',
  {
    id: text('id').primaryKey(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    eventId: text('event_id')
      .notNull()
      .references(() => event.id),
    tokenHash: text('token_hash').notNull(),
    role: text('role', { enum: ['scrutineer', 'helper', 'sign-on', 'marshal'] }).notNull(),
    expiresAt: integer('expires_at').notNull(),
    createdByAccountId: text('created_by_account_id').notNull(),
    createdAt: integer('created_at').notNull(),
  },
  (table) => [uniqueIndex('join_code_token').on(table.tokenHash)],
)

/** A phone or tablet that signs. `kid` is append-only per event; 0 is the server itself. */
export const device = sqliteTable(
  'device',
  {
    id: text('id').primaryKey(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    eventId: text('event_id')
      .notNull()
      .references(() => event.id),
    kid: integer('kid').notNull(),
    name: text('name').notNull(),
    /** Raw Ed25519 public key, base64url. */
    publicKey: text('public_key').notNull(),
    /** The JWS the server signed at enrolment. */
    certificate: text('certificate').notNull(),
    state: text('state', { enum: ['active', 'retired', 'lost'] }).notNull(),
    /** Last deviceSeq that stands after it was retired or lost. */
    lastGoodSeq: integer('last_good_seq'),
    enrolledAt: integer('enrolled_at').notNull(),
    lastContactAt: integer('last_contact_at'),
    /** By its own word at its last contact. */
    unsent: integer('unsent'),
  },
  (table) => [uniqueIndex('device_kid').on(table.eventId, table.kid), uniqueIndex('device_key').on(table.eventId, table.publicKey)],
)

/** People and roles a device was enrolled for, at the time. */
export const devicePerson = sqliteTable(
  'device_person',
  {
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    deviceId: text('device_id')
      .notNull()
      .references(() => device.id),
    personId: text('person_id')
      .notNull()
      .references(() => person.id),
    roles: text('roles', { mode: 'json' }).$type<readonly string[]>().notNull(),
  },
  (table) => [uniqueIndex('device_person_one').on(table.deviceId, table.personId)],
)

/** The server's own signing key, one per club. */
export const serverKey = sqliteTable('server_key', {
  clubId: text('club_id')
    .primaryKey()
    .references(() => club.id),
  publicKey: text('public_key').notNull(),
  /** PKCS #8, base64; the database file is as secret as this is. */
  privateKey: text('private_key').notNull(),
})
