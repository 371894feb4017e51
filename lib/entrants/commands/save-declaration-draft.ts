import 'server-only'
import { and, eq } from 'drizzle-orm'
import { declarationDraft } from '@/db/schema'
import { transaction } from '@/db/transaction'
import type { saveDraft } from '@/lib/contracts/my-declaration'
import type { Command } from '@/lib/platform/command'
import { isRefusal } from '@/lib/platform/refusal'
import { cleanParts } from '../kept-parts'
import { mayDeclare } from '../queries/may-declare'
import type { ReadDay } from '../read-day'

/** Keeps what has been filled in so far, however little. Nobody but this account sees it. */
export function saveDeclarationDraft(readDay: ReadDay): Command<typeof saveDraft> {
  return ({ params, body }, actor, { database, now }) => {
    const may = mayDeclare(readDay, database, actor, params.entry, now)
    if (isRefusal(may)) return may
    const own = may.people.map(({ id }) => id)
    const parts = cleanParts(body.parts, may.facts, may.checks, own)
    const { accountId, clubId } = actor
    transaction(database, (tx) => {
      const mine = and(eq(declarationDraft.entryId, params.entry), eq(declarationDraft.accountId, accountId))
      tx.delete(declarationDraft).where(mine).run()
      tx.insert(declarationDraft).values({ entryId: params.entry, accountId, clubId, body: parts, updatedAt: now }).run()
    })
    return { savedAt: now }
  }
}
