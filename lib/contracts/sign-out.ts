import * as z from 'zod/mini'
import { contract } from './contract'

export const signOut = contract({
  name: 'sign-out',
  method: 'POST',
  path: '/api/sign-out',
  auth: 'session',
  action: 'public',
  limitBytes: 1_024,
  rate: { times: 60, perSeconds: 60 },
  /** `everywhere` ends the account's sign-ins on all its devices. */
  body: z.strictObject({ everywhere: z.optional(z.boolean()) }),
  response: z.object({ signedOut: z.literal(true) }),
})
