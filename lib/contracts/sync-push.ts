import * as z from 'zod/mini'
import { contract } from './contract'

const hash = z.string().check(z.regex(/^[0-9a-f]{64}$/))

/** `POST /api/sync/push`: a device's records, in deviceSeq order (rule S1). Authenticated by the device's request token, not by a cookie. */
export const syncPushRequest = z.strictObject({
  protocol: z.int(),
  event: z.string().check(z.maxLength(36)),
  /** Enrolment certificates of the devices whose records these are: a restored server may have forgotten them (rules M2, S4). */
  certificates: z.array(z.string().check(z.maxLength(16_384))).check(z.maxLength(255)),
  /** Compact JWS. One that is too long or no JWS is answered for by itself and never blocks the rest. */
  records: z.array(z.string()).check(z.maxLength(200)),
  /** Salted free text that records name by hash. */
  notes: z
    .array(z.strictObject({ hash, salt: z.string().check(z.maxLength(64)), text: z.string().check(z.maxLength(2000)) }))
    .check(z.maxLength(400)),
  /** How many records this device still holds unsent, by its own word, these included. */
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
      /** Why quarantined or refused; for a duplicate, why it once was. */
      code: z.nullable(z.string()),
      seq: z.nullable(z.int()),
    }),
  ),
  serverTime: z.int(),
})
export type SyncPushResponse = z.infer<typeof syncPushResponse>

export const syncPush = contract({
  name: 'sync-push',
  method: 'POST',
  path: '/api/sync/push',
  auth: 'device',
  action: 'day:load',
  // A fail recorded before the tablet was retired must still arrive (rule T2).
  evenRetired: true,
  limitBytes: 4_000_000,
  rate: { times: 600, perSeconds: 60 },
  body: syncPushRequest,
  response: syncPushResponse,
})
