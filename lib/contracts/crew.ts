import * as z from 'zod/mini'
import { CREW_ROLES } from '@/lib/permissions/policy'
import { contract } from './contract'

const params = z.strictObject({ event: z.uuid() })
export const CREW_STATES = ['waiting', 'accepted', 'refused', 'ended'] as const

export const crewMemberView = z.object({
  id: z.string(),
  person: z.string(),
  name: z.string(),
  role: z.enum(CREW_ROLES),
  state: z.enum(CREW_STATES),
  /** Has an account of its own; the others came by a join code. */
  hasAccount: z.boolean(),
  askedAt: z.int(),
  decidedAt: z.nullable(z.int()),
})
export type CrewMemberView = z.infer<typeof crewMemberView>

/** Everybody who is or asks to be crew of the event; those who wait first. */
export const listCrew = contract({
  name: 'crew-list',
  method: 'GET',
  path: '/api/events/[event]/crew',
  auth: 'session',
  action: 'crew:see',
  limitBytes: 0,
  rate: { times: 240, perSeconds: 60 },
  params,
  response: z.object({ crew: z.array(crewMemberView) }),
})

/** Accepts or refuses who waits; ends the role of who was accepted. */
export const decideCrew = contract({
  name: 'crew-decide',
  method: 'POST',
  path: '/api/events/[event]/crew',
  auth: 'session',
  action: 'crew:accept',
  limitBytes: 1_024,
  rate: { times: 240, perSeconds: 60 },
  params,
  body: z.strictObject({ member: z.uuid(), decision: z.enum(['accept', 'refuse', 'end']) }),
  response: crewMemberView,
})
