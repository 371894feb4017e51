import 'server-only'
import { and, desc, eq, gt, lte, or } from 'drizzle-orm'
import { type Adapter, type DatabaseSession, type DatabaseUser, Lucia, TimeSpan } from 'lucia'
import type { Db } from '@/db/client'
import { account, signIn } from '@/db/schema'
import type { AccountActor } from './actor'
import { now } from './clock'
import { sha256 } from './sha256'

declare module 'lucia' {
  interface Register {
    DatabaseSessionAttributes: { userAgent: string }
  }
}

/** A sign-in that is not used for this long is over. */
export const IDLE_LIFETIME = new TimeSpan(3, 'd')
/** A sign-in is over after this, however much it is used. */
export const ABSOLUTE_LIFETIME = new TimeSpan(30, 'd')

/**
 * `__Host-`: this host only, the whole path, never without Secure. Browsers that treat http://localhost as trustworthy (Chromium, Firefox)
 * take a Secure cookie there, so the demo needs no certificate; over plain http on another address nobody can sign in, and should not.
 */
export const SESSION_COOKIE = '__Host-lockwire'

const USER_AGENT_LIMIT = 200

/** Starts a sign-in; the text is for a `set-cookie` header. */
export async function startSession(database: Db, accountId: string, userAgent: string): Promise<string> {
  const lucia = sessions(database)
  const session = await lucia.createSession(accountId, { userAgent: userAgent.slice(0, USER_AGENT_LIMIT) })
  return lucia.createSessionCookie(session.id).serialize()
}

/** Who a request's cookie header belongs to; null when nobody, or the sign-in is over. Moves the idle lifetime on. */
export async function accountOfCookie(database: Db, cookieHeader: string): Promise<AccountActor | null> {
  const lucia = sessions(database)
  const id = lucia.readSessionCookie(cookieHeader)
  if (!id) return null
  const { session } = await lucia.validateSession(id)
  if (!session) return null
  const row = database.select().from(account).where(eq(account.id, session.userId)).get()
  if (!row) return null
  return { kind: 'account', accountId: row.id, clubId: row.clubId, name: row.name, clubRoles: row.roles, signInHash: sha256(id) }
}

/** Ends one sign-in by the hash of its id; gives the `set-cookie` text that takes the cookie away. */
export function endSession(database: Db, signInHash: string): string {
  database.delete(signIn).where(eq(signIn.idHash, signInHash)).run()
  return sessions(database).createBlankSessionCookie().serialize()
}

/** Ends every sign-in of an account. */
export function endEverySession(database: Db, accountId: string): void {
  database.delete(signIn).where(eq(signIn.accountId, accountId)).run()
}

/** The account's sign-ins that still hold, latest used first. */
export function listSessions(database: Db, accountId: string) {
  return database
    .select({ idHash: signIn.idHash, createdAt: signIn.createdAt, lastSeenAt: signIn.lastSeenAt, userAgent: signIn.userAgent })
    .from(signIn)
    .where(and(eq(signIn.accountId, accountId), gt(signIn.expiresAt, now()), gt(signIn.idleExpiresAt, now())))
    .orderBy(desc(signIn.lastSeenAt))
    .all()
}

function sessions(database: Db): Lucia {
  return new Lucia(adapter(database), {
    sessionExpiresIn: IDLE_LIFETIME,
    // The server decides when a sign-in is over, not the cookie's date.
    sessionCookie: { name: SESSION_COOKIE, expires: false, attributes: { secure: true, sameSite: 'lax', path: '/' } },
  })
}

/** Lucia keeps the idle lifetime; the absolute one is ours. Only hashes of ids are stored: a stolen database opens no sign-in. */
function adapter(database: Db): Adapter {
  return {
    async getSessionAndUser(id): Promise<[DatabaseSession | null, DatabaseUser | null]> {
      const row = database
        .select()
        .from(signIn)
        .where(eq(signIn.idHash, sha256(id)))
        .get()
      if (!row || row.expiresAt <= now()) return [null, null]
      const session = { id, userId: row.accountId, expiresAt: new Date(row.idleExpiresAt), attributes: { userAgent: row.userAgent } }
      return [session, { id: row.accountId, attributes: {} }]
    },
    async getUserSessions() {
      // The ids are not stored, so there is nothing true to give; `listSessions` lists by hash.
      throw new Error('sign-ins are listed by listSessions')
    },
    async setSession(session) {
      const at = now()
      const owner = database.select({ clubId: account.clubId }).from(account).where(eq(account.id, session.userId)).get()
      if (!owner) throw new Error(`no account ${session.userId} to sign in`)
      database
        .insert(signIn)
        .values({
          idHash: sha256(session.id),
          clubId: owner.clubId,
          accountId: session.userId,
          createdAt: at,
          lastSeenAt: at,
          expiresAt: at + ABSOLUTE_LIFETIME.milliseconds(),
          idleExpiresAt: session.expiresAt.getTime(),
          userAgent: session.attributes.userAgent,
        })
        .run()
    },
    async updateSessionExpiration(id, expiresAt) {
      database
        .update(signIn)
        .set({ idleExpiresAt: expiresAt.getTime(), lastSeenAt: now() })
        .where(eq(signIn.idHash, sha256(id)))
        .run()
    },
    async deleteSession(id) {
      database
        .delete(signIn)
        .where(eq(signIn.idHash, sha256(id)))
        .run()
    },
    async deleteUserSessions(accountId) {
      endEverySession(database, accountId)
    },
    async deleteExpiredSessions() {
      database
        .delete(signIn)
        .where(or(lte(signIn.expiresAt, now()), lte(signIn.idleExpiresAt, now())))
        .run()
    },
  }
}

/** Forgets sign-ins that are over; done at each new one, nothing depends on it. */
export async function forgetEndedSessions(database: Db): Promise<void> {
  await sessions(database).deleteExpiredSessions()
}
