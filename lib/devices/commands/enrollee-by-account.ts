import 'server-only'
import { and, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { person } from '@/db/schema'
import { can } from '@/lib/permissions/policy'
import type { AccountActor } from '@/lib/platform/actor'
import { newId } from '@/lib/platform/ids'
import { ownEvent } from '@/lib/platform/own-event'
import { type Refusal, refuse } from '@/lib/platform/refusal'
import { rolesAt } from '@/lib/platform/roles-at'
import { type Enrollee, rolesForDevice } from '../enrollee'

/** The signed-in person at this event; an organiser becomes a person of it here, crew with an account already are. */
export function enrolleeByAccount(tx: Db, eventId: string, actor: AccountActor): Enrollee | Refusal {
  const held = rolesAt(tx, actor, eventId)
  if (!can(held, 'device:enrol')) return refuse('not-crew')
  const event = ownEvent(tx, actor, eventId)
  if (!event) return refuse('missing')
  const known = tx
    .select({ id: person.id })
    .from(person)
    .where(and(eq(person.eventId, event.id), eq(person.accountId, actor.accountId)))
    .get()
  const personId = known?.id ?? newId()
  if (!known) {
    tx.insert(person).values({ id: personId, clubId: event.clubId, eventId: event.id, accountId: actor.accountId, name: actor.name }).run()
  }
  return { event, personId, roles: rolesForDevice(held), accountId: actor.accountId }
}
