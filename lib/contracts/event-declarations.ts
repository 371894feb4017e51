import * as z from 'zod/mini'
import { PRE_CHECKS } from '@/lib/checklist/pre-check'
import { contract } from './contract'

/** `GET /api/events/[event]/declarations`: who has not declared, and what would not be passed. */
export const eventDeclarations = contract({
  name: 'event-declarations',
  method: 'GET',
  path: '/api/events/[event]/declarations',
  auth: 'session',
  action: 'entries:see',
  limitBytes: 0,
  rate: { times: 120, perSeconds: 60 },
  params: z.strictObject({ event: z.uuid() }),
  response: z.object({
    /** Entries that are not withdrawn. */
    entries: z.int(),
    declared: z.int(),
    rows: z.array(
      z.object({
        entry: z.string(),
        number: z.string(),
        model: z.string(),
        drivers: z.array(z.string()),
        version: z.nullable(z.int()),
        signedAt: z.nullable(z.int()),
        says: z.enum(PRE_CHECKS),
        /** What would not be passed, and why; with what will be looked at after it. */
        worries: z.array(z.object({ weight: z.enum(['fail', 'advisory']), prompt: z.string(), words: z.string() })),
      }),
    ),
  }),
})
export type EventDeclarations = z.infer<typeof eventDeclarations.response>
