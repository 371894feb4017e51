import * as z from 'zod/mini'
import { contract } from './contract'

/** `POST /api/events/[event]/passes/void`: declares a pass of a car void; it is dead for good (rule F7). */
export const voidPass = contract({
  name: 'pass-void',
  method: 'POST',
  path: '/api/events/[event]/passes/void',
  auth: 'session',
  action: 'record:void',
  limitBytes: 4096,
  rate: { times: 60, perSeconds: 60 },
  params: z.strictObject({ event: z.uuid() }),
  body: z.strictObject({
    entry: z.uuid(),
    /** Hash of the pass record. */
    pass: z.string().check(z.regex(/^[0-9a-f]{64}$/)),
    reason: z.string().check(z.trim(), z.minLength(3, 'Say why, in a few words.'), z.maxLength(500)),
  }),
  response: z.strictObject({ voided: z.boolean() }),
})
