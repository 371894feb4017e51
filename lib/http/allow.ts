import 'server-only'
import type { Contract } from '@/lib/contracts/contract'
import { can } from '@/lib/permissions/policy'
import type { Actor } from '@/lib/platform/actor'
import { rolesAt } from '@/lib/platform/roles-at'
import type { Db } from '@/lib/platform/served-database'

/** Whether POLICY lets this actor do what the contract does, at the event its path names. Looks at nothing but the actor's own roles. */
export function isAllowed(database: Db, contract: Contract, actor: Actor, eventId: string | null): boolean {
  if (contract.action === 'public') return true
  // Roles as enrolled: a device whose people have lost them must still hand in what it holds.
  if (contract.evenRetired && actor.kind === 'device')
    return can(
      actor.people.flatMap(({ enrolledRoles }) => enrolledRoles),
      contract.action,
    )
  return can(rolesAt(database, actor, eventId), contract.action)
}
