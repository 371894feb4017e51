import 'server-only'
import { and, desc, eq, sql } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { car, declaration, declarationDraft, event } from '@/db/schema'
import { transaction } from '@/db/transaction'
import { DECLARATION_WORDS, type DeclarationParts, partsOf, type SignedDeclaration } from '@/lib/contracts/declaration'
import type { signDeclaration as contract } from '@/lib/contracts/my-declaration'
import type { AccountActor } from '@/lib/platform/actor'
import type { Command } from '@/lib/platform/command'
import { newId } from '@/lib/platform/ids'
import { announce } from '@/lib/platform/live'
import { isRefusal, refuse } from '@/lib/platform/refusal'
import { writeAudit } from '@/lib/platform/write-audit'
import { cleanParts, factsToKeep } from '../kept-parts'
import { type MayDeclare, mayDeclare } from '../queries/may-declare'
import type { ReadDay } from '../read-day'

/**
 * Signs a declaration as the entry's next version. It never changes afterwards; what another driver declared of their own kit goes on in it.
 * The very same signed again, as after an answer that was lost, is the version that is there.
 */
export function signDeclaration(readDay: ReadDay): Command<typeof contract> {
  return ({ params, body }, actor, { database, now }) => {
    const may = mayDeclare(readDay, database, actor, params.entry, now)
    if (isRefusal(may)) return may
    const own = may.people.map(({ id }) => id)
    const parts = cleanParts(body.parts, may.facts, may.checks, own)
    const signed = transaction(database, (tx) => sign(tx, may, parts, { actor, name: body.name, now }))
    if (signed === null) return refuse('missing')
    announce(may.row.event.id)
    return signed
  }
}

interface Signer {
  readonly actor: AccountActor
  readonly name: string
  readonly now: number
}

function sign(tx: Db, may: MayDeclare, mine: DeclarationParts, { actor, name, now }: Signer) {
  const { entry, event: held } = may.row
  const latest = tx.select().from(declaration).where(eq(declaration.entryId, entry.id)).orderBy(desc(declaration.version)).limit(1).get()
  const parts = latest ? withOthers(mine, partsOf(latest.body), may) : mine
  const body: SignedDeclaration = {
    parts,
    checklist: held.checklistHash,
    limits: held.limitsHash,
    signedBy: { accountId: actor.accountId, name },
    words: DECLARATION_WORDS,
  }
  tx.delete(declarationDraft)
    .where(and(eq(declarationDraft.entryId, entry.id), eq(declarationDraft.accountId, actor.accountId)))
    .run()
  if (latest?.signedAt && JSON.stringify(latest.body) === JSON.stringify(body))
    return { version: latest.version, signedAt: latest.signedAt }
  const version = (latest?.version ?? 0) + 1
  tx.insert(declaration).values({ id: newId(), clubId: entry.clubId, entryId: entry.id, version, body, signedAt: now }).run()
  keepWithCar(tx, may, parts, actor)
  tx.update(event)
    .set({ snapshotVersion: sql`${event.snapshotVersion} + 1` })
    .where(eq(event.id, held.id))
    .run()
  const detail = { entry: entry.id, version }
  writeAudit(tx, { clubId: entry.clubId, eventId: held.id, at: now, accountId: actor.accountId, action: 'declaration-signed', detail })
  return { version, signedAt: now }
}

/** Each driver declares their own kit: what the others said of theirs stays as it was. */
function withOthers(mine: DeclarationParts, before: DeclarationParts, { facts, checks, others }: MayDeclare): DeclarationParts {
  const kit = cleanParts({ ...before, facts: {} }, facts, checks, others)
  const theirs = <T>(all: Readonly<Record<string, T>>) => Object.fromEntries(Object.entries(all).filter(([key]) => key.includes('@')))
  return { ...mine, answers: { ...theirs(kit.answers), ...mine.answers }, photos: { ...theirs(kit.photos), ...mine.photos } }
}

/** A car nobody has claimed becomes the signer's, and what stays as it is is kept for next time. Somebody else's car is left alone. */
function keepWithCar(tx: Db, { row, checks }: MayDeclare, parts: DeclarationParts, { accountId }: AccountActor): void {
  if (row.car.ownerAccountId !== null && row.car.ownerAccountId !== accountId) return
  const facts = { ...row.car.facts, ...factsToKeep(parts, checks) }
  tx.update(car).set({ ownerAccountId: accountId, facts }).where(eq(car.id, row.car.id)).run()
}
