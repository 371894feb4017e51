import 'server-only'
import { eq } from 'drizzle-orm'
import { readFileSync } from 'node:fs'
import { resolve } from 'node:path'
import type { Db } from '@/db/client'
import { account, entryImport } from '@/db/schema'
import { importEntryList } from '@/lib/entries/commands/import-entry-list'
import type { AccountActor } from '@/lib/platform/actor'
import { isRefusal } from '@/lib/platform/refusal'
import { sha256 } from '@/lib/platform/sha256'
import { MARRAM } from './marram'
import type { SeededMarram } from './seed-marram'

const NOTHING_SAID = { encoding: null, headingRow: null, columns: null, corrections: [], leftOut: [] }

/** Imports the demo's entry list by the very command the organiser's page uses: a dry run first, then what it planned. Once per event. */
export function seedMarramEntries(database: Db, seeded: SeededMarram, now: number): void {
  const base64 = readFileSync(resolve(process.cwd(), MARRAM.entryList)).toString('base64')
  const before = database.select({ textHash: entryImport.textHash }).from(entryImport).where(eq(entryImport.eventId, seeded.eventId)).all()
  if (before.some(({ textHash }) => textHash === sha256(base64))) return
  const list = { fileName: 'entries.csv', base64, choices: NOTHING_SAID, answers: [] }
  const ask = (body: { readonly dryRun: boolean; readonly planHash: string }) =>
    importEntryList({ params: { event: seeded.eventId }, query: {}, body: { ...list, ...body } }, organiserOf(database, seeded), {
      database,
      now,
    })
  const plan = ask({ dryRun: true, planHash: '' })
  if (isRefusal(plan)) throw new Error(`the demo's entry list was refused: ${plan.code}`)
  const done = ask({ dryRun: false, planHash: plan.planHash })
  if (isRefusal(done) || !done.committed) throw new Error("the demo's entry list was not imported")
}

function organiserOf(database: Db, { organiserAccountId }: SeededMarram): AccountActor {
  const row = database.select().from(account).where(eq(account.id, organiserAccountId)).get()
  if (!row) throw new Error('the demo has no organiser')
  return { kind: 'account', accountId: row.id, clubId: row.clubId, name: row.name, clubRoles: row.roles, signInHash: '' }
}
