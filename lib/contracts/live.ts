import * as z from 'zod/mini'
import { contract } from './contract'

/** `GET /api/events/[event]/live`: server-sent events that carry versions only (rule S8); who hears one pulls. The first comes at once. */
export const live = contract({
  name: 'event-live',
  method: 'GET',
  path: '/api/events/[event]/live',
  auth: 'either',
  action: 'board:see',
  limitBytes: 0,
  rate: { times: 240, perSeconds: 60 },
  params: z.strictObject({ event: z.uuid() }),
  response: z.strictObject({
    /** Highest seq of the event's log. */
    seq: z.int(),
    /** Version of what is ordinary rows: entries, people, checklist. */
    snapshot: z.int(),
  }),
})
