import 'server-only'
import { eq } from 'drizzle-orm'
import { mailOutbox } from '@/db/schema'
import { transaction } from '@/db/transaction'
import type { InputOf, OutputOf } from '@/lib/contracts/contract'
import type { mailAgain } from '@/lib/contracts/mail'
import type { AccountActor } from '@/lib/platform/actor'
import type { Deps } from '@/lib/platform/command'
import { ownEvent } from '@/lib/platform/own-event'
import { type Refusal, refuse } from '@/lib/platform/refusal'
import { mailOf } from '../queries/see-mail'

/** Tries a mail again at once, with all its tries before it; one that is sent stays as it is. */
export function tryMailAgain(
  { params, body }: InputOf<typeof mailAgain>,
  actor: AccountActor,
  { database, now }: Pick<Deps, 'database' | 'now'>,
): OutputOf<typeof mailAgain> | Refusal {
  const own = ownEvent(database, actor, params.event)
  if (!own) return refuse('missing')
  return transaction(database, (tx) => {
    const mail = mailOf(tx, own.id, body.mail)
    if (!mail) return refuse('missing')
    if (mail.state === 'sent') return mail
    tx.update(mailOutbox).set({ failedAt: null, tries: 0, nextTryAt: now }).where(eq(mailOutbox.id, mail.id)).run()
    return mailOf(tx, own.id, mail.id) ?? mail
  })
}
