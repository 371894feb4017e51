import Papa from 'papaparse'
import { COLUMN_NAMES, matchColumns, REQUIRED_COLUMNS, type EntryColumn } from './entry-columns'
import type { EntryRow, RowProblem } from './entry-row'
import { plateKey } from './entry-row'

/** Rows an import takes at most. */
export const MAX_ROWS = 10_000

export interface EntryList {
  readonly rows: readonly EntryRow[]
  readonly problems: readonly RowProblem[]
  /** Headings that are not used. */
  readonly unusedHeadings: readonly string[]
  readonly rowCount: number
}

/**
 * Reads an entry list from the text of a CSV file (separator found by itself). Every problem is reported at once, each with row, column, value and why;
 * a row with a problem is not among `rows`. Numbers and plates that stand twice are problems: whether that is a shared car is asked, never guessed.
 */
export function readEntryList(text: string): EntryList {
  // One row added in another program ends otherwise than those above it, and would run into its neighbour.
  const parsed = Papa.parse<string[]>(text.replace(/^\uFEFF/, '').replace(/\r\n?/g, '\n'))
  // Empty rows are left out only once each row knows its place: a problem must name the row that a spreadsheet shows.
  const [heading, ...lines] = parsed.data
    .map((cells, index) => ({ row: index + 1, cells }))
    .filter(({ cells }) => cells.some((cell) => cell.trim() !== ''))
  const headings = heading?.cells
  if (!headings)
    return empty([
      { row: 1, column: '', value: '', why: 'The file is empty. Choose the entry list as a CSV file with a line of headings.' },
    ])
  const columns = matchColumns(headings)
  const headerProblems = findHeaderProblems(headings, columns)
  if (headerProblems.length > 0) return empty(headerProblems)
  if (lines.length > MAX_ROWS)
    return empty([
      {
        row: 1,
        column: '',
        value: String(lines.length),
        why: `The list has ${lines.length} rows; ${MAX_ROWS} is the most. Split it and import the parts.`,
      },
    ])
  const quoteProblems = parsed.errors
    .filter((error) => error.type === 'Quotes')
    .map((error) => ({
      row: (error.row ?? 0) + 1,
      column: '',
      value: '',
      why: 'A quotation mark is opened and never closed, so the cells run into each other. Mend it and choose the file again.',
    }))
  if (quoteProblems.length > 0) return empty(quoteProblems)

  const rows: EntryRow[] = []
  const problems: RowProblem[] = []
  lines.forEach(({ row, cells }) => {
    if (cells.length > headings.length && cells.slice(headings.length).some((cell) => cell.trim() !== '')) {
      problems.push({
        row,
        column: '',
        value: cells.slice(headings.length).join(' | '),
        why: `This row has ${cells.length} cells under ${headings.length} headings: a separator too many.`,
      })
      return
    }
    const read = readRow(row, columns, cells)
    problems.push(...read.problems)
    if (read.entry) rows.push(read.entry)
  })
  const repeated = findRepeats(rows)
  const bad = new Set(repeated.map((problem) => problem.row))
  return {
    rows: rows.filter((row) => !bad.has(row.row)),
    problems: [...problems, ...repeated].sort((a, b) => a.row - b.row),
    unusedHeadings: headings.filter((_, index) => columns[index] === null && headings[index]?.trim() !== ''),
    rowCount: lines.length,
  }
}

function empty(problems: readonly RowProblem[]): EntryList {
  return { rows: [], problems, unusedHeadings: [], rowCount: 0 }
}

