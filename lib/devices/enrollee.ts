import type { event } from '@/db/schema'
import { CREW_ROLES, type Role } from '@/lib/permissions/policy'

/** The person a device is enrolled for, with the roles it will be certified for. */
export interface Enrollee {
  readonly event: typeof event.$inferSelect
  readonly personId: string
  readonly roles: readonly Role[]
  readonly accountId: string | null
}

/** Of somebody's roles, those that a device may act in; the club's administration and entrants have none. */
export function rolesForDevice(roles: readonly Role[]): readonly Role[] {
  return roles.filter((role) => role === 'organiser' || (CREW_ROLES as readonly Role[]).includes(role))
}
