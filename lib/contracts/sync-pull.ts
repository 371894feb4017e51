import * as z from 'zod/mini'
import { contract } from './contract'
import { daySnapshot } from './day-snapshot'

const hash = z.string().check(z.regex(/^[0-9a-f]{64}$/))

/** `GET /api/sync/pull`: query. `at` is the chain hash the device holds at `since` (rule S4); empty at 0. */
export const syncPullRequest = z.strictObject({
  event: z.string().check(z.maxLength(36)),
  since: z.coerce.number().check(z.int(), z.gte(0), z.lte(Number.MAX_SAFE_INTEGER)),
  at: z.string().check(z.regex(/^([0-9a-f]{64})?$/)),
  /** Version of the snapshot the device holds; empty for none. */
  snapshot: z.string().check(z.maxLength(64)),
})
export type SyncPullRequest = z.infer<typeof syncPullRequest>

export const syncPullResponse = z.object({
  /** The chain at `since` is not the one the device knows: a restored copy. Push everything held, then pull from 0. */
  restored: z.boolean(),
  records: z.array(
    z.object({
      seq: z.int(),
      jws: z.string(),
      hash,
      chain: hash,
      disposition: z.enum(['accepted', 'quarantined']),
      code: z.nullable(z.string()),
    }),
  ),
  notes: z.array(z.object({ hash, salt: z.string(), text: z.string() })),
  more: z.boolean(),
  /** Seq that the log had reached when this page was read; for progress. */
  head: z.int(),
  /** Present where the device's is out of date, on the last page only. */
  snapshot: z.nullable(daySnapshot),
  /** The pass list (lib/pass/pass-list), on the last page only. */
  list: z.nullable(z.unknown()),
  serverTime: z.int(),
  /** Seq and chain hash at the end of this page. */
  seq: z.int(),
  chain: z.string(),
})
export type SyncPullResponse = z.infer<typeof syncPullResponse>

export const syncPull = contract({
  name: 'sync-pull',
  method: 'GET',
  path: '/api/sync/pull',
  auth: 'device',
  action: 'day:load',
  limitBytes: 0,
  rate: { times: 600, perSeconds: 60 },
  query: syncPullRequest,
  response: syncPullResponse,
})
