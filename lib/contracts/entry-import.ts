import * as z from 'zod/mini'
import { contract } from './contract'

const rowProblem = z.object({ row: z.int(), column: z.string(), value: z.string(), why: z.string() })
const column = z.enum([
  'number',
  'name',
  'firstName',
  'surname',
  'email',
  'mobile',
  'make',
  'model',
  'colour',
  'plate',
  'group',
  'passengerSeats',
  'role',
  'secondDriver',
  'team',
  'note',
])
const encoding = z.enum(['utf-8', 'utf-16le', 'utf-16be', 'windows-1252'])
const row = z.int().check(z.gte(0), z.lte(200_000))

/** What the organiser says about a list by hand; goes with each dry run until the list is imported. */
const choices = z.strictObject({
  encoding: z.nullable(encoding),
  headingRow: z.nullable(row),
  columns: z.nullable(z.array(z.nullable(column)).check(z.maxLength(200))),
  corrections: z.array(z.strictObject({ row, column, value: z.string().check(z.maxLength(600)) })).check(z.maxLength(2_000)),
  leftOut: z.array(row).check(z.maxLength(10_000)),
})

const answers = z
  .array(
    z.strictObject({
      id: z.string().check(z.maxLength(200)),
      value: z.string().check(z.maxLength(200)),
      text: z.string().check(z.maxLength(2_000)),
    }),
  )
  .check(z.maxLength(10_000))

/** Longest file in base64: with the answers beside it well under the limit of the whole. */
export const LARGEST_LIST_BASE64 = 7_000_000

/** Imports an entry list, or says what importing it would do. All rows or none: a list with a problem or an open question commits nothing. */
export const entryImport = contract({
  name: 'entry-import',
  method: 'POST',
  path: '/api/events/[event]/entries/import',
  auth: 'session',
  action: 'entries:import',
  limitBytes: 8_000_000,
  rate: { times: 60, perSeconds: 60 },
  params: z.strictObject({ event: z.uuid() }),
  body: z.strictObject({
    fileName: z.string().check(z.maxLength(200)),
    /** The file as it is, base64: how it is written is found out here, not guessed by a browser. */
    base64: z.string().check(z.maxLength(LARGEST_LIST_BASE64), z.regex(/^[A-Za-z0-9+/]*={0,2}$/)),
    choices,
    answers,
    /** Only look: nothing is written. */
    dryRun: z.boolean(),
    /** What the dry run answered; the import is refused when the event or the answers have changed since. Empty for a dry run. */
    planHash: z.string().check(z.maxLength(64)),
  }),
  response: z.object({
    committed: z.boolean(),
    encoding: z.nullable(encoding),
    separator: z.string(),
    headingRow: z.int(),
    columns: z.array(
      z.object({
        index: z.int(),
        heading: z.string(),
        column: z.nullable(column),
        sure: z.enum(['sure', 'likely', 'unknown']),
        samples: z.array(z.string()),
      }),
    ),
    /** What the columns are must be said by hand before anything is imported. */
    columnsNeeded: z.boolean(),
    rowCount: z.int(),
    /** Entries that would be (or were) added, changed, left as they are; people they come with. */
    added: z.int(),
    changed: z.int(),
    unchanged: z.int(),
    people: z.int(),
    /** Entries of the event that the list does not name. */
    notInList: z.int(),
    changes: z.array(z.object({ number: z.string(), fields: z.array(z.string()) })),
    questions: z.array(
      z.object({
        id: z.string(),
        asks: z.string(),
        rows: z.array(z.object({ row: z.int(), number: z.string(), plate: z.string(), name: z.string(), model: z.string() })),
        options: z.array(z.object({ value: z.string(), words: z.string(), asks: z.nullable(z.string()) })),
        likely: z.nullable(z.string()),
        answer: z.nullable(z.object({ id: z.string(), value: z.string(), text: z.string() })),
        does: z.string(),
      }),
    ),
    questionCount: z.int(),
    openQuestions: z.int(),
    problems: z.array(rowProblem),
    problemCount: z.int(),
    remarks: z.array(z.object({ row: z.int(), words: z.string() })),
    remarkCount: z.int(),
    newGroups: z.array(z.string()),
    planHash: z.string(),
    /** Milliseconds the server took to read and plan. */
    tookMs: z.int(),
  }),
})
