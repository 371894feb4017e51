import { foldWord, plateKey, type EntryRow, type RowProblem } from './entry-row'
import type { Asking, AskedRow, ListAnswer, ListOption } from './list-question'
import type { PlannedEntry, PlannedPerson } from './planned-entry'
import { readNumber } from './read-row'

/** Who is known to sit in an entry that is here already: a row that says it again is not asked about. */
export interface KnownEntry {
  readonly number: string
  readonly plate: string
  readonly names: readonly string[]
}

interface Work {
  readonly asking: Asking
  readonly groups: ReadonlyMap<string, string | null>
  readonly entries: PlannedEntry[]
  readonly byNumber: Map<string, PlannedEntry>
  readonly byPlate: Map<string, PlannedEntry>
  readonly byRow: ReadonlyMap<number, EntryRow>
  readonly known: readonly KnownEntry[]
  readonly problems: RowProblem[]
}

const LEAVE_OUT: ListOption = { value: 'leave-out', words: 'Leave this row out', asks: null }

/**
 * The cars of a list. A number or plate that stands in an earlier row is asked about, never guessed: one car that two people share, two cars, or a row too many.
 * Notes such as *sharing with car above* are read by nobody but the organiser.
 */
export function resolveCars(
  rows: readonly EntryRow[],
  groups: ReadonlyMap<string, string | null>,
  groupNames: readonly string[],
  known: readonly KnownEntry[],
  asking: Asking,
): { readonly entries: readonly PlannedEntry[]; readonly problems: readonly RowProblem[] } {
  const byRow = new Map(rows.map((row) => [row.row, row]))
  const work: Work = { asking, groups, entries: [], byNumber: new Map(), byPlate: new Map(), byRow, known, problems: [] }
  for (const row of rows) if (row.role === 'driver') takeCar(work, row)
  for (const row of rows) if (row.role === 'spare') takeSpare(work, row, rows, groupNames)
  for (const row of rows) if (row.role === 'instructor' || row.role === 'passenger') takeAboard(work, row)
  return { entries: work.entries, problems: work.problems }
}

function takeCar(work: Work, row: EntryRow): void {
  const sameNumber = work.byNumber.get(row.number)
  const samePlate = work.byPlate.get(plateKey(row.plate))
  const first = samePlate ?? sameNumber
  if (first === undefined) {
    addEntry(work, row, row.number)
    return
  }
  if (isKnownAboard(work, first, row)) {
    addPerson(first, personOf(row))
    return
  }
  const answer = askRepeat(work, row, first, { number: sameNumber !== undefined, plate: samePlate !== undefined })
  if (answer?.value === 'shared') addPerson(first, personOf(row))
  if (answer?.value === 'two-cars') addEntry(work, row, sameNumber === undefined ? row.number : (readNumber(answer.text) ?? row.number))
}

function isKnownAboard({ known }: Work, first: PlannedEntry, row: EntryRow): boolean {
  const here = known.find(({ number, plate }) => number === first.number && plateKey(plate) === plateKey(first.plate))
  const isSameCar = row.number === first.number || plateKey(row.plate) === plateKey(first.plate)
  return here !== undefined && isSameCar && here.names.length > 1 && here.names.some((name) => foldWord(name) === foldWord(row.name))
}

function askRepeat(
  work: Work,
  row: EntryRow,
  first: PlannedEntry,
  same: { readonly number: boolean; readonly plate: boolean },
): ListAnswer | null {
  const what =
    same.number && same.plate ? `number ${row.number} and plate ${row.plate}` : same.number ? `number ${row.number}` : `plate ${row.plate}`
  const earlier = work.byRow.get(first.row)
  const isCopy = earlier !== undefined && isSameRow(earlier, row)
  const twoCars = same.number
    ? { value: 'two-cars', words: 'They are two cars; the second one’s number is', asks: 'Number of the second car' }
    : { value: 'two-cars', words: `They are two cars that carry the same plate (a trade plate)`, asks: null }
  return work.asking.ask(
    {
      id: `row:${row.row}`,
      asks: isCopy
        ? `Row ${row.row} says the same as row ${first.row} in every cell. Is it one row too many?`
        : `Row ${row.row} has ${what}, as row ${first.row} has. What are they?`,
      rows: [...(earlier ? [askedRow(earlier)] : []), askedRow(row)],
      options: [
        ...(isCopy ? [] : [{ value: 'shared', words: 'They share one car: one entry with two drivers', asks: null }]),
        ...(same.number && same.plate && !isCopy ? [] : [twoCars]),
        { ...LEAVE_OUT, words: `Leave row ${row.row} out` },
      ],
      likely: isCopy ? 'leave-out' : null,
    },
    ({ value, text }) => {
      if (value === 'leave-out') return `Row ${row.row} is left out.`
      if (value === 'shared')
        return `${row.name} drives entry ${first.number} too (${first.plate}, ${first.model}, as row ${first.row} says).`
      if (!same.number) return `Number ${row.number} is an entry of its own, with the same plate.`
      const number = readNumber(text)
      if (number === null || work.byNumber.has(number) || isNumberOf(work, number, row)) return null
      return `${row.name} drives an entry of its own, number ${number}.`
    },
  )
}

