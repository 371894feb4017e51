import Papa from 'papaparse'

/** One line of a list that is not empty; `row` counts from 1 as a spreadsheet shows it. */
export interface ListLine {
  readonly row: number
  readonly cells: readonly string[]
}

export interface SplitList {
  readonly separator: string
  readonly lines: readonly ListLine[]
  /** Row in which a quotation mark is opened and never closed; null where all are. */
  readonly openQuote: number | null
}

const SEPARATORS = [';', ',', '\t', '|'] as const
/** Lines by which the separator is found. */
const LOOKED_AT = 40

/** Takes a list apart into cells. The separator is the one under which most lines have equally many cells; a spreadsheet's `sep=;` line says it outright. */
export function splitList(text: string): SplitList {
  // One row added in another program ends otherwise than those above it, and would run into its neighbour.
  const even = text.replace(/\r\n?/g, '\n')
  const said = /^\s*"?sep=(.)"?\s*\n/i.exec(even)?.[1]
  const separator = said ?? findSeparator(even)
  const parsed = Papa.parse<string[]>(even, { delimiter: separator })
  const open = parsed.errors.find((error) => error.type === 'Quotes')
  return {
    separator,
    openQuote: open === undefined ? null : (open.row ?? 0) + 1,
    // Empty rows are left out only once each row knows its place: a problem must name the row that a spreadsheet shows.
    lines: parsed.data
      .map((cells, index) => ({ row: index + 1, cells }))
      .filter(({ row, cells }) => cells.some((cell) => cell.trim() !== '') && !(said !== undefined && row === 1)),
  }
}

function findSeparator(text: string): string {
  let best = { separator: ',', score: 0 }
  for (const separator of SEPARATORS) {
    const rows = Papa.parse<string[]>(text, { delimiter: separator, preview: LOOKED_AT }).data
    const counts = new Map<number, number>()
    for (const cells of rows) if (cells.length > 1) counts.set(cells.length, (counts.get(cells.length) ?? 0) + 1)
    for (const [cells, times] of counts) {
      // More cells decide only between separators that fit as many lines.
      const score = times + Math.min(cells, 99) / 100
      if (score > best.score) best = { separator, score }
    }
  }
  return best.separator
}
