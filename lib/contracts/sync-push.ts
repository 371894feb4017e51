import * as z from 'zod/mini'
import { contract } from './contract'

const hash = z.string().check(z.regex(/^[0-9a-f]{64}$/))

/** `POST /api/sync/push`: a device's records, in deviceSeq order (rule S1). Authenticated by the device's request token, not by a cookie. */
export const syncPushRequest = z.strictObject({
  protocol: z.literal(1),
  event: z.string().check(z.maxLength(36)),
  /** The device's enrolment certificate, so that a restored server accepts it (rule M2). */
  certificate: z.string().check(z.maxLength(4096)),
  records: z.array(z.string().check(z.maxLength(32_768))).check(z.maxLength(200)),
  /** Salted free text that records name by hash. */
  notes: z
    .array(z.strictObject({ hash, salt: z.string().check(z.maxLength(64)), text: z.string().check(z.maxLength(2000)) }))
    .check(z.maxLength(200)),
  /** How many records this device still holds unsent, by its own word. */
  unsent: z.int().check(z.gte(0)),
})
export type SyncPushRequest = z.infer<typeof syncPushRequest>

export const syncPushResponse = z.strictObject({
  /** One answer per record, in the order sent; `id` is null where the text could not be read at all. */
  answers: z.array(
    z.strictObject({
      id: z.nullable(z.string()),
      hash,
      outcome: z.enum(['stored', 'duplicate', 'quarantined', 'refused']),
      code: z.nullable(z.string()),
      seq: z.nullable(z.int()),
    }),
  ),
  serverTime: z.int(),
})
export type SyncPushResponse = z.infer<typeof syncPushResponse>

/** Answered by lib/sync/server/accept-push. A retired or lost device may still push: its stops must arrive. */
export const syncPush = contract({
  name: 'sync-push',
  method: 'POST',
  path: '/api/sync/push',
  auth: 'device',
  action: 'sync:push',
  evenRetired: true,
  limitBytes: 8_000_000,
  rate: { times: 240, perSeconds: 60 },
  body: syncPushRequest,
  response: syncPushResponse,
})
