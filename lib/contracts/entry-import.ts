import * as z from 'zod/mini'
import { contract } from './contract'

const rowProblem = z.object({ row: z.int(), column: z.string(), value: z.string(), why: z.string() })

/** Imports an entry list, or says what importing it would do. All rows or none: a list with a problem commits nothing. */
export const entryImport = contract({
  name: 'entry-import',
  method: 'POST',
  path: '/api/events/[event]/entries/import',
  auth: 'session',
  action: 'entries:import',
  limitBytes: 8_000_000,
  rate: { times: 30, perSeconds: 60 },
  params: z.strictObject({ event: z.uuid() }),
  body: z.strictObject({
    fileName: z.string().check(z.maxLength(200)),
    text: z.string(),
    /** Only look: nothing is written. */
    dryRun: z.boolean(),
    /** What the dry run answered; the import is refused when the event has changed since. Empty for a dry run. */
    planHash: z.string().check(z.maxLength(64)),
  }),
  response: z.object({
    committed: z.boolean(),
    rowCount: z.int(),
    /** Entries that would be (or were) added, changed, left as they are. */
    added: z.int(),
    changed: z.int(),
    unchanged: z.int(),
    addedNumbers: z.array(z.string()),
    changes: z.array(z.object({ number: z.string(), fields: z.array(z.string()) })),
    problems: z.array(rowProblem),
    problemCount: z.int(),
    unusedHeadings: z.array(z.string()),
    newGroups: z.array(z.string()),
    planHash: z.string(),
  }),
})
