import 'server-only'
import { and, eq, inArray, ne, sql } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { car, entry, entryPerson, event, person, runGroup } from '@/db/schema'
import { transaction } from '@/db/transaction'
import { type editEntry as contract, type EntryEdit } from '@/lib/contracts/entry-edit'
import { can } from '@/lib/permissions/policy'
import type { AccountActor, Command } from '@/lib/platform/command'
import { newId } from '@/lib/platform/ids'
import { announce } from '@/lib/platform/live'
import { ownEvent } from '@/lib/platform/own-event'
import { revokeLinksOfOldAddress } from '@/lib/platform/make-entry-link'
import { isRefusal, refuse, type Refusal } from '@/lib/platform/refusal'
import { writeAudit } from '@/lib/platform/write-audit'
import { rolesAt } from '@/lib/platform/roles-at'
import type { AppendServerRecords } from '@/lib/sync/server/append-server-records'
import type { ReadDay } from '../day-reading'
import { changedFields, editProblems, recordedChanges, type EditField, type SeatedPerson } from '../entry-changes'
import { plateKey } from '../entry-row'
import { EDITED, editsOf, editWords } from '../queries/see-entry'
import { entryValues, type EntryValues } from '../queries/entry-values'

/**
 * Changes an entry. Of two people who edit one entry the second is refused and told who changed what. Once the entry has a record, number, plate, group, people,
 * facts, withdrawn and returned go into the day's log, so that a pass which does not know them dies (rule F7); rows and records are kept together or not at all.
 */
export function editEntry(append: AppendServerRecords, readDay: ReadDay): Command<typeof contract> {
  return ({ params, body }, actor, { database, now }) => {
    const own = ownEvent(database, actor, params.event)
    if (!own) return refuse('missing')
    const result = transaction(database, (tx) => {
      const reading = readDay(tx, own.id, now)
      const held = reading === null ? null : entryValues(tx, own.id, params.entry, reading)
      if (held === null) return refuse('missing')
      if (held.row.version !== body.version) return stale(tx, own.id, held, body.version, own.timeZone)
      const edit = withOwnContacts(body.edit, held.values, can(rolesAt(tx, actor, own.id), 'contacts:see'))
      const fields = changedFields(held.values, edit)
      if (fields.length === 0) return { version: held.row.version, records: 0, fields: [] }
      const issues = problemsOf(tx, own.id, held, edit)
      if (issues.length > 0) return refuse('invalid', { issues })
      const after = { ...edit, people: edit.people.map((one): SeatedPerson => ({ ...one, person: one.person ?? newId() })) }
      const records = held.hasRecords ? recordAll(append, tx, own.id, held, fields, after, actor, now) : 0
      if (isRefusal(records)) return records
      writeRows(tx, held, fields, after, now)
      const detail = { entry: held.row.id, version: held.row.version + 1, fields, recorded: records > 0 }
      writeAudit(tx, { clubId: own.clubId, eventId: own.id, at: now, accountId: actor.accountId, action: EDITED, detail })
      return { version: held.row.version + 1, records, fields: [...fields] }
    })
    if (!isRefusal(result) && result.fields.length > 0) announce(own.id)
    return result
  }
}

/** Who may not see contacts changes none: what their form left empty is what was there. */
function withOwnContacts(edit: EntryEdit, before: EntryEdit, mayChange: boolean): EntryEdit {
  if (mayChange) return edit
  const known = new Map(before.people.map(({ person: id, email, mobile }) => [id, { email, mobile }]))
  return { ...edit, people: edit.people.map((one) => ({ ...one, ...(known.get(one.person) ?? { email: '', mobile: '' }) })) }
}

function stale(tx: Db, eventId: string, { row }: EntryValues, version: number, timeZone: string): Refusal {
  const since = editsOf(tx, eventId, row.id).filter((edit) => edit.version === null || edit.version > version)
  const clock = new Intl.DateTimeFormat('en-GB', { timeZone, hour: '2-digit', minute: '2-digit' })
  const last = since.at(-1)
  if (last === undefined) return refuse('entry-edited-meanwhile')
  const fields = [...new Set(since.flatMap((edit) => edit.fields))]
  const words = editWords(fields)
  const what = `${last.who} ${words.charAt(0).toLowerCase()}${words.slice(1)} at ${clock.format(last.at)}, while you were editing.`
  return refuse('entry-edited-meanwhile', {
    what,
    issues: fields.map((path) => ({ path, message: `${last.who}, ${clock.format(last.at)}` })),
  })
}