function findHeaderProblems(headings: readonly string[], columns: readonly (EntryColumn | null)[]): RowProblem[] {
  const missing = REQUIRED_COLUMNS.filter((column) => !columns.includes(column)).map((column) => ({
    row: 1,
    column: COLUMN_NAMES[column],
    value: headings.join(' | ').slice(0, 200),
    why: `No column for ${COLUMN_NAMES[column]} was found among the headings. Name one so, and choose the file again.`,
  }))
  const twice = columns.flatMap((column, index) =>
    column !== null && columns.indexOf(column) !== index
      ? [
          {
            row: 1,
            column: COLUMN_NAMES[column],
            value: headings[index] ?? '',
            why: `Two columns are headed as ${COLUMN_NAMES[column]}. Leave one of them.`,
          },
        ]
      : [],
  )
  return [...missing, ...twice]
}

function readRow(
  row: number,
  columns: readonly (EntryColumn | null)[],
  cells: readonly string[],
): { entry: EntryRow | null; problems: RowProblem[] } {
  const cell = (column: EntryColumn) => (cells[columns.indexOf(column)] ?? '').normalize('NFC').trim().replace(/\s+/g, ' ')
  const problems: RowProblem[] = []
  const refuse = (column: EntryColumn, why: string) => problems.push({ row, column: COLUMN_NAMES[column], value: cell(column), why })

  for (const column of REQUIRED_COLUMNS) if (cell(column) === '') refuse(column, `The ${COLUMN_NAMES[column]} is missing.`)
  const number = cell('number').toUpperCase()
  if (number !== '' && !/^[A-Z0-9]{1,6}$/.test(number))
    refuse('number', 'An entry number is 1 to 6 letters or digits, as it stands on the door.')
  const plate = cell('plate').toUpperCase()
  if (plate !== '' && !/^[\p{L}\p{N}][\p{L}\p{N} -]{0,11}$/u.test(plate))
    refuse('plate', 'A plate is up to 12 letters, digits, spaces or hyphens.')
  const email = cell('email').toLowerCase()
  if (email !== '' && !/^[^\s@"<>]+@[^\s@"<>]+\.[^\s@"<>]+$/.test(email))
    refuse('email', 'This is not an e-mail address; leave the cell empty if there is none.')
  const passengers = cell('passengerSeats')
  if (!/^[0-9]?$/.test(passengers)) refuse('passengerSeats', 'Passengers is a number from 0 to 9, or empty for none.')
  for (const column of ['firstName', 'surname', 'model', 'colour', 'group', 'mobile'] as const)
    if (cell(column).length > 80) refuse(column, 'This is longer than 80 characters; two cells may have run together.')
  if (cell('note').length > 500) refuse('note', 'A note is at most 500 characters.')
  if (problems.length > 0) return { entry: null, problems }
  return {
    entry: {
      row,
      number,
      firstName: cell('firstName'),
      surname: cell('surname'),
      email,
      mobile: cell('mobile'),
      model: cell('model'),
      colour: cell('colour').toLowerCase(),
      plate,
      group: cell('group'),
      passengerSeats: Number(passengers || '0'),
      note: cell('note'),
    },
    problems,
  }
}

function findRepeats(rows: readonly EntryRow[]): RowProblem[] {
  return [
    ...repeatsOf(
      rows,
      (row) => row.number,
      'number',
      (row, first) => `Entry number ${row.number} stands in row ${first.row} too. One of the two is wrong: a number is one car.`,
    ),
    ...repeatsOf(
      rows,
      (row) => plateKey(row.plate),
      'plate',
      (row, first) =>
        `Plate ${row.plate} stands in row ${first.row} too (entry ${first.number}). If they share the car, leave it one entry and add the second driver to it; if not, correct the plate.`,
    ),
  ]
}

function repeatsOf(
  rows: readonly EntryRow[],
  key: (row: EntryRow) => string,
  column: EntryColumn,
  why: (row: EntryRow, first: EntryRow) => string,
): RowProblem[] {
  const first = new Map<string, EntryRow>()
  return rows.flatMap((row) => {
    const earlier = first.get(key(row))
    if (!earlier) {
      first.set(key(row), row)
      return []
    }
    return [{ row: row.row, column: COLUMN_NAMES[column], value: column === 'number' ? row.number : row.plate, why: why(row, earlier) }]
  })
}