/** Another row of the list has this number: given away here, that one would be asked about next. */
function isNumberOf({ byRow }: Work, number: string, but: EntryRow): boolean {
  return [...byRow.values()].some((row) => row !== but && row.number === number)
}

function isSameRow(a: EntryRow, b: EntryRow): boolean {
  return JSON.stringify({ ...a, row: 0 }) === JSON.stringify({ ...b, row: 0 })
}

function takeSpare(work: Work, row: EntryRow, rows: readonly EntryRow[], groupNames: readonly string[]): void {
  const first = work.byPlate.get(plateKey(row.plate)) ?? work.byNumber.get(row.number)
  if (first !== undefined) {
    const why = `The spare car has the number or plate of row ${first.row}. It is a car of its own and gets a pass of its own: put the right one, or leave the row out.`
    work.problems.push({ row: row.row, column: 'entry number', value: `${row.number}, ${row.plate}`, why })
    return
  }
  const team = row.team === '' ? [] : rows.filter((one) => one.role === 'driver' && foldWord(one.team) === foldWord(row.team))
  const who = askSpareDrivers(work, row, team)
  if (who?.value === 'leave-out') return
  const group = work.groups.get(foldWord(row.group)) ?? groupNames.find((name) => foldWord(name) === foldWord(row.group))
  const runs = group ?? askSpareGroup(work, row, groupNames)
  if (who === null || runs === null) return
  const people = who.value === 'team' ? team.map(personOf) : who.value === 'own' ? [personOf(row)] : []
  addEntry(work, { ...row, group: runs }, row.number, people)
}

function askSpareDrivers(work: Work, row: EntryRow, team: readonly EntryRow[]): ListAnswer | null {
  const names = [...new Set(team.map(({ name }) => name))]
  return work.asking.ask(
    {
      id: `spare:${row.row}`,
      asks: `Row ${row.row} is a spare car${row.team === '' ? '' : ` of ${row.team}`}. Who may drive it?`,
      rows: [askedRow(row)],
      options: [
        ...(names.length > 0
          ? [
              {
                value: 'team',
                words: `Every driver of ${row.team}: ${names.slice(0, 6).join(', ')}${names.length > 6 ? ` and ${names.length - 6} more` : ''}`,
                asks: null,
              },
            ]
          : []),
        ...(row.name === '' ? [] : [{ value: 'own', words: `Only ${row.name}`, asks: null }]),
        { value: 'nobody', words: 'Nobody yet: drivers are put in on the entry’s page when it is needed', asks: null },
        LEAVE_OUT,
      ],
      likely: null,
    },
    ({ value }) =>
      ({
        team: `${names.length} may drive it.`,
        own: `${row.name} may drive it.`,
        nobody: 'The pit exit answers HOLD for it until it has a driver.',
        'leave-out': `Row ${row.row} is left out.`,
      })[value] ?? null,
  )
}

function askSpareGroup(work: Work, row: EntryRow, groupNames: readonly string[]): string | null {
  const answer = work.asking.ask(
    {
      id: `spare-group:${row.row}`,
      asks: `With which run group does the spare car of row ${row.row} run? It can be changed on the entry’s page.`,
      rows: [askedRow(row)],
      options: groupNames.map((name) => ({ value: `is:${name}`, words: name, asks: null })),
      likely: null,
    },
    ({ value }) => `It runs with ${value.slice(3)}.`,
  )
  return answer === null ? null : answer.value.slice(3)
}

