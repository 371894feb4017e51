import { ENTRY_COLUMNS, foldHeader, HEADINGS, REQUIRED_COLUMNS, type EntryColumn } from './entry-columns'

/** How sure a guess is: `sure` by a heading that means one thing; `likely` is put to the organiser; `unknown` is not used unless they say what it is. */
export type Sureness = 'sure' | 'likely' | 'unknown'

export interface ColumnGuess {
  readonly index: number
  readonly heading: string
  readonly column: EntryColumn | null
  readonly sure: Sureness
  /** First three cells under it that hold something. */
  readonly samples: readonly string[]
}

const BY_HEADING: ReadonlyMap<string, EntryColumn> = new Map(
  ENTRY_COLUMNS.flatMap((column) => HEADINGS[column].split(' ').map((heading) => [heading, column] as const)),
)
/** Part of a heading that still says what it is; shorter parts stand in too many words. */
const SHORTEST_PART = 4
const LONGEST_FIRST = [...BY_HEADING].filter(([heading]) => heading.length >= SHORTEST_PART).sort(([a], [b]) => b.length - a.length)

/** How many cells of a line are headings we know outright: what finds the heading among title lines. */
export function knownHeadings(cells: readonly string[]): number {
  return new Set(cells.map((cell) => BY_HEADING.get(foldHeader(cell))).filter((column) => column !== undefined)).size
}

/** What each column is, by its heading and, where that says nothing, by what stands under it. Two columns for one thing make both unsure. */
export function guessColumns(headings: readonly string[], rows: readonly (readonly string[])[]): readonly ColumnGuess[] {
  // Where there are headings they say how wide the list is: what stands beyond them has run over.
  const width = headings.length > 0 ? headings.length : Math.max(0, ...rows.slice(0, 50).map((row) => row.length))
  const guesses = Array.from({ length: width }, (_, index): ColumnGuess => {
    const heading = (headings[index] ?? '').trim()
    const cells = rows.map((row) => (row[index] ?? '').trim()).filter((cell) => cell !== '')
    return { index, heading, ...guessOne(heading, cells), samples: cells.slice(0, 3).map((cell) => cell.slice(0, 80)) }
  })
  return settleTwice(settleName(guesses))
}

function guessOne(heading: string, cells: readonly string[]): Pick<ColumnGuess, 'column' | 'sure'> {
  const folded = foldHeader(heading)
  const known = BY_HEADING.get(folded)
  if (known !== undefined) return { column: known, sure: 'sure' }
  if (cells.length === 0) return { column: null, sure: 'unknown' }
  const part = LONGEST_FIRST.find(([word]) => folded.includes(word))
  if (part) return { column: part[1], sure: 'likely' }
  const most = (test: RegExp) => cells.filter((cell) => test.test(cell)).length * 10 > cells.length * 6
  if (most(/^[^\s@]+@[^\s@]+\.[^\s@]+$/)) return { column: 'email', sure: 'likely' }
  if (most(/^\+?[\d ()/-]{9,}$/)) return { column: 'mobile', sure: 'likely' }
  return { column: null, sure: 'unknown' }
}

/** Beside a first name, *Name* is the surname (as in German lists); that it is so is put to the organiser. */
function settleName(guesses: readonly ColumnGuess[]): readonly ColumnGuess[] {
  const has = (column: EntryColumn) => guesses.some((guess) => guess.column === column)
  if (!has('firstName') || has('surname')) return guesses
  return guesses.map((guess) => (guess.column === 'name' ? { ...guess, column: 'surname', sure: 'likely' } : guess))
}

function settleTwice(guesses: readonly ColumnGuess[]): readonly ColumnGuess[] {
  return guesses.map((guess) => {
    const same = guesses.filter(({ column }) => column !== null && column === guess.column)
    if (same.length < 2) return guess
    const isFirst = (same.find(({ sure }) => sure === 'sure') ?? same[0]) === guess
    return { ...guess, column: isFirst ? guess.column : null, sure: 'likely' }
  })
}

/** Columns without which nothing can be read. A whole name stands for surname. */
export function missingColumns(columns: readonly (EntryColumn | null)[]): readonly EntryColumn[] {
  return REQUIRED_COLUMNS.filter((column) => !columns.includes(column) && !(column === 'surname' && columns.includes('name')))
}
