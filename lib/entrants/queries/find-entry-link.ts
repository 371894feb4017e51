import 'server-only'
import { and, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { car, entry, entryLink, entryPerson, event, person } from '@/db/schema'
import type { AccountActor } from '@/lib/platform/actor'
import { sha256 } from '@/lib/platform/sha256'
import { addressOf, isPersonOf } from './my-entry-row'

export interface FoundLink {
  readonly entry: typeof entry.$inferSelect
  readonly car: typeof car.$inferSelect
  readonly event: typeof event.$inferSelect
  readonly person: typeof person.$inferSelect
}

/** What a link that still holds is for; null for one that is unknown, late or revoked, which are all answered alike. */
export function findEntryLink(database: Db, token: string, now: number): FoundLink | null {
  const row = database
    .select({ link: entryLink, entry, car, event, person })
    .from(entryLink)
    .innerJoin(entry, eq(entry.id, entryLink.entryId))
    .innerJoin(car, eq(car.id, entry.carId))
    .innerJoin(event, eq(event.id, entry.eventId))
    .innerJoin(person, eq(person.id, entryLink.personId))
    // Who was taken out of the entry has no way into it any more.
    .innerJoin(entryPerson, and(eq(entryPerson.entryId, entry.id), eq(entryPerson.personId, person.id)))
    .where(eq(entryLink.tokenHash, sha256(token)))
    .get()
  if (row === undefined || row.link.revokedAt !== null || row.link.expiresAt <= now) return null
  return { entry: row.entry, car: row.car, event: row.event, person: row.person }
}

export type LinkShown =
  | { readonly is: 'over' }
  | {
      readonly is: 'open'
      readonly event: Pick<FoundLink['event'], 'name' | 'venue' | 'firstDay' | 'lastDay'>
      readonly number: string
      readonly model: string
      readonly name: string
      /** Who is signed in on this browser and is somebody else; null for nobody and for oneself. */
      readonly somebodyElse: string | null
    }

/** What the page of a link says before anything is done. Looking changes nothing. */
export function describeEntryLink(database: Db, token: string, actor: AccountActor | null, now: number): LinkShown {
  const found = findEntryLink(database, token, now)
  if (found === null) return { is: 'over' }
  const { name, venue, firstDay, lastDay } = found.event
  return {
    is: 'open',
    event: { name, venue, firstDay, lastDay },
    number: found.entry.number,
    model: found.car.model,
    name: found.person.name,
    somebodyElse: actor === null || isOwner(database, actor, found) ? null : actor.name,
  }
}

/** Whether the person a link was sent to is this account. */
export function isOwner(database: Db, actor: AccountActor, { person: sentTo }: Pick<FoundLink, 'person'>): boolean {
  return sentTo.clubId === actor.clubId && isPersonOf(sentTo, actor.accountId, addressOf(database, actor))
}
