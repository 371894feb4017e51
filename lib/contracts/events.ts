import * as z from 'zod/mini'
import { contract } from './contract'

const civilDate = z.string().check(z.regex(/^\d{4}-\d{2}-\d{2}$/, 'a day such as 2027-05-08'))
const words = (least: string) => z.string().check(z.trim(), z.minLength(2, least), z.maxLength(120, 'at most 120 characters'))

/** Longest an event may be, days: a pass is for at most seven. */
export const LONGEST_EVENT_DAYS = 7

export const eventBody = z.strictObject({
  name: words('a name such as “Marram in May”'),
  venue: words('the venue’s name'),
  /** IANA name. */
  timeZone: z.string().check(z.refine(isTimeZone, 'a time zone such as Europe/London')),
  firstDay: civilDate,
  lastDay: civilDate,
  /** Run groups in their running order. */
  groups: z.array(words('a group’s name')).check(z.minLength(1, 'at least one run group'), z.maxLength(12, 'at most twelve groups')),
  defaultDepth: z.enum(['look-over', 'standard', 'full']),
  depthPolicy: z.enum(['all', 'must-see']),
  /** With `must-see`: one car in so many is seen whatever it is; 0 for none. */
  sampleEvery: z.int('a whole number').check(z.gte(0, 'not below 0'), z.lte(100, 'at most 100')),
  listStaleMinutes: z.int('whole minutes').check(z.gte(5, 'at least 5 minutes'), z.lte(240, 'at most 240 minutes')),
})
export type EventBody = z.infer<typeof eventBody>

/** `POST /api/events`: a new event of one's own club, with the newest published checklist of a closed circuit and the limits of a track day. */
export const createEvent = contract({
  name: 'event-create',
  method: 'POST',
  path: '/api/events',
  auth: 'session',
  action: 'event:edit',
  limitBytes: 8_000,
  rate: { times: 20, perSeconds: 60 },
  body: eventBody,
  response: z.object({ event: z.string() }),
})

const time = z.string().check(z.regex(/^([01]\d|2[0-3]):[0-5]\d$/, 'a time such as 09:00'))

export const timetableBlockBody = z.strictObject({
  kind: z.enum(['session', 'briefing', 'engine-curfew', 'break']),
  /** Whose it is; null: everybody's. */
  group: z.nullable(z.string()),
  startsAt: time,
  endsAt: time,
  noiseLimitDb: z.nullable(z.number('dB(A)').check(z.gte(60, 'at least 60 dB(A)'), z.lte(130, 'at most 130 dB(A)'))),
})
export type TimetableBlockBody = z.infer<typeof timetableBlockBody>

export const timetableBody = z.strictObject({ day: civilDate, blocks: z.array(timetableBlockBody).check(z.maxLength(120)) })

/** `PUT /api/events/[event]/timetable`: the whole timetable of one day, in place of what stood there. */
export const saveTimetable = contract({
  name: 'timetable-save',
  method: 'PUT',
  path: '/api/events/[event]/timetable',
  auth: 'session',
  action: 'event:edit',
  limitBytes: 40_000,
  rate: { times: 60, perSeconds: 60 },
  params: z.strictObject({ event: z.uuid() }),
  body: timetableBody,
  response: z.object({ blocks: z.int() }),
})

function isTimeZone(name: string): boolean {
  try {
    return new Intl.DateTimeFormat('en', { timeZone: name }).resolvedOptions().timeZone !== ''
  } catch {
    // That is how a browser and the server both say that they do not know it.
    return false
  }
}
