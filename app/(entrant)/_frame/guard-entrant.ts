import 'server-only'
import { notFound, redirect } from 'next/navigation'
import { pageAccount } from '@/lib/http/page-account'
import { can } from '@/lib/permissions/policy'
import type { AccountActor } from '@/lib/platform/actor'

/** Lets in an entrant; nobody is led to the sign-in and back to `path`, and who is no entrant finds nothing here. */
export async function guardEntrant(path: string): Promise<AccountActor> {
  const account = (await pageAccount()) ?? redirect(`/sign-in?next=${encodeURIComponent(path)}`)
  return can(account.clubRoles, 'garage:keep') ? account : notFound()
}
