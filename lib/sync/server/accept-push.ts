import 'server-only'
import { PROTOCOL_VERSION } from '@/lib/contracts/protocol-version'
import type { syncPush } from '@/lib/contracts/sync-push'
import type { Command } from '@/lib/platform/command'
import { announce } from '@/lib/platform/live'
import { refuse } from '@/lib/platform/refusal'
import { pushIntoLog } from './push-into-log'
import { verifyRecords } from './verify-records'

/** Answers `POST /api/sync/push`: signatures first, then one transaction, then whoever listens is told. */
export const acceptPush: Command<typeof syncPush> = async ({ body }, actor, { database, now }) => {
  if (body.event !== actor.eventId) return refuse('missing')
  if (body.protocol !== PROTOCOL_VERSION) return refuse('protocol-too-old')
  const verified = await verifyRecords(database, actor, body.records, body.certificates, now)
  const pusher = { deviceId: actor.deviceId, unsent: body.unsent }
  const { answers, stored } = pushIntoLog(database, body.event, verified, body.notes, pusher, now)
  if (stored > 0) announce(body.event)
  return { answers: [...answers], serverTime: now }
}
