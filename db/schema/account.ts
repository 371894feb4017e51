import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { club } from './club'

/** Somebody who signs in with e-mail and password. */
export const account = sqliteTable(
  'account',
  {
    id: text('id').primaryKey(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    /** Lower-cased. */
    email: text('email').notNull(),
    name: text('name').notNull(),
    /** argon2id, in the PHC string form. */
    passwordHash: text('password_hash').notNull(),
    /** JSON array of club-wide roles: admin, organiser, entrant. */
    roles: text('roles', { mode: 'json' }).$type<readonly ('admin' | 'organiser' | 'entrant')[]>().notNull(),
    createdAt: integer('created_at').notNull(),
  },
  (table) => [uniqueIndex('account_email').on(table.clubId, table.email)],
)

/** A sign-in. Only the SHA-256 of its id is kept. */
export const signIn = sqliteTable(
  'sign_in',
  {
    idHash: text('id_hash').primaryKey(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    accountId: text('account_id')
      .notNull()
      .references(() => account.id),
    createdAt: integer('created_at').notNull(),
    lastSeenAt: integer('last_seen_at').notNull(),
    /** End of the absolute lifetime. */
    expiresAt: integer('expires_at').notNull(),
    /** End of the idle lifetime, moved on by use. */
    idleExpiresAt: integer('idle_expires_at').notNull(),
    userAgent: text('user_agent').notNull(),
  },
  (table) => [index('sign_in_account').on(table.accountId)],
)

/** A link that lets somebody choose a password: invited as crew or organiser, or forgotten. Used once. Only the SHA-256 of its token is kept. */
export const passwordLink = sqliteTable(
  'password_link',
  {
    tokenHash: text('token_hash').primaryKey(),
    clubId: text('club_id')
      .notNull()
      .references(() => club.id),
    accountId: text('account_id')
      .notNull()
      .references(() => account.id),
    createdAt: integer('created_at').notNull(),
    expiresAt: integer('expires_at').notNull(),
    usedAt: integer('used_at'),
  },
  (table) => [index('password_link_account').on(table.accountId)],
)