/** An instructor or passenger: into the cars the row names, or asked where. */
function takeAboard(work: Work, row: EntryRow): void {
  const named = row.numbers.length > 0 ? row.numbers : row.plate === '' ? [] : [work.byPlate.get(plateKey(row.plate))?.number ?? row.plate]
  const unknown = named.filter((number) => !work.byNumber.has(number))
  for (const number of unknown) {
    const why = `No car of this list is number ${number}. Name the cars by the numbers they have here, or leave the row out.`
    work.problems.push({ row: row.row, column: 'entry number', value: number, why })
  }
  if (named.length > 0) {
    for (const number of named) addPersonTo(work.byNumber.get(number), row)
    return
  }
  const group = work.groups.get(foldWord(row.group)) ?? null
  const own = group === null ? [] : work.entries.filter((entry) => entry.group === group)
  const answer = work.asking.ask(
    {
      id: `aboard:${row.row}`,
      asks: `Row ${row.row} is ${row.role === 'instructor' ? 'an instructor' : 'a passenger'} without a car. In which cars does ${row.name} sit?`,
      rows: [askedRow(row)],
      options: [
        ...(own.length > 0 ? [{ value: 'group', words: `In every car of ${group ?? ''} (${own.length})`, asks: null }] : []),
        { value: 'all', words: `In every car of the list (${work.entries.length})`, asks: null },
        { value: 'numbers', words: 'In these cars', asks: 'Numbers, with spaces between' },
        LEAVE_OUT,
      ],
      likely: null,
    },
    ({ value, text }) => {
      if (value === 'leave-out') return `Row ${row.row} is left out.`
      if (value === 'group') return `${row.name} is put into ${own.length} cars.`
      if (value === 'all') return `${row.name} is put into ${work.entries.length} cars.`
      const numbers = numbersIn(text)
      return numbers.length > 0 && numbers.every((number) => work.byNumber.has(number))
        ? `${row.name} is put into ${numbers.join(', ')}.`
        : null
    },
  )
  if (answer?.value === 'group') for (const entry of own) addPersonTo(entry, row)
  if (answer?.value === 'all') for (const entry of work.entries) addPersonTo(entry, row)
  if (answer?.value === 'numbers') for (const number of numbersIn(answer.text)) addPersonTo(work.byNumber.get(number), row)
}

function numbersIn(text: string): readonly string[] {
  return text
    .toUpperCase()
    .split(/[\s,;]+/)
    .filter((one) => one !== '')
}

function addPersonTo(entry: PlannedEntry | undefined, row: EntryRow): void {
  if (entry !== undefined && row.role !== 'spare') addPerson(entry, { ...personOf(row), role: row.role })
}

function addEntry(work: Work, row: EntryRow, number: string, people: readonly PlannedPerson[] = [personOf(row)]): void {
  const group = work.groups.get(foldWord(row.group)) ?? row.group
  const note = row.team === '' ? row.note : [`Of ${row.team}`, row.note].filter((part) => part !== '').join('. ')
  const { plate, model, colour, passengerSeats } = row
  const entry: PlannedEntry = { row: row.row, number, plate, model, colour, group, passengerSeats, note, people: [] }
  for (const person of people) addPerson(entry, person)
  if (row.secondDriver !== '') addPerson(entry, { row: row.row, role: 'driver', name: row.secondDriver, email: '', mobile: '' })
  work.entries.push(entry)
  work.byNumber.set(number, entry)
  if (!work.byPlate.has(plateKey(plate))) work.byPlate.set(plateKey(plate), entry)
}

/** Somebody stands in a car once in each role. */
function addPerson(entry: PlannedEntry, person: PlannedPerson): void {
  const isThere = entry.people.some(
    ({ name, role, email }) => role === person.role && foldWord(name) === foldWord(person.name) && email === person.email,
  )
  if (!isThere) entry.people.push(person)
}

function personOf({ row, name, email, mobile }: EntryRow): PlannedPerson {
  return { row, role: 'driver', name, email, mobile }
}

export function askedRow({ row, number, plate, name, model }: EntryRow): AskedRow {
  return { row, number, plate, name, model }
}
