import 'server-only'
import type { InputOf, OutputOf } from '@/lib/contracts/contract'
import type { seeJoinCode } from '@/lib/contracts/join'
import type { Actor } from '@/lib/platform/actor'
import type { Deps } from '@/lib/platform/command'
import { isRefusal, type Refusal } from '@/lib/platform/refusal'
import { eventView } from '../event-view'
import { findJoinCode } from './find-join-code'

/** What a join code is for, before somebody writes a name. */
export function describeJoinCode(
  { params }: InputOf<typeof seeJoinCode>,
  _: Actor,
  { database, now }: Pick<Deps, 'database' | 'now'>,
): OutputOf<typeof seeJoinCode> | Refusal {
  const found = findJoinCode(database, params.token, now)
  if (isRefusal(found)) return found
  return { event: eventView(found.event), role: found.code.role, expiresAt: found.code.expiresAt }
}
