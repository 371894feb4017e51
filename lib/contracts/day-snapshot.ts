import * as z from 'zod/mini'

const figures = z.record(z.string(), z.union([z.string(), z.number(), z.boolean(), z.null()]))

/** What a crew device carries of the event besides the log: no address, telephone or birth date. */
export const daySnapshot = z.object({
  /** Changes whenever anything in it does. */
  version: z.string(),
  event: z.object({
    id: z.string(),
    code: z.int(),
    name: z.string(),
    venue: z.string(),
    timeZone: z.string(),
    firstDay: z.string(),
    lastDay: z.string(),
    checklistHash: z.string(),
    limitsHash: z.string(),
    listStaleMinutes: z.int(),
    defaultDepth: z.enum(['look-over', 'standard', 'full']),
    kindOfDay: z.enum(['closed-circuit', 'public-road']),
    /** Origin that the sticker's link opens. */
    publicOrigin: z.string(),
  }),
  groups: z.array(z.object({ id: z.string(), name: z.string(), order: z.int(), firstSessionAt: z.nullable(z.int()) })),
  /** The timetable in order of time. `group` null: everybody's. `session` is the group's own count over the event, from 1. */
  timetable: z.array(
    z.object({
      id: z.string(),
      day: z.string(),
      kind: z.enum(['session', 'briefing', 'engine-curfew', 'break']),
      group: z.nullable(z.string()),
      session: z.nullable(z.int()),
      startsAt: z.int(),
      endsAt: z.int(),
      noiseLimitDb: z.nullable(z.number()),
    }),
  ),
  entries: z.array(
    z.object({
      id: z.string(),
      code: z.int(),
      number: z.string(),
      plate: z.string(),
      plateTail: z.string(),
      colour: z.string(),
      model: z.string(),
      group: z.string(),
      /** Car facts as the organiser or a declaration gives them; what is absent is not known. */
      facts: figures,
      declaration: z.nullable(z.object({ id: z.string(), version: z.int() })),
      /** When that was signed, ms. */
      declaredAt: z.nullable(z.int()),
      /** What the signed declaration says: values by field, by `declaredKey` (`<check>`, or `<check>@<person>` for kit). Beside what is looked at, never instead of it. */
      declared: z.record(z.string(), figures),
      /** Hashes of the photographs of labels, by the same key. */
      declaredPhotos: z.record(z.string(), z.array(z.string())),
      /** Standing findings of the car's last event, for a yes or no (rule F11). */
      history: z.array(
        z.object({
          check: z.string(),
          outcome: z.enum(['ok', 'advisory', 'fail', 'could-not-see']),
          reason: z.nullable(z.string()),
          measured: figures,
          /** Venue day it was seen, and where. */
          day: z.string(),
          venue: z.string(),
          /** Hash of that finding's record: what a carried-forward finding names. */
          hash: z.string(),
          photos: z.array(z.string()),
        }),
      ),
      people: z.array(z.object({ person: z.string(), role: z.enum(['driver', 'passenger', 'instructor']) })),
      withdrawn: z.boolean(),
      /** What the entrant or the list said of it ("quiet exhaust fitted"). */
      note: z.string(),
    }),
  ),
  people: z.array(
    z.object({
      id: z.string(),
      name: z.string(),
      /** Under age: a consent is asked at sign-on. */
      minor: z.boolean(),
    }),
  ),
  /** Enrolment certificates of all devices: whoever holds their records can send them back to a restored server (rule S4). */
  certificates: z.array(z.string()),
  crew: z.array(z.object({ id: z.string(), name: z.string(), roles: z.array(z.string()) })),
  /** Checklists and limits by their hash: those in force and those any record pins. */
  checklists: z.record(z.string(), z.unknown()),
  limits: z.record(z.string(), z.unknown()),
})
export type DaySnapshot = z.infer<typeof daySnapshot>
