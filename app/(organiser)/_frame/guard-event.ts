import 'server-only'
import { notFound, redirect } from 'next/navigation'
import { pageAccount, pageRoles } from '@/lib/http/page-account'
import { type Action, can, type Role } from '@/lib/permissions/policy'
import type { AccountActor } from '@/lib/platform/actor'
import { ownEvent } from '@/lib/platform/own-event'
import { servedDatabase } from '@/lib/platform/served-database'

export interface GuardedEvent {
  readonly account: AccountActor
  readonly roles: readonly Role[]
  readonly event: NonNullable<ReturnType<typeof ownEvent>>
}

/** Who is signed in; nobody is led to the sign-in and back to `path`. */
export async function guardAccount(path: string): Promise<AccountActor> {
  return (await pageAccount()) ?? redirect(`/sign-in?next=${encodeURIComponent(path)}`)
}

/** Lets in who may do this at this event. A foreign event, one that never was and a role that may not look all read *not found*. */
export async function guardEvent(eventId: string, tab: string, action: Action): Promise<GuardedEvent> {
  const account = await guardAccount(`/events/${encodeURIComponent(eventId)}/${tab}`)
  const roles = pageRoles(account, eventId)
  const event = can(roles, action) ? ownEvent(servedDatabase(), account, eventId) : null
  return event === null ? notFound() : { account, roles, event }
}
