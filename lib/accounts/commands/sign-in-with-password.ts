import 'server-only'
import { eq } from 'drizzle-orm'
import { account } from '@/db/schema'
import type { InputOf, OutputOf } from '@/lib/contracts/contract'
import type { signIn } from '@/lib/contracts/sign-in'
import type { Actor } from '@/lib/platform/actor'
import type { Deps } from '@/lib/platform/command'
import { isRightPassword } from '@/lib/platform/password'
import { type Refusal, refuse } from '@/lib/platform/refusal'
import { endSession, forgetEndedSessions, startSession } from '@/lib/platform/session'
import { writeAudit } from '@/lib/platform/write-audit'
import { countTry, forgetTries } from '../sign-in-throttle'

/** Signs in: a new session each time, whatever cookie came. Unknown e-mail and wrong password: same answer, same work. */
export async function signInWithPassword(
  input: InputOf<typeof signIn>,
  actor: Actor,
  deps: Deps,
): Promise<OutputOf<typeof signIn> | Refusal> {
  const { email, password } = input.body
  const wait = await countTry(email)
  if (wait > 0) return refuse('too-many-tries', { retryAfterSeconds: wait, todo: waitInWords(wait) })
  const row = deps.database.select().from(account).where(eq(account.email, email)).get()
  const right = await isRightPassword(row?.passwordHash ?? null, password)
  if (!row || !right) return refuse('sign-in-refused')
  await forgetTries(email)
  if (actor.kind === 'account') endSession(deps.database, actor.signInHash)
  deps.replyHeaders.append('set-cookie', await startSession(deps.database, row.id, deps.userAgent))
  await forgetEndedSessions(deps.database)
  writeAudit(deps.database, { clubId: row.clubId, eventId: null, at: deps.now, accountId: row.id, action: 'signed-in', detail: {} })
  return { accountId: row.id, name: row.name, roles: [...row.roles] }
}

function waitInWords(seconds: number): string {
  const minutes = Math.ceil(seconds / 60)
  return `Try again in ${minutes === 1 ? 'a minute' : `${minutes} minutes`}. The right password is not taken sooner either.`
}
