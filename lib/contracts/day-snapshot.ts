import * as z from 'zod/mini'

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
    /** Origin that the sticker's link opens. */
    publicOrigin: z.string(),
  }),
  groups: z.array(z.object({ id: z.string(), name: z.string(), order: z.int(), firstSessionAt: z.nullable(z.int()) })),
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
      facts: z.record(z.string(), z.union([z.string(), z.number(), z.boolean(), z.null()])),
      declaration: z.nullable(z.object({ id: z.string(), version: z.int() })),
      people: z.array(z.object({ person: z.string(), role: z.enum(['driver', 'passenger', 'instructor']) })),
      withdrawn: z.boolean(),
      /** What the entrant or the list said of it ("quiet exhaust fitted"). */
      note: z.string(),
    }),
  ),
  people: z.array(z.object({ id: z.string(), name: z.string() })),
  /** Enrolment certificates of all devices: whoever holds their records can send them back to a restored server (rule S4). */
  certificates: z.array(z.string()),
  crew: z.array(z.object({ id: z.string(), name: z.string(), roles: z.array(z.string()) })),
  /** Checklists and limits by their hash: those in force and those any record pins. */
  checklists: z.record(z.string(), z.unknown()),
  limits: z.record(z.string(), z.unknown()),
})
export type DaySnapshot = z.infer<typeof daySnapshot>
