import * as z from 'zod/mini'
import { contract } from './contract'

export const signInBody = z.strictObject({
  email: z.string().check(z.trim(), z.toLowerCase(), z.email('Write an e-mail address, such as name@example.org.'), z.maxLength(254)),
  password: z.string().check(z.minLength(1, 'Write your password.'), z.maxLength(200)),
})

/** Sets the sign-in's cookie. Wrong password and unknown e-mail are answered alike. */
export const signIn = contract({
  name: 'sign-in',
  method: 'POST',
  path: '/api/sign-in',
  auth: 'public',
  action: 'public',
  limitBytes: 4_096,
  rate: { times: 30, perSeconds: 60 },
  body: signInBody,
  response: z.object({ accountId: z.string(), name: z.string(), roles: z.array(z.enum(['admin', 'organiser', 'entrant'])) }),
})
