import * as z from 'zod/mini'
import { contract } from './contract'

const civilDate = z.string().check(z.regex(/^\d{4}-\d{2}-\d{2}$/, 'a day such as 2026-05-09'))

/** What the organiser says of the bay on one day. */
export const bayPlanBody = z.strictObject({
  day: civilDate,
  opensAt: z.string().check(z.regex(/^([01]\d|2[0-3]):[0-5]\d$/, 'a time such as 07:30')),
  lanes: z.int('a whole number of people').check(z.gte(1, 'at least one'), z.lte(40, 'at most 40')),
  windowMin: z.int('whole minutes').check(z.gte(5, 'at least 5 minutes'), z.lte(60, 'at most 60 minutes')),
  carMin: z.number('minutes').check(z.gte(1, 'at least 1 minute'), z.lte(60, 'at most 60 minutes')),
  carSdMin: z.number('minutes').check(z.gte(0, 'not below 0'), z.lte(60, 'at most 60 minutes')),
  /** Tell the entrants these windows, not only work them out. */
  publish: z.boolean(),
})
export type BayPlanBody = z.infer<typeof bayPlanBody>

const car = z.object({
  entry: z.string(),
  number: z.string(),
  model: z.string(),
  /** Why it is called early; null where nothing is doubtful. */
  doubt: z.nullable(z.enum(['would not be passed', 'not declared', 'not answered'])),
})

export const bayOrderView = z.object({
  day: z.string(),
  days: z.array(z.string()),
  timeZone: z.string(),
  plan: z.object({ ...bayPlanBody.shape, publish: z.optional(z.boolean()) }),
  /** Somebody has saved it; else these are proposals. */
  isPlanned: z.boolean(),
  publishedAt: z.nullable(z.int()),
  /** Cars whose told window is another than this order gives, or that were told none. */
  toldOtherwise: z.int(),
  groups: z.array(
    z.object({
      id: z.string(),
      name: z.string(),
      firstSessionAt: z.nullable(z.int()),
      cars: z.int(),
      doubtful: z.int(),
      /** Cars to be through before its first session, those of the groups before it included, and the working minutes there are for them. */
      carsBefore: z.int(),
      workingMin: z.nullable(z.int()),
      peopleAtLeast: z.nullable(z.int()),
      /** With 95 %; null where no number of people is enough, or the group has no session. */
      peopleNeeded: z.nullable(z.int()),
    }),
  ),
  windows: z.array(z.object({ group: z.string(), from: z.int(), to: z.int(), isLate: z.boolean(), cars: z.array(car) })),
  holes: z.array(z.object({ kind: z.enum(['briefing', 'engine-curfew', 'break']), from: z.int(), to: z.int() })),
  /** What waiting comes to if cars come whenever they like instead (Erlang C over the working time before the last first session); null without a session. */
  withoutWindows: z.nullable(z.object({ settles: z.boolean(), meanWaitMin: z.nullable(z.number()), over10Min: z.number() })),
  lateWindow: z.nullable(z.object({ from: z.int(), to: z.int() })),
})
export type BayOrderView = z.infer<typeof bayOrderView>

const params = z.strictObject({ event: z.uuid() })

/** `GET /api/events/[event]/order`: the order of one venue day, by default today or the first. */
export const seeBayOrder = contract({
  name: 'see-bay-order',
  method: 'GET',
  path: '/api/events/[event]/order',
  auth: 'session',
  action: 'order:see',
  limitBytes: 0,
  rate: { times: 120, perSeconds: 60 },
  params,
  query: z.strictObject({ day: z.optional(civilDate) }),
  response: bayOrderView,
})

/** Keeps the plan of a day and gives the order it comes to; with `publish` every car is told its window. */
export const planBay = contract({
  name: 'plan-bay',
  method: 'POST',
  path: '/api/events/[event]/order',
  auth: 'session',
  action: 'order:plan',
  limitBytes: 2_000,
  rate: { times: 60, perSeconds: 60 },
  params,
  body: bayPlanBody,
  response: bayOrderView,
})
