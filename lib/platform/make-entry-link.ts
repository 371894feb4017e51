import 'server-only'
import { randomBytes } from 'node:crypto'
import { and, eq, isNull } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { type entry, entryLink, event, person } from '@/db/schema'
import { assert } from './assert'
import { sha256 } from './sha256'

const HOUR_MS = 3_600_000
/** A day after the event's last day, seven more, and the hours by which the westernmost clocks are behind. */
const OPEN_AFTER_LAST_DAY_MS = (24 + 7 * 24 + 12) * HOUR_MS

/**
 * Makes the link that lets a person of an entry in without a password, inside the transaction that sends it: `/entry/<token>`. The token has
 * 256 random bits and is given once; only its SHA-256 is kept. It may be used again until seven days after the event, or until it is revoked.
 */
export function makeEntryLink(
  tx: Db,
  to: Pick<typeof entry.$inferSelect, 'id' | 'clubId' | 'eventId'>,
  who: Pick<typeof person.$inferSelect, 'id'>,
  now: number,
): { readonly token: string; readonly path: string; readonly expiresAt: number } {
  const held = tx.select({ lastDay: event.lastDay }).from(event).where(eq(event.id, to.eventId)).get()
  assert(held !== undefined, `a link was asked for an entry of ${to.eventId}, which is no event`)
  const token = randomBytes(32).toString('base64url')
  const expiresAt = Date.parse(`${held.lastDay}T00:00:00Z`) + OPEN_AFTER_LAST_DAY_MS
  tx.insert(entryLink)
    .values({ tokenHash: sha256(token), clubId: to.clubId, entryId: to.id, personId: who.id, createdAt: now, expiresAt })
    .run()
  return { token, path: `/entry/${token}`, expiresAt }
}

/** Revokes every link of a person to an entry: sent to a wrong address, or handed on. */
export function revokeEntryLinks(tx: Db, entryId: string, personId: string, now: number): void {
  tx.update(entryLink)
    .set({ revokedAt: now })
    .where(and(eq(entryLink.entryId, entryId), eq(entryLink.personId, personId), isNull(entryLink.revokedAt)))
    .run()
}

/** To be called before a person's address is written: where it becomes another, links that went to the old one open nothing any more. */
export function revokeLinksOfOldAddress(tx: Db, personId: string, email: string | null, now: number): void {
  const before = tx.select({ email: person.email }).from(person).where(eq(person.id, personId)).get()
  if (before === undefined || (before.email ?? '').trim().toLowerCase() === (email ?? '').trim().toLowerCase()) return
  tx.update(entryLink)
    .set({ revokedAt: now })
    .where(and(eq(entryLink.personId, personId), isNull(entryLink.revokedAt)))
    .run()
}
