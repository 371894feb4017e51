import { COLUMN_NAMES, type EntryColumn } from './entry-columns'
import { foldWord, type EntryRow, type RowProblem, type RowRole } from './entry-row'

/** Most passengers a car on track carries (common practice: the seats a car has besides the driver's, and no more than a saloon's). */
export const MOST_PASSENGERS = 4
const LONGEST_NOTE = 500
const LONGEST_CELL = 80
const NUMBER = /^[A-Z0-9]{1,6}$/
const PLATE = /^[\p{L}\p{N}][\p{L}\p{N} -]{0,11}$/u

const ROLES: Readonly<Record<RowRole, readonly string[]>> = {
  driver: ['', 'driver', 'hirer', 'hire', 'fahrer', 'pilote', 'piloto', 'pilota', 'bestuurder', 'förare', 'kierowca'],
  instructor: ['instructor', 'coach', 'instruktor', 'instruktör', 'instrukteur', 'instructeur', 'instruktør', 'istruttore', 'moniteur'],
  passenger: ['passenger', 'mitfahrer', 'beifahrer', 'passager', 'pasajero', 'passeggero', 'passagier'],
  spare: ['spare', 'spare car', 'reserve', 'ersatz', 'ersatzwagen', 'réserve', 'reserva', 'riserva', 'mulet'],
}

/** Characters that are not seen but turn or hide what is: control, zero width, direction marks. */
const HIDDEN = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f-\u009f\u00ad\u200b-\u200f\u202a-\u202e\u2060-\u2064\u2066-\u2069\ufeff]/g

/** A cell as it is read: hidden characters out, one space between words. Formulas are text like any other. */
export function cleanCell(cell: string): string {
  return cell.normalize('NFC').replace(HIDDEN, '').trim().replace(/\s+/g, ' ')
}

export function hasHidden(cell: string): boolean {
  return cell.search(HIDDEN) >= 0
}

/** An entry number as it stands on the door; null where this is none. */
export function readNumber(text: string): string | null {
  const number = cleanCell(text).toUpperCase()
  return NUMBER.test(number) ? number : null
}

/** Reads one row by the columns given. All its problems at once; with any of them there is no row. */
export function readRow(
  row: number,
  cellOf: (column: EntryColumn) => string,
): { readonly entry: EntryRow | null; readonly problems: readonly RowProblem[] } {
  const cells = new Map<EntryColumn, string>()
  const cell = (column: EntryColumn): string => {
    const known = cells.get(column)
    if (known !== undefined) return known
    const clean = cleanCell(cellOf(column))
    cells.set(column, clean)
    return clean
  }
  const problems: RowProblem[] = []
  const refuse = (column: EntryColumn, why: string) =>
    problems.push({ row, column: COLUMN_NAMES[column], value: cell(column).slice(0, 120), why })
  const role = roleOf(cell('role'), cell('group'))
  if (role === null) refuse('role', 'This role is not known. Say driver, instructor, passenger or spare.')
  const name = cell('name') === '' ? `${cell('firstName')} ${cell('surname')}`.trim() : cell('name')
  checkNeeded(role ?? 'driver', name, cell, refuse)
  const number = cell('number').toUpperCase()
  const numbers = role === 'instructor' || role === 'passenger' ? number.split(/[\s,;/+&]+/).filter((one) => one !== '') : [number]
  if (number !== '' && !numbers.every((one) => NUMBER.test(one)))
    refuse('number', 'An entry number is 1 to 6 letters or digits, as it stands on the door.')
  const plate = cell('plate').toUpperCase()
  if (plate !== '' && !PLATE.test(plate)) refuse('plate', 'A plate is up to 12 letters, digits, spaces or hyphens.')
  const email = cell('email').toLowerCase()
  if (email !== '' && !/^[^\s@"<>]+@[^\s@"<>]+\.[^\s@"<>]+$/.test(email))
    refuse('email', 'This is not an e-mail address; leave the cell empty if there is none.')
  const passengers = cell('passengerSeats')
  if (!/^\d{0,3}$/.test(passengers))
    refuse('passengerSeats', `Passengers is a number from 0 to ${MOST_PASSENGERS}, in figures, or empty for none.`)
  else if (Number(passengers) > MOST_PASSENGERS)
    refuse('passengerSeats', `A car takes 0 to ${MOST_PASSENGERS} passengers on track. Put the right number.`)
  for (const column of ['name', 'firstName', 'surname', 'make', 'model', 'colour', 'group', 'mobile', 'secondDriver', 'team'] as const)
    if (cell(column).length > LONGEST_CELL)
      refuse(column, `This is longer than ${LONGEST_CELL} characters; two cells may have run together.`)
  if (cell('note').length > LONGEST_NOTE)
    refuse('note', `A note is at most ${LONGEST_NOTE} characters; this one has ${cell('note').length}. Shorten it.`)
  if (problems.length > 0 || role === null) return { entry: null, problems }
  const entry: EntryRow = {
    row,
    role,
    number,
    numbers,
    name,
    email,
    mobile: cell('mobile'),
    model: `${cell('make')} ${cell('model')}`.trim(),
    colour: cell('colour').toLowerCase(),
    plate,
    group: cell('group'),
    passengerSeats: Number(passengers || '0'),
    secondDriver: cell('secondDriver'),
    team: cell('team'),
    note: cell('note'),
  }
  return { entry, problems }
}

/** A car needs all it is told by; who only sits in one needs a name; a spare car may have no driver yet. */
function checkNeeded(
  role: RowRole,
  name: string,
  cell: (column: EntryColumn) => string,
  refuse: (column: EntryColumn, why: string) => unknown,
): void {
  const isCar = role === 'driver' || role === 'spare'
  if (name === '' && role !== 'spare') refuse('surname', 'The name is missing.')
  if (!isCar) return
  for (const column of ['number', 'model', 'plate', 'group'] as const)
    if (cell(column) === '' && !(column === 'group' && role === 'spare')) refuse(column, `The ${COLUMN_NAMES[column]} is missing.`)
}

/** By the role column; a run group that is called spare says so too. Null: a word nobody here knows. */
function roleOf(said: string, group: string): RowRole | null {
  const word = foldWord(said)
  if (word === '' && ROLES.spare.includes(foldWord(group))) return 'spare'
  for (const role of Object.keys(ROLES) as RowRole[]) if (ROLES[role].includes(word)) return role
  return null
}
