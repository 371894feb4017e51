import 'server-only'
import type { InputOf, OutputOf } from '@/lib/contracts/contract'
import type { signOut } from '@/lib/contracts/sign-out'
import type { AccountActor } from '@/lib/platform/actor'
import type { Deps } from '@/lib/platform/command'
import { endEverySession, endSession } from '@/lib/platform/session'
import { writeAudit } from '@/lib/platform/write-audit'

/** Ends this sign-in, or all of the account's. An enrolled device goes on recording and sending: its own key does that, not the sign-in. */
export function endSignIn(input: InputOf<typeof signOut>, actor: AccountActor, deps: Deps): OutputOf<typeof signOut> {
  const { database } = deps
  deps.replyHeaders.append('set-cookie', endSession(database, actor.signInHash))
  if (input.body.everywhere) endEverySession(database, actor.accountId)
  const action = input.body.everywhere ? 'signed-out-everywhere' : 'signed-out'
  writeAudit(database, { clubId: actor.clubId, eventId: null, at: deps.now, accountId: actor.accountId, action, detail: {} })
  return { signedOut: true }
}
