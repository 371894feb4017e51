import 'server-only'
import { headers } from 'next/headers'
import type { Role } from '@/lib/permissions/policy'
import type { AccountActor } from '@/lib/platform/actor'
import { rolesAt } from '@/lib/platform/roles-at'
import { servedDatabase } from '@/lib/platform/served-database'
import { accountOfCookie } from '@/lib/platform/session'

/** Who is signed in, for a Server Component; null for nobody. */
export async function pageAccount(): Promise<AccountActor | null> {
  return accountOfCookie(servedDatabase(), (await headers()).get('cookie') ?? '')
}

/** The roles somebody holds at an event (null: in the club), for `can()`. Says nothing of whether the event exists. */
export function pageRoles(account: AccountActor, eventId: string | null): readonly Role[] {
  return rolesAt(servedDatabase(), account, eventId)
}
