import 'server-only'
import { headers } from 'next/headers'
import { db } from '@/db/client'
import type { AccountActor } from '@/lib/platform/actor'
import { accountOfCookie } from '@/lib/platform/session'

/** Who is signed in, for a Server Component; null for nobody. What they may do at an event: `can(rolesAt(db(), account, eventId), action)`. */
export async function pageAccount(): Promise<AccountActor | null> {
  return accountOfCookie(db(), (await headers()).get('cookie') ?? '')
}
