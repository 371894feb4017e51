import 'server-only'
import { eq } from 'drizzle-orm'
import { account, passwordLink } from '@/db/schema'
import { transaction } from '@/db/transaction'
import type { choosePassword as contract } from '@/lib/contracts/crew-invite'
import type { Command } from '@/lib/platform/command'
import { hashPassword, PASSWORD_MIN_LENGTH, passwordFault } from '@/lib/platform/password'
import { refuse } from '@/lib/platform/refusal'
import { endEverySession } from '@/lib/platform/session'
import { writeAudit } from '@/lib/platform/write-audit'
import { findPasswordLink } from '../queries/find-password-link'

const FAULTS = {
  'too-short': `At least ${PASSWORD_MIN_LENGTH} letters; a short sentence is good.`,
  'too-long': 'Shorter, please.',
  'too-common': 'This one is guessed first. Another, please.',
} as const

/** Chooses a password by a link that nobody has used yet; the link is used up and every other sign-in of the account ends. */
export const choosePassword: Command<typeof contract> = async ({ params, body }, _actor, { database, now }) => {
  const found = findPasswordLink(database, params.token, now)
  if (!found) return refuse('missing', LINK_OVER)
  const fault = passwordFault(body.password)
  if (fault) return refuse('invalid', { issues: [{ path: 'password', message: FAULTS[fault] }] })
  const passwordHash = await hashPassword(body.password)
  const used = transaction(database, (tx) => {
    // Two presses at once: the first one chose.
    if (!findPasswordLink(tx, params.token, now)) return false
    tx.update(passwordLink).set({ usedAt: now }).where(eq(passwordLink.tokenHash, found.tokenHash)).run()
    tx.update(account).set({ passwordHash }).where(eq(account.id, found.accountId)).run()
    endEverySession(tx, found.accountId)
    writeAudit(tx, { clubId: found.clubId, eventId: null, at: now, accountId: found.accountId, action: 'password-chosen', detail: {} })
    return true
  })
  return used ? { email: found.email } : refuse('missing', LINK_OVER)
}

const LINK_OVER = {
  what: 'This link has been used, or its seven days are over.',
  kept: 'Nothing was changed.',
  todo: 'Ask the organiser to invite you again.',
}
