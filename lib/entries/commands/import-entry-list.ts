import 'server-only'
import { and, eq, sql } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { car, entry, entryImport as importTable, entryPerson, event, person, runGroup } from '@/db/schema'
import { transaction } from '@/db/transaction'
import type { entryImport } from '@/lib/contracts/entry-import'
import type { InputOf, OutputOf } from '@/lib/contracts/contract'
import { assert } from '@/lib/platform/assert'
import type { AccountActor } from '@/lib/platform/actor'
import type { Deps } from '@/lib/platform/command'
import { newId } from '@/lib/platform/ids'
import { announce } from '@/lib/platform/live'
import { isRefusal, refuse, type Refusal } from '@/lib/platform/refusal'
import { sha256 } from '@/lib/platform/sha256'
import { writeAudit } from '@/lib/platform/write-audit'
import type { EntryRow } from '../entry-row'
import { fullName, plateKey } from '../entry-row'
import { existingEntries, type ExistingEntryRow } from '../queries/existing-entries'
import { planImport, type ImportPlan } from '../plan-import'
import { readEntryList, type EntryList } from '../read-entry-list'

/** How many problems an answer carries at most; their true count stands beside them. */
const PROBLEMS_SHOWN = 500

type Answer = OutputOf<typeof entryImport>

/** Imports an entry list into an event in one transaction, or only says what it would do. A list with any problem commits nothing. */
export function importEntryList(
  { params, body }: InputOf<typeof entryImport>,
  actor: AccountActor,
  deps: Pick<Deps, 'database' | 'now'>,
): Answer | Refusal {
  const list = readEntryList(body.text)
  const result = transaction(deps.database, (tx) => {
    const target = tx
      .select()
      .from(event)
      .where(and(eq(event.id, params.event), eq(event.clubId, actor.clubId)))
      .get()
    if (!target) return refuse('missing')
    const existing = existingEntries(tx, target.id)
    const plan = planImport(list.rows, existing)
    const groups = tx.select().from(runGroup).where(eq(runGroup.eventId, target.id)).all()
    const answer = describe(list, plan, groups, sha256(JSON.stringify([body.text, existing])))
    if (body.dryRun) return answer
    if (answer.problemCount > 0) return refuse('import-refused')
    if (body.planHash !== answer.planHash) return refuse('import-stale')
    commit(tx, { target, plan, groups, deps, actor, body })
    return { ...answer, committed: true }
  })
  if (!isRefusal(result) && result.committed) announce(params.event)
  return result
}

function describe(list: EntryList, plan: ImportPlan, groups: readonly { name: string }[], planHash: string): Answer {
  const problems = [...list.problems, ...plan.problems].sort((a, b) => a.row - b.row)
  const known = new Set(groups.map((group) => group.name))
  return {
    committed: false,
    rowCount: list.rowCount,
    added: plan.add.length,
    changed: plan.change.length,
    unchanged: plan.unchanged,
    addedNumbers: plan.add.map((row) => row.number),
    changes: plan.change.map(({ row, fields }) => ({ number: row.number, fields: [...fields] })),
    problems: problems.slice(0, PROBLEMS_SHOWN),
    problemCount: problems.length,
    unusedHeadings: [...list.unusedHeadings],
    newGroups: [...new Set(list.rows.map((row) => row.group))].filter((name) => !known.has(name)),
    planHash,
  }
}

interface Commit {
  readonly target: typeof event.$inferSelect
  readonly plan: ImportPlan
  readonly groups: readonly (typeof runGroup.$inferSelect)[]
  readonly deps: Pick<Deps, 'now'>
  readonly actor: AccountActor
  readonly body: { readonly fileName: string; readonly text: string }
}

function commit(tx: Db, { target, plan, groups, deps, actor, body }: Commit): void {
  const groupIds = new Map(groups.map((group) => [group.name, group.id]))
  const groupId = (name: string) => {
    const known = groupIds.get(name)
    if (known) return known
    const id = newId()
    tx.insert(runGroup).values({ id, clubId: target.clubId, eventId: target.id, name, order: groupIds.size, firstSessionAt: null }).run()
    groupIds.set(name, id)
    return id
  }
  plan.add.forEach((row, index) => addEntry(tx, target, row, groupId(row.group), target.nextEntryCode + index))
  for (const { entry: known, row } of plan.change) changeEntry(tx, target, known as ExistingEntryRow, row, groupId(row.group))
  const added = plan.add.length
  assert(target.nextEntryCode + added <= 65_536, 'an event has at most 65535 entry codes')
  if (added + plan.change.length > 0)
    tx.update(event)
      .set({ nextEntryCode: target.nextEntryCode + added, snapshotVersion: sql`${event.snapshotVersion} + 1` })
      .where(eq(event.id, target.id))
      .run()
  const importId = newId()
  tx.insert(importTable)
    .values({
      id: importId,
      clubId: target.clubId,
      eventId: target.id,
      textHash: sha256(body.text),
      fileName: body.fileName,
      added,
      changed: plan.change.length,
      unchanged: plan.unchanged,
      byAccountId: actor.accountId,
      at: deps.now,
    })
    .run()
  const detail = { import: importId, added, changed: plan.change.length, unchanged: plan.unchanged }
  const { clubId, id: eventId } = target
  writeAudit(tx, { clubId, eventId, at: deps.now, accountId: actor.accountId, action: 'entries-imported', detail })
}

function addEntry(tx: Db, target: Commit['target'], row: EntryRow, group: string, code: number): void {
  const { clubId } = target
  const entryId = newId()
  const personId = newId()
  tx.insert(entry)
    .values({
      id: entryId,
      clubId,
      eventId: target.id,
      carId: carFor(tx, clubId, row),
      code,
      number: row.number,
      plate: row.plate,
      groupId: group,
      facts: {},
      note: row.note,
      passengerSeats: row.passengerSeats,
      withdrawn: false,
    })
    .run()
  tx.insert(person)
    .values({ id: personId, clubId, eventId: target.id, accountId: null, ...contactsOf(row) })
    .run()
  tx.insert(entryPerson).values({ clubId, entryId, personId, role: 'driver' }).run()
}

/** The club's car with this plate; a car of another model or colour under the same plate is another car. */
function carFor(tx: Db, clubId: string, row: EntryRow): string {
  const plate = plateKey(row.plate)
  const known = tx
    .select({ id: car.id })
    .from(car)
    .where(and(eq(car.clubId, clubId), eq(car.plate, plate), eq(car.model, row.model), eq(car.colour, row.colour)))
    .get()
  if (known) return known.id
  const id = newId()
  tx.insert(car).values({ id, clubId, model: row.model, colour: row.colour, plate }).run()
  return id
}

function changeEntry(tx: Db, target: Commit['target'], known: ExistingEntryRow, row: EntryRow, group: string): void {
  tx.update(entry)
    .set({ carId: carFor(tx, target.clubId, row), plate: row.plate, groupId: group, note: row.note, passengerSeats: row.passengerSeats })
    .where(eq(entry.id, known.id))
    .run()
  if (known.personId !== null) tx.update(person).set(contactsOf(row)).where(eq(person.id, known.personId)).run()
}

function contactsOf(row: EntryRow): { name: string; email: string | null; mobile: string | null } {
  return { name: fullName(row), email: row.email || null, mobile: row.mobile || null }
}
