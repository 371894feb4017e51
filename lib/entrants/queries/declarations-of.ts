import 'server-only'
import { and, desc, eq, isNotNull } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { declaration, declarationDraft } from '@/db/schema'
import { declarationParts, type DeclarationParts, signedDeclaration } from '@/lib/contracts/declaration'

export interface Signed {
  readonly id: string
  readonly version: number
  readonly signedAt: number
  readonly signedBy: string
  readonly parts: DeclarationParts
}

/** The newest signed declaration of an entry; null before the first. */
export function signedOf(database: Db, entryId: string): Signed | null {
  const row = database
    .select()
    .from(declaration)
    .where(and(eq(declaration.entryId, entryId), isNotNull(declaration.signedAt)))
    .orderBy(desc(declaration.version))
    .limit(1)
    .get()
  return row === undefined ? null : readSigned(row)
}

/** A signed row as read; null for one that another version wrote and this one cannot read. */
export function readSigned(row: typeof declaration.$inferSelect): Signed | null {
  const read = signedDeclaration.safeParse(row.body)
  if (!read.success || row.signedAt === null) return null
  return { id: row.id, version: row.version, signedAt: row.signedAt, signedBy: read.data.signedBy.name, parts: read.data.parts }
}

/** What this account has begun and not signed. */
export function draftOf(
  database: Db,
  entryId: string,
  accountId: string,
): { readonly parts: DeclarationParts; readonly at: number } | null {
  const row = database
    .select()
    .from(declarationDraft)
    .where(and(eq(declarationDraft.entryId, entryId), eq(declarationDraft.accountId, accountId)))
    .get()
  const read = row && declarationParts.safeParse(row.body)
  return row && read?.success ? { parts: read.data, at: row.updatedAt } : null
}
