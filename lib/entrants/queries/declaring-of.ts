import 'server-only'
import { and, asc, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { kit } from '@/db/schema'
import type { BookCheck } from '@/lib/checklist/book'
import type { FactDefinition } from '@/lib/checklist/checklist'
import { type DeclarationParts, type Figures, NOTHING_DECLARED } from '@/lib/contracts/declaration'
import type { AccountActor } from '@/lib/platform/actor'
import { isRefusal, type Refusal } from '@/lib/platform/refusal'
import { cleanParts, partsKept } from '../kept-parts'
import type { ReadDay } from '../read-day'
import { draftOf, signedOf } from './declarations-of'
import { mayDeclare } from './may-declare'

/** What the page of a declaration begins with. */
export interface Declaring {
  readonly entry: { readonly id: string; readonly number: string; readonly plate: string; readonly model: string; readonly colour: string }
  readonly event: {
    readonly name: string
    readonly venue: string
    readonly firstDay: string
    readonly lastDay: string
    readonly timeZone: string
  }
  readonly me: string
  readonly facts: readonly FactDefinition[]
  readonly checks: readonly BookCheck[]
  readonly places: readonly { readonly id: string; readonly title: string }[]
  readonly stations: readonly { readonly id: string; readonly title: string }[]
  /** Whose kit this account declares. */
  readonly people: readonly { readonly id: string; readonly name: string }[]
  readonly kit: readonly { readonly id: string; readonly kind: string; readonly name: string; readonly values: Figures }[]
  readonly start: DeclarationParts
  readonly from: 'draft' | 'signed' | 'kept' | 'nothing'
  readonly draftAt: number | null
  /** What the car had before this event; null for a car nobody knows here. */
  readonly before: DeclarationParts | null
  readonly signed: { readonly version: number; readonly signedAt: number; readonly parts: DeclarationParts } | null
  /** Somebody has begun to look: what is declared now is looked at again. */
  readonly isPresented: boolean
}

/** Everything a driver needs to declare the entry; refused where it is not theirs to declare, or not any more. */
export function declaringOf(readDay: ReadDay, database: Db, actor: AccountActor, entryId: string, now: number): Declaring | Refusal {
  const may = mayDeclare(readDay, database, actor, entryId, now)
  if (isRefusal(may)) return may
  const { facts, checks, people, isPresented } = may
  const { entry, event, car } = may.row
  const book = readDay(database, event.id, now)?.bookOf(event.checklistHash, event.limitsHash)
  const [draft, signed] = [draftOf(database, entryId, actor.accountId), signedOf(database, entryId)]
  // The kit of those who share the car is theirs, and what this checklist no longer asks is not shown.
  const ids = people.map(({ id }) => id)
  const own = (parts: DeclarationParts) => cleanParts(parts, facts, checks, ids)
  // A car that belongs to somebody else tells nothing of what they keep of it.
  const isMine = car.ownerAccountId === actor.accountId
  const kept = isMine && Object.keys(car.facts).length > 0 ? partsKept(car.facts, facts, checks) : null
  const told = kept ?? NOTHING_DECLARED
  const { name, venue, firstDay, lastDay, timeZone } = event
  return {
    entry: { id: entry.id, number: entry.number, plate: entry.plate, model: car.model, colour: car.colour },
    event: { name, venue, firstDay, lastDay, timeZone },
    me: actor.name,
    facts,
    checks,
    places: book?.checklist.places.map(({ id, title }) => ({ id, title })) ?? [],
    stations: book?.checklist.stations.map(({ id, title }) => ({ id, title })) ?? [],
    people,
    kit: kitOf(database, actor),
    start: own(draft?.parts ?? signed?.parts ?? { ...told, facts: { ...told.facts, ...entry.facts } }),
    from: draft ? 'draft' : signed ? 'signed' : kept ? 'kept' : 'nothing',
    draftAt: draft?.at ?? null,
    before: kept,
    signed: signed && { version: signed.version, signedAt: signed.signedAt, parts: own(signed.parts) },
    isPresented,
  }
}

function kitOf(database: Db, actor: AccountActor): Declaring['kit'] {
  return database
    .select({ id: kit.id, kind: kit.kind, name: kit.name, values: kit.values })
    .from(kit)
    .where(and(eq(kit.accountId, actor.accountId), eq(kit.retired, false)))
    .orderBy(asc(kit.name))
    .all()
}
