import * as z from 'zod/mini'
import { CREW_ROLES } from '@/lib/permissions/policy'
import { contract } from './contract'

export const crewInviteBody = z.strictObject({
  name: z.string().check(z.trim(), z.minLength(2, 'Write their name as the crew knows them.'), z.maxLength(80, 'A shorter name, please.')),
  email: z.email('An e-mail address such as tobin@example.org.').check(z.maxLength(200)),
  role: z.enum(CREW_ROLES),
})

/** Makes somebody with an e-mail address crew of the event, and writes them how to come in. The same role twice is one invitation. */
export const inviteCrew = contract({
  name: 'crew-invite',
  method: 'POST',
  path: '/api/events/[event]/crew/invitations',
  auth: 'session',
  action: 'crew:accept',
  limitBytes: 2_000,
  rate: { times: 60, perSeconds: 60 },
  params: z.strictObject({ event: z.uuid() }),
  body: crewInviteBody,
  response: z.object({
    /** Whether an account was made for the address; they then choose a password by the link in the mail. */
    isNew: z.boolean(),
    /** False where they had that role already. */
    isAdded: z.boolean(),
  }),
})

export const choosePasswordBody = z.strictObject({ password: z.string().check(z.maxLength(400)) })

/** Chooses a password by the link of an invitation: once, and every other sign-in of that account ends. */
export const choosePassword = contract({
  name: 'password-choose',
  method: 'POST',
  path: '/api/password/[token]',
  auth: 'public',
  action: 'public',
  limitBytes: 2_000,
  rate: { times: 20, perSeconds: 60 },
  params: z.strictObject({ token: z.string().check(z.maxLength(60)) }),
  body: choosePasswordBody,
  response: z.object({ email: z.string() }),
})
