import type { EntryRow } from './entry-row'

export type EntryColumn = Exclude<keyof EntryRow, 'row'>

/** Columns a list must have; without one of them nothing is read. */
export const REQUIRED_COLUMNS: readonly EntryColumn[] = ['number', 'surname', 'model', 'plate', 'group']

/** What organisers write above a column, folded by `foldHeader`. */
const HEADINGS: Readonly<Record<EntryColumn, readonly string[]>> = {
  number: ['entryno', 'entrynumber', 'no', 'number', 'carno', 'carnumber', 'racenumber'],
  firstName: ['firstname', 'forename', 'givenname'],
  surname: ['surname', 'lastname', 'familyname'],
  email: ['email', 'emailaddress', 'mail'],
  mobile: ['mobile', 'tel', 'telephone', 'phone', 'mobileno'],
  model: ['car', 'vehicle', 'vehiclemakemodel', 'makemodel', 'model', 'makeandmodel'],
  colour: ['colour', 'color'],
  plate: ['reg', 'registration', 'plate', 'regno', 'registrationnumber', 'numberplate'],
  group: ['group', 'rungroup', 'session', 'level'],
  passengerSeats: ['passengers', 'pass', 'passenger', 'passengerseats'],
  note: ['notes', 'note', 'comments', 'comment', 'remarks'],
}

/** What a column is called to a person. */
export const COLUMN_NAMES: Readonly<Record<EntryColumn, string>> = {
  number: 'entry number',
  firstName: 'first name',
  surname: 'surname',
  email: 'e-mail',
  mobile: 'mobile',
  model: 'car',
  colour: 'colour',
  plate: 'plate',
  group: 'run group',
  passengerSeats: 'passengers',
  note: 'notes',
}

/** A heading without case, spaces and signs. */
export function foldHeader(heading: string): string {
  return heading
    .normalize('NFKD')
    .toLowerCase()
    .replace(/[^a-z0-9]/g, '')
}

/** Which column each heading is; null where it is none we know. */
export function matchColumns(headings: readonly string[]): readonly (EntryColumn | null)[] {
  return headings.map((heading) => {
    const folded = foldHeader(heading)
    const found = Object.entries(HEADINGS).find(([, names]) => names.includes(folded))
    return found ? (found[0] as EntryColumn) : null
  })
}