function problemsOf(tx: Db, eventId: string, { row, values }: EntryValues, edit: EntryEdit): { path: string; message: string }[] {
  const taken = tx
    .select({ plate: entry.plate })
    .from(entry)
    .where(and(eq(entry.eventId, eventId), eq(entry.number, edit.number), ne(entry.id, row.id)))
    .get()
  const group = tx
    .select({ id: runGroup.id })
    .from(runGroup)
    .where(and(eq(runGroup.id, edit.group), eq(runGroup.eventId, eventId)))
    .get()
  const known = new Set(values.people.map(({ person: id }) => id))
  const asked = edit.people.flatMap(({ person: id }) => (id === null || known.has(id) ? [] : [id]))
  const there = new Set(
    asked.length === 0
      ? []
      : tx
          .select({ id: person.id })
          .from(person)
          .where(and(eq(person.eventId, eventId), inArray(person.id, asked)))
          .all()
          .map(({ id }) => id),
  )
  return [
    ...(taken ? [{ path: 'edit.number', message: `Number ${edit.number} is taken by the car with plate ${taken.plate}.` }] : []),
    ...(group ? [] : [{ path: 'edit.group', message: 'This run group is not there any more. Choose another.' }]),
    ...edit.people.flatMap(({ person: id }, index) =>
      id === null || known.has(id) || there.has(id)
        ? []
        : [{ path: `edit.people.${index}.name`, message: 'This person is not of this event.' }],
    ),
    ...editProblems(edit),
  ]
}

type After = EntryEdit & { readonly people: readonly SeatedPerson[] }

function recordAll(
  append: AppendServerRecords,
  tx: Db,
  eventId: string,
  { row, values }: EntryValues,
  fields: readonly EditField[],
  after: After,
  actor: AccountActor,
  now: number,
): number | Refusal {
  const drafts = recordedChanges(fields, values, after).map((change) => ({
    kind: 'entry-changed' as const,
    subject: { car: row.id },
    change,
  }))
  if (drafts.length === 0) return 0
  const made = append(tx, eventId, actor, drafts, now)
  return isRefusal(made) ? made : made.length
}

function writeRows(tx: Db, { row, values, hasRecords }: EntryValues, fields: readonly EditField[], after: After, now: number): void {
  writePeople(tx, row, values, after, now)
  tx.update(entry)
    .set({
      carId: fields.some((field) => ['model', 'colour', 'plate'].includes(field)) ? carFor(tx, row, after) : row.carId,
      number: after.number,
      plate: after.plate,
      groupId: after.group,
      passengerSeats: after.passengerSeats,
      note: after.note,
      facts: Object.fromEntries(Object.entries(after.facts).filter(([, value]) => value !== null)),
      // With records it is the log that says whether it is withdrawn: a row could not be ended by a record.
      withdrawn: hasRecords ? row.withdrawn && after.withdrawn : after.withdrawn,
      version: row.version + 1,
    })
    .where(eq(entry.id, row.id))
    .run()
  tx.update(event)
    .set({ snapshotVersion: sql`${event.snapshotVersion} + 1` })
    .where(eq(event.id, row.eventId))
    .run()
}

function writePeople(tx: Db, { id: entryId, clubId, eventId }: EntryValues['row'], before: EntryEdit, after: After, now: number): void {
  const was = new Set(before.people.map(({ person: id }) => id))
  for (const { person: id, name, email, mobile } of after.people) {
    const contacts = { name, email: email || null, mobile: mobile || null }
    if (was.has(id)) {
      revokeLinksOfOldAddress(tx, id, contacts.email, now)
      tx.update(person).set(contacts).where(eq(person.id, id)).run()
    } else
      tx.insert(person)
        .values({ id, clubId, eventId, accountId: null, ...contacts })
        .onConflictDoNothing()
        .run()
  }
  tx.delete(entryPerson).where(eq(entryPerson.entryId, entryId)).run()
  for (const { person: personId, role } of after.people) tx.insert(entryPerson).values({ clubId, entryId, personId, role }).run()
}

/** The car as the edit has it: its own row where no other entry has it, else the club's car that fits, or a new one. Another model is always another car. */
function carFor(tx: Db, row: EntryValues['row'], { plate, model, colour }: EntryEdit): string {
  const { clubId, carId } = row
  const values = { plate: plateKey(plate), model, colour: colour.toLowerCase() }
  const known = tx
    .select({ id: car.id })
    .from(car)
    .where(and(eq(car.clubId, clubId), eq(car.plate, values.plate), eq(car.model, model), eq(car.colour, values.colour)))
    .get()
  if (known) return known.id
  const before = tx.select({ model: car.model }).from(car).where(eq(car.id, carId)).get()
  const elsewhere = tx
    .select({ id: entry.id })
    .from(entry)
    .where(and(eq(entry.carId, carId), ne(entry.id, row.id)))
    .get()
  // A slip of the pen mended: the car keeps its owner, its labels and its history.
  if (before?.model === model && elsewhere === undefined) {
    tx.update(car).set(values).where(eq(car.id, carId)).run()
    return carId
  }
  const id = newId()
  tx.insert(car)
    .values({ id, clubId, ...values })
    .run()
  return id
}
