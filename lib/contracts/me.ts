import * as z from 'zod/mini'
import { ROLES } from '@/lib/permissions/policy'
import { contract } from './contract'

/** Who is signed in, what they are where, and where else they are signed in. */
export const me = contract({
  name: 'me',
  method: 'GET',
  path: '/api/me',
  auth: 'session',
  action: 'public',
  limitBytes: 0,
  rate: { times: 240, perSeconds: 60 },
  response: z.object({
    accountId: z.string(),
    name: z.string(),
    email: z.string(),
    clubRoles: z.array(z.enum(ROLES)),
    /** Events with a role in them, latest first; all of the club's for its organisers. */
    events: z.array(
      z.object({
        id: z.string(),
        name: z.string(),
        venue: z.string(),
        firstDay: z.string(),
        lastDay: z.string(),
        roles: z.array(z.enum(ROLES)),
      }),
    ),
    signIns: z.array(z.object({ createdAt: z.int(), lastSeenAt: z.int(), userAgent: z.string(), current: z.boolean() })),
  }),
})
