import * as z from 'zod/mini'
import { contract } from './contract'

/** What somebody in a car is there for. */
export const SEAT_ROLES = ['driver', 'passenger', 'instructor'] as const

const words = (longest: number) => z.string().check(z.trim(), z.maxLength(longest))
const needed = (longest: number, message: string) => z.string().check(z.trim(), z.minLength(1, message), z.maxLength(longest, 'Too long'))

/** As much of an entry as the office edits; the form is built on it. */
export const entryEdit = z.strictObject({
  number: z
    .string()
    .check(z.trim(), z.toUpperCase(), z.regex(/^[A-Z0-9]{1,6}$/, 'A number is 1 to 6 letters or digits, as it stands on the door.')),
  plate: z
    .string()
    .check(
      z.trim(),
      z.toUpperCase(),
      z.regex(/^[\p{L}\p{N}][\p{L}\p{N} -]{0,11}$/u, 'A plate is up to 12 letters, digits, spaces or hyphens.'),
    ),
  group: z.uuid(),
  model: needed(80, 'Name the car.'),
  colour: words(80),
  passengerSeats: z.int('A whole number').check(z.gte(0, '0 to 4'), z.lte(4, '0 to 4')),
  note: words(500),
  facts: z.record(z.string().check(z.maxLength(60)), z.nullable(z.union([z.string().check(z.maxLength(200)), z.number(), z.boolean()]))),
  people: z
    .array(
      z.strictObject({
        /** Null for somebody new; a person of this event otherwise. */
        person: z.nullable(z.uuid()),
        role: z.enum(SEAT_ROLES),
        name: needed(80, 'Who is it?'),
        email: z
          .string()
          .check(
            z.trim(),
            z.toLowerCase(),
            z.regex(/^$|^[^\s@"<>]+@[^\s@"<>]+\.[^\s@"<>]+$/, 'This is not an e-mail address.'),
            z.maxLength(120),
          ),
        mobile: words(40),
      }),
    )
    .check(z.maxLength(60)),
  withdrawn: z.boolean(),
})
export type EntryEdit = z.infer<typeof entryEdit>

/** Changes an entry. Refused when somebody changed it since it was read; once it has a record, what changes is a record too. */
export const editEntry = contract({
  name: 'entry-edit',
  method: 'PATCH',
  path: '/api/events/[event]/entries/[entry]',
  auth: 'session',
  action: 'entries:edit',
  limitBytes: 60_000,
  rate: { times: 60, perSeconds: 60 },
  params: z.strictObject({ event: z.uuid(), entry: z.uuid() }),
  body: z.strictObject({
    /** Of the entry as it was read. */
    version: z.int().check(z.gte(1)),
    edit: entryEdit,
  }),
  response: z.object({
    version: z.int(),
    /** Records it made in the day's log. */
    records: z.int(),
    /** What was changed, in the form's words; empty where nothing was. */
    fields: z.array(z.string()),
  }),
})
