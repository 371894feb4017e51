import * as z from 'zod/mini'

/** Every way a request can fail as expected. Status and words stand in lib/http/errors. */
export const PROBLEM_CODES = [
  'malformed',
  'invalid',
  'not-json',
  'too-large',
  'foreign-origin',
  'not-signed-in',
  'sign-in-refused',
  'too-many-tries',
  'device-not-known',
  'device-token-wrong',
  'device-token-late',
  'device-retired',
  'protocol-too-old',
  'forbidden',
  'missing',
  'rate-limited',
  'busy',
  'no-room',
  'fault',
  'join-code-unknown',
  'join-code-expired',
  'claim-unknown',
  'claim-not-accepted',
  'claim-used',
  'crew-decided',
  'not-crew',
  'keys-used-up',
  'device-decided',
  'entry-link-over',
  'entry-link-needs-password',
  'entry-link-no-address',
  'declaration-closed',
  'import-refused',
  'import-stale',
  'entry-edited-meanwhile',
  'mail-count-changed',
  'photo-not-one',
  'photo-unreadable',
  'photo-too-many-pixels',
  'photo-other-hash',
  'no-network',
  'not-our-server',
] as const
export type ProblemCode = (typeof PROBLEM_CODES)[number]

/** What a failure sends (RFC 9457, `application/problem+json`): what happened, what was kept, what to do. */
export const problem = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  code: z.enum(PROBLEM_CODES),
  what: z.string(),
  kept: z.string(),
  todo: z.string(),
  /** Where the sent data was wrong, path and words; for forms. */
  issues: z.array(z.object({ path: z.string(), message: z.string() })),
  /** Server time, ms: a device with a wrong clock corrects its request tokens by it. 0 when no server answered. */
  serverTime: z.int(),
})
export type Problem = z.infer<typeof problem>
