import 'server-only'
import { and, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { entry } from '@/db/schema'
import { transaction } from '@/db/transaction'
import type { voidPass as voidPassContract } from '@/lib/contracts/void-pass'
import { subjectKey } from '@/lib/inspection/subject'
import type { AccountActor } from '@/lib/platform/actor'
import type { Command } from '@/lib/platform/command'
import { announce } from '@/lib/platform/live'
import { ownEvent } from '@/lib/platform/own-event'
import { isRefusal, refuse, type Refusal } from '@/lib/platform/refusal'
import type { ReadHolds } from '../holds-reading'

interface VoidDraft {
  readonly kind: 'void'
  readonly subject: { readonly car: string }
  readonly voids: string
  readonly reason: string
}

/** Makes a record of the office inside the transaction it is given. */
export type AppendVoid = (tx: Db, eventId: string, actor: AccountActor, drafts: VoidDraft[], now: number) => readonly unknown[] | Refusal

/** Declares a live pass of a car void. One that is dead already, or of another car, is `missing`: nothing is written for it. */
export function voidPass(append: AppendVoid, readHolds: ReadHolds): Command<typeof voidPassContract> {
  return ({ params, body }, actor, { database, now }) => {
    const own = ownEvent(database, actor, params.event)
    if (!own) return refuse('missing')
    const made = transaction(database, (tx) => {
      const row = tx
        .select({ id: entry.id })
        .from(entry)
        .where(and(eq(entry.id, body.entry), eq(entry.eventId, own.id)))
        .get()
      const subject = { car: body.entry }
      const passes = row ? (readHolds(tx, own.id, now)?.stateOf(subjectKey(subject)).passes ?? []) : []
      if (!passes.some(({ hash, state }) => hash === body.pass && state === 'live')) return refuse('missing')
      return append(tx, own.id, actor, [{ kind: 'void', subject, voids: body.pass, reason: body.reason }], now)
    })
    if (isRefusal(made)) return made
    announce(own.id)
    return { voided: true }
  }
}
