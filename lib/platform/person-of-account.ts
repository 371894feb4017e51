import 'server-only'
import { and, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { person } from '@/db/schema'
import type { AccountActor } from './actor'
import { newId } from './ids'

/** The person an account is at an event, made when it is first needed; inside the caller's transaction. Records name persons, never accounts. */
export function personOfAccount(
  tx: Db,
  event: { readonly id: string; readonly clubId: string },
  actor: Pick<AccountActor, 'accountId' | 'name'>,
): string {
  const known = tx
    .select({ id: person.id })
    .from(person)
    .where(and(eq(person.eventId, event.id), eq(person.accountId, actor.accountId)))
    .get()
  if (known) return known.id
  const id = newId()
  tx.insert(person).values({ id, clubId: event.clubId, eventId: event.id, accountId: actor.accountId, name: actor.name }).run()
  return id
}
