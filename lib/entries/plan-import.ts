import { foldWord, plateKey, type RowProblem } from './entry-row'
import type { Asking, ListAnswer } from './list-question'
import type { PlannedEntry } from './planned-entry'
import type { OnePerson, People } from './resolve-people'

/** Somebody who sits in an entry the event already has. */
export interface ExistingPerson {
  readonly id: string
  readonly name: string
  readonly email: string
  readonly mobile: string
  readonly role: 'driver' | 'passenger' | 'instructor'
}

/** An entry the event already has, as far as an import compares it. */
export interface ExistingEntry {
  readonly id: string
  readonly number: string
  readonly plate: string
  readonly model: string
  readonly colour: string
  readonly group: string
  readonly passengerSeats: number
  readonly note: string
  /** The order they came in. */
  readonly people: readonly ExistingPerson[]
  /** Somebody has recorded something of it: what changes about it now is a record, not an import. */
  readonly hasRecords: boolean
}

/** What happens to the people of a changed entry. Who is in it and not in the list stays: the desk may have put them there. */
export interface PeopleChange {
  readonly contacts: readonly { readonly id: string; readonly name: string; readonly email: string; readonly mobile: string }[]
  readonly add: readonly { readonly role: ExistingPerson['role']; readonly who: OnePerson }[]
  /** Drivers whom another driver of the list takes the place of. */
  readonly remove: readonly string[]
}

export interface EntryChange {
  readonly entry: ExistingEntry
  readonly planned: PlannedEntry
  readonly fields: readonly string[]
  readonly people: PeopleChange
}

export interface ImportPlan {
  readonly add: readonly PlannedEntry[]
  readonly change: readonly EntryChange[]
  readonly unchanged: number
  /** Entries of the event that the list does not name; they stay as they are. */
  readonly notInList: number
  readonly problems: readonly RowProblem[]
}

const COMPARED = ['number', 'plate', 'model', 'colour', 'group', 'passengerSeats', 'note'] as const

/**
 * What importing these entries would do to the event. The same list twice changes nothing the second time. An entry is known by its number;
 * a number that comes with another plate, or a plate with another number, is asked about, because nobody can tell which of the two is right.
 */
export function planImport(
  planned: readonly PlannedEntry[],
  people: People,
  existing: readonly ExistingEntry[],
  asking: Asking,
): ImportPlan {
  const byNumber = new Map(existing.map((entry) => [entry.number, entry]))
  const byPlate = new Map(existing.map((entry) => [plateKey(entry.plate), entry]))
  const [add, change, problems]: [PlannedEntry[], EntryChange[], RowProblem[]] = [[], [], []]
  const named = new Set<string>()
  let unchanged = 0
  for (const one of planned) {
    const sameNumber = byNumber.get(one.number)
    const samePlate = byPlate.get(plateKey(one.plate))
    const entry =
      sameNumber !== undefined && plateKey(sameNumber.plate) === plateKey(one.plate)
        ? sameNumber
        : askWhich(one, sameNumber, samePlate, asking)
    if (entry === 'add') add.push(one)
    if (entry === 'add' || entry === 'leave-out') continue
    if (entry === null) continue
    named.add(entry.id)
    const compared = compare(entry, one, people)
    if (compared.fields.length === 0) unchanged += 1
    else if (entry.hasRecords) problems.push(lookedAt(one, compared.fields))
    else change.push(compared)
  }
  return { add, change, unchanged, notInList: existing.length - named.size, problems }
}

function lookedAt({ row, number }: PlannedEntry, fields: readonly string[]): RowProblem {
  const why = `Entry ${number} has been looked at already, so a list no longer changes it. Leave the row out, or change the entry on its own page.`
  return { row, column: fields.join(', '), value: number, why }
}

/** Which entry a planned one is where number and plate do not agree; null while that is open. */
function askWhich(
  one: PlannedEntry,
  sameNumber: ExistingEntry | undefined,
  samePlate: ExistingEntry | undefined,
  asking: Asking,
): ExistingEntry | 'add' | 'leave-out' | null {
  if (sameNumber === undefined && samePlate === undefined) return 'add'
  const rows = [{ row: one.row, number: one.number, plate: one.plate, name: one.people[0]?.name ?? '', model: one.model }]
  const leaveOut = { value: 'leave-out', words: `Leave row ${one.row} out: the entry stays as it is`, asks: null }
  const ask = (
    asks: string,
    options: readonly { readonly value: string; readonly words: string; readonly does: string }[],
  ): ListAnswer | null =>
    asking.ask(
      {
        id: `entry:${one.row}`,
        asks,
        rows,
        options: [...options.map(({ value, words }) => ({ value, words, asks: null })), leaveOut],
        likely: null,
      },
      ({ value }) => options.find((option) => option.value === value)?.does ?? `Row ${one.row} is left out.`,
    )
  if (sameNumber !== undefined) {
    const other = samePlate === undefined ? '' : ` That plate is entered as number ${samePlate.number}.`
    const answer = ask(
      `Entry ${one.number} is already here with plate ${sameNumber.plate}; the list says ${one.plate}.${other} Which is right?`,
      samePlate === undefined
        ? [{ value: 'list', words: `The list: the plate is ${one.plate}`, does: `Entry ${one.number} gets plate ${one.plate}.` }]
        : [],
    )
    return answer === null ? null : answer.value === 'list' ? sameNumber : 'leave-out'
  }
  if (samePlate === undefined) return 'add'
  const answer = ask(`Plate ${one.plate} is already entered as number ${samePlate.number}; the list says ${one.number}. What is it?`, [
    {
      value: 'renumber',
      words: `The same car, whose number is now ${one.number}`,
      does: `Entry ${samePlate.number} becomes number ${one.number}.`,
    },
    {
      value: 'another',
      words: 'Another car that carries the same plate (a trade plate)',
      does: `Number ${one.number} is an entry of its own.`,
    },
  ])
  if (answer === null) return null
  return answer.value === 'renumber' ? samePlate : answer.value === 'another' ? 'add' : 'leave-out'
}

function compare(entry: ExistingEntry, planned: PlannedEntry, people: People): EntryChange {
  const fields: string[] = COMPARED.filter((field) => entry[field] !== planned[field])
  const matched = new Set<string>()
  const contacts: PeopleChange['contacts'][number][] = []
  const add: PeopleChange['add'][number][] = []
  for (const seat of planned.people) {
    const who = people.of(seat)
    const known = entry.people.find(
      ({ name, email, role }) => role === seat.role && (foldWord(name) === foldWord(who.name) || (email !== '' && email === who.email)),
    )
    if (known === undefined) {
      add.push({ role: seat.role, who })
      continue
    }
    matched.add(known.id)
    // A list that leaves a cell empty does not say that there is none.
    const now = { id: known.id, name: who.name, email: who.email || known.email, mobile: who.mobile || known.mobile }
    const differs = (['name', 'email', 'mobile'] as const).filter((field) => now[field] !== known[field])
    if (differs.length > 0) contacts.push(now)
    fields.push(...differs.filter((field) => !fields.includes(field)))
  }
  const newDrivers = add.filter(({ role }) => role === 'driver').length
  const unnamed = entry.people.filter(({ id, role }) => role === 'driver' && !matched.has(id))
  const remove = unnamed.slice(0, newDrivers).map(({ id }) => id)
  if (add.length > 0) fields.push('people')
  return { entry, planned, fields, people: { contacts, add, remove } }
}
