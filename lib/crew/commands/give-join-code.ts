import 'server-only'
import { joinCode } from '@/db/schema'
import { transaction } from '@/db/transaction'
import type { InputOf, OutputOf } from '@/lib/contracts/contract'
import { JOIN_CODE_MINUTES, type makeJoinCode } from '@/lib/contracts/join'
import type { AccountActor } from '@/lib/platform/actor'
import type { Deps } from '@/lib/platform/command'
import { newId } from '@/lib/platform/ids'
import { ownEvent } from '@/lib/platform/own-event'
import { type Refusal, refuse } from '@/lib/platform/refusal'
import { secretToken } from '@/lib/platform/secret-token'
import { sha256 } from '@/lib/platform/sha256'
import { writeAudit } from '@/lib/platform/write-audit'

/** A code that lets people ask to join the crew in one role, for a quarter of an hour. Only its hash is kept. */
export function giveJoinCode(
  { params, body }: InputOf<typeof makeJoinCode>,
  actor: AccountActor,
  { database, now, origin }: Pick<Deps, 'database' | 'now' | 'origin'>,
): OutputOf<typeof makeJoinCode> | Refusal {
  const event = ownEvent(database, actor, params.event)
  if (!event) return refuse('missing')
  const [token, expiresAt] = [secretToken(), now + JOIN_CODE_MINUTES * 60_000]
  const owner = { clubId: event.clubId, eventId: event.id }
  transaction(database, (tx) => {
    const row = {
      ...owner,
      id: newId(),
      tokenHash: sha256(token),
      role: body.role,
      expiresAt,
      createdByAccountId: actor.accountId,
      createdAt: now,
    }
    tx.insert(joinCode).values(row).run()
    writeAudit(tx, {
      ...owner,
      at: now,
      accountId: actor.accountId,
      action: 'join-code-made',
      detail: { joinCode: row.id, role: body.role },
    })
  })
  return { token, url: `${origin}/join/${token}`, role: body.role, expiresAt }
}
