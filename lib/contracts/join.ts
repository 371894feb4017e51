import * as z from 'zod/mini'
import { contract } from './contract'
import { CREW_STATES } from './crew'

/** Roles a join code may give: nobody becomes chief or organiser without an account (rule M4). */
export const JOIN_ROLES = ['scrutineer', 'helper', 'sign-on', 'marshal'] as const
export const JOIN_CODE_MINUTES = 15

const token = z.strictObject({ token: z.string().check(z.regex(/^[A-Za-z0-9_-]{20,64}$/)) })
const claim = z.string().check(z.regex(/^[A-Za-z0-9_-]{20,64}$/))
const eventView = z.object({ id: z.string(), name: z.string(), venue: z.string(), firstDay: z.string(), lastDay: z.string() })

/** The token is told once; several people may join by it until it runs out, and each is accepted by itself. */
export const makeJoinCode = contract({
  name: 'join-code-make',
  method: 'POST',
  path: '/api/events/[event]/join-codes',
  auth: 'session',
  action: 'join-code:make',
  limitBytes: 1_024,
  rate: { times: 60, perSeconds: 60 },
  params: z.strictObject({ event: z.uuid() }),
  body: z.strictObject({ role: z.enum(JOIN_ROLES) }),
  response: z.object({ token: z.string(), url: z.string(), role: z.enum(JOIN_ROLES), expiresAt: z.int() }),
})

/** What a join code is for. */
export const seeJoinCode = contract({
  name: 'join-code-see',
  method: 'GET',
  path: '/api/join/[token]',
  auth: 'public',
  action: 'public',
  limitBytes: 0,
  rate: { times: 60, perSeconds: 60 },
  params: token,
  response: z.object({ event: eventView, role: z.enum(JOIN_ROLES), expiresAt: z.int() }),
})

export const joinBody = z.strictObject({
  name: z
    .string()
    .check(
      z.trim(),
      z.minLength(2, 'Write your name as the crew knows you.'),
      z.maxLength(80, 'A shorter name, please: at most 80 letters.'),
      z.regex(/^[^\p{Cc}\p{Cf}\p{Zl}\p{Zp}]*$/u, 'Only letters that can be seen, please.'),
    ),
})

/** Asks to join the crew. The claim is told once; the phone keeps it until it is enrolled. */
export const join = contract({
  name: 'join',
  method: 'POST',
  path: '/api/join/[token]',
  auth: 'public',
  action: 'public',
  limitBytes: 2_048,
  rate: { times: 20, perSeconds: 60 },
  params: token,
  body: joinBody,
  response: z.object({ claim: z.string(), member: z.string(), person: z.string(), role: z.enum(JOIN_ROLES), event: eventView }),
})

/** Whether the phone that holds this claim has been accepted. */
export const joinState = contract({
  name: 'join-state',
  method: 'POST',
  path: '/api/join/state',
  auth: 'public',
  action: 'public',
  limitBytes: 1_024,
  rate: { times: 120, perSeconds: 60 },
  body: z.strictObject({ claim }),
  response: z.object({
    state: z.enum(CREW_STATES),
    name: z.string(),
    person: z.string(),
    role: z.enum(['chief', ...JOIN_ROLES]),
    event: eventView,
  }),
})
