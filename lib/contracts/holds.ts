import * as z from 'zod/mini'
import { contract } from './contract'

const ending = z.nullable(
  z.object({
    how: z.enum(['lifted', 'seen', 'dry']),
    at: z.nullable(z.int()),
    by: z.string(),
    /** Why the chief lifted it; empty otherwise. */
    why: z.string(),
  }),
)

const holdLine = z.object({
  /** Hash of its record; with the subject it is unique, since a wet switch touches many. */
  id: z.string(),
  /** The car it is about, or in which the person sits; null for a person of no car. */
  entry: z.nullable(z.string()),
  number: z.string(),
  plate: z.string(),
  model: z.string(),
  /** Whom it is about; empty for the car. */
  person: z.string(),
  kind: z.enum(['hold', 'recall', 'wet', 'unknown', 'dispensation']),
  state: z.enum(['standing', 'waiting', 'ended']),
  what: z.string(),
  at: z.int(),
  day: z.string(),
  by: z.string(),
  seeAgain: z.array(z.string()),
  alsoLook: z.array(z.string()),
  onlyChiefLifts: z.boolean(),
  stickerRemoved: z.nullable(z.boolean()),
  ending,
})
export type HoldLine = z.infer<typeof holdLine>

const twoPasses = z.object({
  entry: z.string(),
  number: z.string(),
  plate: z.string(),
  model: z.string(),
  passes: z.array(z.object({ hash: z.string(), typedCode: z.string(), at: z.int(), by: z.string() })),
})
export type TwoPasses = z.infer<typeof twoPasses>

/** `GET /api/events/[event]/holds`: every hold, recall and dispensation of the event, standing, waiting and ended, and cars with two live passes. */
export const holds = contract({
  name: 'holds',
  method: 'GET',
  path: '/api/events/[event]/holds',
  auth: 'session',
  action: 'holds:see',
  limitBytes: 0,
  rate: { times: 240, perSeconds: 60 },
  params: z.strictObject({ event: z.uuid() }),
  response: z.object({
    /** Server time, ms. */
    at: z.int(),
    day: z.string(),
    timeZone: z.string(),
    isWet: z.boolean(),
    /** Newest first. */
    lines: z.array(holdLine),
    twoPasses: z.array(twoPasses),
  }),
})
export type Holds = z.infer<typeof holds.response>
