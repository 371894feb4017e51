import type { EntryRow, RowProblem } from './entry-row'
import { fullName, plateKey } from './entry-row'

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
  readonly name: string
  readonly email: string
  readonly mobile: string
  /** Somebody has recorded something of it: what changes about it now is a record, not an import. */
  readonly hasRecords: boolean
}

export interface ImportPlan {
  readonly add: readonly EntryRow[]
  readonly change: readonly { readonly entry: ExistingEntry; readonly row: EntryRow; readonly fields: readonly string[] }[]
  readonly unchanged: number
  readonly problems: readonly RowProblem[]
}

const COMPARED = ['model', 'colour', 'group', 'passengerSeats', 'note', 'name', 'email', 'mobile', 'plate'] as const

/**
 * What importing these rows would do to the event. The same list twice changes nothing the second time. An entry is known by its number;
 * a number that comes with another plate, or a plate with another number, is a problem, because nobody can tell which of the two is right.
 */
export function planImport(rows: readonly EntryRow[], existing: readonly ExistingEntry[]): ImportPlan {
  const byNumber = new Map(existing.map((entry) => [entry.number, entry]))
  const byPlate = new Map(existing.map((entry) => [plateKey(entry.plate), entry]))
  const add: EntryRow[] = []
  const change: { entry: ExistingEntry; row: EntryRow; fields: readonly string[] }[] = []
  const problems: RowProblem[] = []
  let unchanged = 0
  for (const row of rows) {
    const entry = byNumber.get(row.number)
    const samePlate = byPlate.get(plateKey(row.plate))
    if (samePlate && samePlate !== entry) {
      problems.push({
        row: row.row,
        column: 'plate',
        value: row.plate,
        why: `This plate is already entered as number ${samePlate.number}. Correct the list, or change that entry first.`,
      })
      continue
    }
    if (!entry) {
      add.push(row)
      continue
    }
    if (plateKey(entry.plate) !== plateKey(row.plate)) {
      problems.push({
        row: row.row,
        column: 'plate',
        value: row.plate,
        why: `Entry ${row.number} is already here with plate ${entry.plate}. Which is right is for you to say: correct the list or that entry.`,
      })
      continue
    }
    const fields = COMPARED.filter((field) => entry[field] !== (field === 'name' ? fullName(row) : row[field]))
    if (fields.length === 0) unchanged += 1
    else if (entry.hasRecords)
      problems.push({
        row: row.row,
        column: fields.join(', '),
        value: row.number,
        why: `Entry ${row.number} has been looked at already, so a list no longer changes it. Leave the row out, or change the entry itself.`,
      })
    else change.push({ entry, row, fields })
  }
  return { add, change, unchanged, problems }
}
