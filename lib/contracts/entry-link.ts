import * as z from 'zod/mini'
import { contract } from './contract'

/** `POST /api/entry-links/[token]`: signs in the person the link was sent to. Opening the page alone does nothing: mail scanners open every link. */
export const openEntryLink = contract({
  name: 'entry-link-open',
  method: 'POST',
  path: '/api/entry-links/[token]',
  auth: 'public',
  action: 'public',
  limitBytes: 256,
  rate: { times: 20, perSeconds: 60 },
  params: z.strictObject({ token: z.string().check(z.regex(/^[A-Za-z0-9_-]{20,64}$/)) }),
  body: z.strictObject({}),
  response: z.object({ entry: z.string() }),
})
