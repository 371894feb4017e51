import 'server-only'
import { and, asc, eq, inArray } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { account, audit, type event, person, runGroup } from '@/db/schema'
import type { LogEntry } from '@/lib/inspection/log-entry'
import { isKnown, type KnownRecord } from '@/lib/inspection/record'
import type { ReadDay } from '../day-reading'
import { EDIT_WORDS, type EditField } from '../entry-changes'
import type { EntryEvent, EntryView } from '../entry-view'
import { entryValues } from './entry-values'

/** The audit's word for an edit in the office. */
export const EDITED = 'entry-edited'

/** An entry for its page, by the reading of the log that is handed in, without contacts for who may not see them; null where this event has none of that id. */
export function readEntry(
  readDay: ReadDay,
  database: Db,
  own: typeof event.$inferSelect,
  entryId: string,
  now: number,
  seesContacts: boolean,
): EntryView | null {
  const reading = readDay(database, own.id, now)
  const held = reading === null ? null : entryValues(database, own.id, entryId, reading)
  if (reading === null || held === null) return null
  const groups = database
    .select({ id: runGroup.id, name: runGroup.name })
    .from(runGroup)
    .where(eq(runGroup.eventId, own.id))
    .orderBy(asc(runGroup.order))
    .all()
  const people = database
    .select({ id: person.id, name: person.name })
    .from(person)
    .where(eq(person.eventId, own.id))
    .orderBy(asc(person.name))
    .all()
  const book = reading.bookOf(own.checklistHash, own.limitsHash)
  const facts = (book?.checklist.facts ?? []).filter(({ subject }) => subject === 'car')
  return {
    id: entryId,
    eventId: own.id,
    version: held.row.version,
    hasRecords: held.hasRecords,
    values: seesContacts ? held.values : { ...held.values, people: held.values.people.map((one) => ({ ...one, email: '', mobile: '' })) },
    seesContacts,
    groups,
    facts: facts.map(({ name, label, values }) => ({ name, label, values })),
    history: historyOf(database, own.id, entryId, held.records, {
      people: new Map(people.map(({ id, name }) => [id, name])),
      groups: new Map(groups.map(({ id, name }) => [id, name])),
    }),
    others: people,
  }
}

interface Names {
  readonly people: ReadonlyMap<string, string>
  readonly groups: ReadonlyMap<string, string>
}

/** An edit or an import that touched an entry. */
interface EntryTouch {
  readonly at: number
  readonly who: string
  readonly fields: readonly string[]
  /** Of the row after it; null for an import. */
  readonly version: number | null
  readonly recorded: boolean
}

/** Edits and imports that touched an entry, oldest first; those after a version, where one is given. */
export function editsOf(database: Db, eventId: string, entryId: string): readonly EntryTouch[] {
  return database
    .select({ at: audit.at, detail: audit.detail, action: audit.action, who: account.name })
    .from(audit)
    .leftJoin(account, eq(account.id, audit.accountId))
    .where(and(eq(audit.eventId, eventId), inArray(audit.action, [EDITED, 'entries-imported'])))
    .orderBy(asc(audit.at), asc(audit.id))
    .all()
    .flatMap(({ at, detail, action, who }): EntryTouch[] => {
      const by = who ?? 'somebody of the office'
      if (action === EDITED)
        return detail.entry === entryId
          ? [{ at, who: by, fields: detail.fields as string[], version: detail.version as number, recorded: detail.recorded === true }]
          : []
      return (detail.entries as string[] | undefined)?.includes(entryId) === true
        ? [{ at, who: by, fields: ['list'], version: null, recorded: false }]
        : []
    })
}

function historyOf(database: Db, eventId: string, entryId: string, records: readonly LogEntry[], names: Names): readonly EntryEvent[] {
  const edits = editsOf(database, eventId, entryId).flatMap(({ at, who, fields, recorded }): EntryEvent[] => {
    // What the log says itself is not said twice.
    const left = recorded ? fields.filter((field) => ['colour', 'note', 'passengerSeats', 'contacts', 'list'].includes(field)) : fields
    return left.length === 0 ? [] : [{ at, who, words: editWords(left), isRecord: false }]
  })
  const told = records.flatMap(({ record, disposition }): EntryEvent[] => {
    const words = isKnown(record) ? recordWords(record, names) : `A record of a newer version of Lockwire (${record.kind})`
    if (words === null) return []
    const who = names.people.get(record.actor) ?? 'somebody of the crew'
    return [
      {
        at: record.at,
        who,
        words: disposition.state === 'quarantined' ? `${words} (set aside: ${disposition.code})` : words,
        isRecord: true,
      },
    ]
  })
  // Of what has one time the later line comes first.
  return [...edits, ...told].reverse().sort((a, b) => b.at - a.at)
}

export function editWords(fields: readonly string[]): string {
  if (fields.includes('list')) return 'Changed by an imported list'
  return `Changed ${fields.map((field) => EDIT_WORDS[field as EditField]).join(', ')}`
}

/** What changed about the entry or whether it may run; single findings stand on the walk and in the report. */
function recordWords(record: KnownRecord, names: Names): string | null {
  switch (record.kind) {
    case 'entry-changed':
      return changeWords(record.change, names)
    case 'presented':
      return `Presented, depth ${record.depth}`
    case 'pass':
      return 'Pass issued'
    case 'void':
      return `Pass declared void: ${record.reason}`
    case 'hold':
      return `Held: ${record.reason.replaceAll('-', ' ')}`
    case 'lifted':
      return `Hold lifted: ${record.why}`
    case 'dispensation':
      return `Dispensation: ${record.reason}`
    case 'recall':
      return 'Recall set'
    default:
      return null
  }
}

function changeWords(change: Extract<KnownRecord, { kind: 'entry-changed' }>['change'], { people, groups }: Names): string {
  const named = (ids: readonly string[]) => ids.map((id) => people.get(id) ?? 'somebody').join(', ')
  switch (change.what) {
    case 'withdrawn':
      return 'Withdrawn'
    case 'returned':
      return 'Returned'
    case 'facts':
      return 'Car facts changed'
    case 'number':
      return `Number is now ${change.number}`
    case 'plate':
      return `Plate now ends in ${change.plateTail}`
    case 'group':
      return `Runs with ${groups.get(change.group) ?? 'another group'} now`
    case 'people':
      return [
        change.added.length > 0 ? `In: ${named(change.added)}` : '',
        change.removed.length > 0 ? `Out: ${named(change.removed)}` : '',
        change.added.length + change.removed.length === 0 ? 'Roles in the car changed' : '',
      ]
        .filter((part) => part !== '')
        .join('. ')
  }
}
