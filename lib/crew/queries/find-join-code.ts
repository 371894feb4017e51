import 'server-only'
import { eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { event, joinCode } from '@/db/schema'
import { type Refusal, refuse } from '@/lib/platform/refusal'
import { sha256 } from '@/lib/platform/sha256'

export interface FoundJoinCode {
  readonly code: typeof joinCode.$inferSelect
  readonly event: typeof event.$inferSelect
}

/** The join code of a token while it holds; a refusal that says whether it never was or has run out. */
export function findJoinCode(database: Db, token: string, now: number): FoundJoinCode | Refusal {
  const row = database
    .select({ code: joinCode, event })
    .from(joinCode)
    .innerJoin(event, eq(event.id, joinCode.eventId))
    .where(eq(joinCode.tokenHash, sha256(token)))
    .get()
  if (!row) return refuse('join-code-unknown')
  return row.code.expiresAt <= now ? refuse('join-code-expired') : row
}
