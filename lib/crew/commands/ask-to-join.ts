import 'server-only'
import { crewMember, person } from '@/db/schema'
import { transaction } from '@/db/transaction'
import type { InputOf, OutputOf } from '@/lib/contracts/contract'
import type { join } from '@/lib/contracts/join'
import type { Actor } from '@/lib/platform/actor'
import type { Deps } from '@/lib/platform/command'
import { newId } from '@/lib/platform/ids'
import { isRefusal, type Refusal } from '@/lib/platform/refusal'
import { secretToken } from '@/lib/platform/secret-token'
import { sha256 } from '@/lib/platform/sha256'
import { eventView } from '../event-view'
import { findJoinCode } from '../queries/find-join-code'

/**
 * Makes a person of this event who waits for the organiser (rule M4). Until then the claim opens nothing.
 * Several people may join by one code: it is shown on a screen to whoever stands there, and each of them is accepted by name.
 */
export function askToJoin(
  { params, body }: InputOf<typeof join>,
  _: Actor,
  { database, now }: Pick<Deps, 'database' | 'now'>,
): OutputOf<typeof join> | Refusal {
  const found = findJoinCode(database, params.token, now)
  if (isRefusal(found)) return found
  const { code, event } = found
  const [personId, member, claim] = [newId(), newId(), secretToken()]
  const owner = { clubId: event.clubId, eventId: event.id }
  transaction(database, (tx) => {
    tx.insert(person)
      .values({ ...owner, id: personId, name: body.name })
      .run()
    tx.insert(crewMember)
      .values({ ...owner, id: member, personId, role: code.role, state: 'waiting', claimHash: sha256(claim), askedAt: now })
      .run()
  })
  return { claim, member, person: personId, role: code.role, event: eventView(event) }
}
