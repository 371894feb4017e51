import * as z from 'zod/mini'
import { VERDICTS } from '@/lib/inspection/state'
import { contract } from './contract'

/** Why an entry needs somebody, most pressing first. */
export const NEED_KINDS = [
  'held',
  'not-passed',
  'disagreement',
  'set-aside',
  'two-passes',
  'could-not-see',
  'pass-dead',
  'no-pass',
  'person',
] as const

export const WIRE_STATES = ['ok', 'advisory', 'fail', 'ask', 'none', 'na', 'held'] as const

const boardRow = z.object({
  id: z.string(),
  number: z.string(),
  plate: z.string(),
  model: z.string(),
  colour: z.string(),
  group: z.string(),
  drivers: z.array(z.string()),
  verdict: z.enum(VERDICTS),
  /** One a station of `stations`, in its order; stations where this car has none are `na`. */
  wire: z.array(z.enum(WIRE_STATES)),
  /** The wire in words. */
  sentence: z.string(),
  /** Required checks still to be seen; null before anybody has looked. */
  open: z.nullable(z.int()),
  needs: z.array(z.object({ kind: z.enum(NEED_KINDS), words: z.string() })),
})
export type BoardRow = z.infer<typeof boardRow>

const boardGroup = z.object({
  id: z.string(),
  name: z.string(),
  /** Its first session today, by the timetable. */
  firstSessionAt: z.nullable(z.int()),
  /** Entries that are not withdrawn, and how many of them pass, with or without advisories. */
  entries: z.int(),
  passed: z.int(),
  /** Everybody who sits in one of those entries, and how many of them wear a band that counts today. */
  people: z.int(),
  banded: z.int(),
  /** At the pace of this morning: when its last car is through, and whether that is before its own first session. Nothing is promised. */
  forecast: z.object({
    is: z.enum(['all through', 'in time', 'late', 'too early to say']),
    lastAt: z.nullable(z.int()),
    /** Cars without a pass yet today. */
    toGo: z.int(),
  }),
})
export type BoardGroup = z.infer<typeof boardGroup>

/** `GET /api/events/[event]/board`: how every entry stands today. No address, no telephone. */
export const board = contract({
  name: 'board',
  method: 'GET',
  path: '/api/events/[event]/board',
  auth: 'session',
  action: 'board:see',
  limitBytes: 0,
  rate: { times: 240, perSeconds: 60 },
  params: z.strictObject({ event: z.uuid() }),
  response: z.object({
    /** Server time, ms, and the log's seq that it reflects. */
    at: z.int(),
    seq: z.int(),
    /** Venue day, and the venue's IANA time zone for the clock times. */
    day: z.string(),
    timeZone: z.string(),
    stations: z.array(z.object({ station: z.string(), title: z.string(), short: z.string() })),
    groups: z.array(boardGroup),
    /** By group, then by number. */
    rows: z.array(boardRow),
  }),
})
export type Board = z.infer<typeof board.response>
