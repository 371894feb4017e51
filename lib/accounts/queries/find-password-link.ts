import 'server-only'
import { and, eq, gt, isNull } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { account, passwordLink } from '@/db/schema'
import { sha256 } from '@/lib/platform/sha256'

/** The link and whose it is; null when it is none, used or over. */
export function findPasswordLink(database: Db, token: string, now: number) {
  const row = database
    .select({ tokenHash: passwordLink.tokenHash, accountId: passwordLink.accountId, clubId: passwordLink.clubId, email: account.email })
    .from(passwordLink)
    .innerJoin(account, eq(account.id, passwordLink.accountId))
    .where(and(eq(passwordLink.tokenHash, sha256(token)), isNull(passwordLink.usedAt), gt(passwordLink.expiresAt, now)))
    .get()
  return row ?? null
}
