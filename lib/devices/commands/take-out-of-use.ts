import 'server-only'
import { and, eq, gt, max, sql } from 'drizzle-orm'
import { device, event as eventTable, record } from '@/db/schema'
import { transaction } from '@/db/transaction'
import type { InputOf, OutputOf } from '@/lib/contracts/contract'
import type { retireDevice } from '@/lib/contracts/devices'
import type { AccountActor } from '@/lib/platform/actor'
import type { Deps } from '@/lib/platform/command'
import { announce } from '@/lib/platform/live'
import { ownEvent } from '@/lib/platform/own-event'
import { isRefusal, type Refusal, refuse } from '@/lib/platform/refusal'
import { writeAudit } from '@/lib/platform/write-audit'
import { deviceView } from '../queries/see-devices'

/**
 * Takes a device out of use. The last deviceSeq the server holds of it is kept: what permits and comes later does not count (rule T2), what
 * stops still does. A retired device may still be reported lost; nothing makes one active again.
 */
export function takeOutOfUse(
  { params, body }: InputOf<typeof retireDevice>,
  actor: AccountActor,
  { database, now }: Pick<Deps, 'database' | 'now'>,
): OutputOf<typeof retireDevice> | Refusal {
  const event = ownEvent(database, actor, params.event)
  if (!event) return refuse('missing')
  const result = transaction(database, (tx) => {
    const row = tx
      .select()
      .from(device)
      .where(and(eq(device.id, body.device), eq(device.eventId, event.id), gt(device.kid, 0)))
      .get()
    if (!row) return refuse('missing')
    if (row.state === body.as) return deviceView(tx, row)
    if (row.state === 'lost') return refuse('device-decided')
    const held = tx
      .select({ seq: max(record.deviceSeq) })
      .from(record)
      .where(eq(record.deviceId, row.id))
      .get()
    const lastGoodSeq = row.lastGoodSeq ?? held?.seq ?? 0
    tx.update(device).set({ state: body.as, lastGoodSeq }).where(eq(device.id, row.id)).run()
    tx.update(eventTable)
      .set({ snapshotVersion: sql`${eventTable.snapshotVersion} + 1` })
      .where(eq(eventTable.id, event.id))
      .run()
    const detail = { device: row.id, kid: row.kid, lastGoodSeq }
    writeAudit(tx, { clubId: event.clubId, eventId: event.id, at: now, accountId: actor.accountId, action: `device-${body.as}`, detail })
    return deviceView(tx, { ...row, state: body.as, lastGoodSeq })
  })
  if (!isRefusal(result)) announce(event.id)
  return result
}
