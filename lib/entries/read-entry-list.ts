import { COLUMN_NAMES, type EntryColumn } from './entry-columns'
import { decodeList, detectEncoding, type ListEncoding } from './detect-encoding'
import { guessColumns, knownHeadings, missingColumns, type ColumnGuess } from './guess-columns'
import type { EntryRow, RowProblem, RowRemark } from './entry-row'
import { hasHidden, readRow } from './read-row'
import { splitList, type ListLine } from './split-list'

/** Rows an import takes at most. */
export const MAX_ROWS = 10_000

/** What the organiser said about a list by hand. */
export interface ListChoices {
  /** Null: found by itself. */
  readonly encoding: ListEncoding | null
  /** Row of the headings as the spreadsheet shows it, 0 for a list without; null: found by itself. */
  readonly headingRow: number | null
  /** What each column is, in order; null: guessed. */
  readonly columns: readonly (EntryColumn | null)[] | null
  /** Cells put right by hand. */
  readonly corrections: readonly { readonly row: number; readonly column: EntryColumn; readonly value: string }[]
  /** Rows left out by hand. */
  readonly leftOut: readonly number[]
}

export const NO_CHOICES: ListChoices = { encoding: null, headingRow: null, columns: null, corrections: [], leftOut: [] }

export interface EntryList {
  readonly encoding: ListEncoding | null
  readonly separator: string
  /** 0 where the list has no headings. */
  readonly headingRow: number
  readonly columns: readonly ColumnGuess[]
  /** What the columns are must be said by hand before anything is imported. */
  readonly columnsNeeded: boolean
  readonly rows: readonly EntryRow[]
  readonly problems: readonly RowProblem[]
  readonly remarks: readonly RowRemark[]
  readonly rowCount: number
}

/**
 * Reads an entry list from the bytes of a file. Every problem is reported at once, each with row, column, value and why; a row with a problem is not among
 * `rows`. What the list does not say outright (a writing, a column, a repeated number) is told as a guess and never acted on as if it were known.
 */
export function readEntryList(bytes: Uint8Array, choices: ListChoices = NO_CHOICES): EntryList {
  const detected = detectEncoding(bytes)
  if (detected.kind === 'not-text')
    return empty(null, `This is ${detected.what}. Save the list as CSV (UTF-8) in your spreadsheet and choose that file.`)
  const encoding = choices.encoding ?? detected.encoding
  const { separator, lines, openQuote } = splitList(decodeList(bytes, encoding))
  if (lines.length === 0) return empty(encoding, 'The file is empty. Choose the entry list as a CSV file with a line of headings.')
  if (openQuote !== null)
    return empty(
      encoding,
      'A quotation mark is opened and never closed, so the cells run into each other. Mend it and choose the file again.',
      openQuote,
    )
  const headingRow = choices.headingRow ?? findHeadingRow(lines)
  const heading = lines.find(({ row }) => row === headingRow)?.cells ?? []
  const body = lines.filter(({ row }) => row > headingRow)
  if (body.length > MAX_ROWS)
    return empty(encoding, `The list has ${body.length} rows; ${MAX_ROWS} is the most. Split it and import the parts.`)
  const guesses = guessColumns(
    heading,
    body.map(({ cells }) => cells),
  )
  const said = choices.columns
  const columns = guesses.map((guess): ColumnGuess =>
    said === null ? guess : { ...guess, column: said[guess.index] ?? null, sure: 'sure' },
  )
  const missing = missingColumns(columns.map(({ column }) => column))
  const columnsNeeded = said === null && (missing.length > 0 || columns.some(({ sure }) => sure === 'likely'))
  const titles = lines
    .filter(({ row }) => row < headingRow)
    .map(({ row, cells }) => ({
      row,
      words: `“${cells
        .filter((cell) => cell.trim() !== '')
        .join(' ')
        .slice(0, 80)}” stands above the headings and was passed over.`,
    }))
  const frame = { encoding, separator, headingRow, columns, columnsNeeded, rowCount: body.length }
  if (missing.length > 0)
    return {
      ...frame,
      rows: [],
      remarks: titles,
      problems: columnsNeeded ? [] : missing.map((column) => missingProblem(headingRow, column)),
    }
  const read = readBody(body, columns, choices)
  return { ...frame, ...read, remarks: [...titles, ...read.remarks] }
}

function empty(encoding: ListEncoding | null, why: string, row = 1): EntryList {
  const problems = [{ row, column: '', value: '', why }]
  return { encoding, separator: '', headingRow: 0, columns: [], columnsNeeded: false, rows: [], problems, remarks: [], rowCount: 0 }
}

function missingProblem(row: number, column: EntryColumn): RowProblem {
  return {
    row: Math.max(row, 1),
    column: COLUMN_NAMES[column],
    value: '',
    why: `No column is the ${COLUMN_NAMES[column]}. Say above which one it is.`,
  }
}

/** Title lines may stand above the headings: the first line with most headings we know, if it has two of them, else the first line there is. */
function findHeadingRow(lines: readonly ListLine[]): number {
  let best = { row: lines[0]?.row ?? 1, known: 1 }
  for (const { row, cells } of lines.slice(0, 20)) {
    const known = knownHeadings(cells)
    if (known > best.known) best = { row, known }
  }
  return best.row
}

function readBody(
  body: readonly ListLine[],
  columns: readonly ColumnGuess[],
  choices: ListChoices,
): Pick<EntryList, 'rows' | 'problems' | 'remarks'> {
  const places = new Map(columns.flatMap(({ column, index }) => (column === null ? [] : [[column, index] as const])))
  const corrected = new Map(choices.corrections.map(({ row, column, value }) => [`${row} ${column}`, value]))
  const leftOut = new Set(choices.leftOut)
  const [rows, problems, remarks]: [EntryRow[], RowProblem[], RowRemark[]] = [[], [], []]
  for (const { row, cells } of body) {
    if (leftOut.has(row)) {
      remarks.push({ row, words: 'Left out, as you said.' })
      continue
    }
    if (isTotal(cells, places)) {
      remarks.push({ row, words: 'A line of totals: no entry, passed over.' })
      continue
    }
    const tooMany = cells.slice(columns.length).filter((cell) => cell.trim() !== '')
    if (tooMany.length > 0) {
      problems.push({
        row,
        column: '',
        value: cells.join(' | ').slice(0, 200),
        why: `This row has ${cells.length} cells where the headings have fewer: a separator too many.`,
      })
      continue
    }
    const cellOf = (column: EntryColumn) => corrected.get(`${row} ${column}`) ?? cells[places.get(column) ?? -1] ?? ''
    if ([...places.values()].some((index) => hasHidden(cells[index] ?? '')))
      remarks.push({ row, words: 'Characters that cannot be seen (direction marks and the like) were taken out.' })
    const read = readRow(row, cellOf)
    problems.push(...read.problems)
    if (read.entry) rows.push(read.entry)
  }
  return { rows, problems, remarks }
}

const TOTALS = /^(grand )?(total|totals|sum|summe|gesamt|totaal|totale|somme|suma|summa|i alt|razem)\b:?/i

/** A last line that adds up: a word for it, and none of what a car is told by. */
function isTotal(cells: readonly string[], places: ReadonlyMap<EntryColumn, number>): boolean {
  const isEmpty = (column: EntryColumn) => (cells[places.get(column) ?? -1] ?? '').trim() === ''
  return cells.some((cell) => TOTALS.test(cell.trim())) && (['plate', 'model', 'group'] as const).every(isEmpty)
}
