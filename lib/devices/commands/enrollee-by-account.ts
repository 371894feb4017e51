import 'server-only'
import type { Db } from '@/db/client'
import { can } from '@/lib/permissions/policy'
import type { AccountActor } from '@/lib/platform/actor'
import { ownEvent } from '@/lib/platform/own-event'
import { personOfAccount } from '@/lib/platform/person-of-account'
import { type Refusal, refuse } from '@/lib/platform/refusal'
import { rolesAt } from '@/lib/platform/roles-at'
import { type Enrollee, rolesForDevice } from '../enrollee'

/** The signed-in person at this event; an organiser becomes a person of it here, crew with an account already are. */
export function enrolleeByAccount(tx: Db, eventId: string, actor: AccountActor): Enrollee | Refusal {
  const held = rolesAt(tx, actor, eventId)
  if (!can(held, 'device:enrol')) return refuse('not-crew')
  const event = ownEvent(tx, actor, eventId)
  if (!event) return refuse('missing')
  const personId = personOfAccount(tx, event, actor)
  return { event, personId, roles: rolesForDevice(held), accountId: actor.accountId }
}
