import type { BoardRow } from '@/lib/contracts/board'
import type { Verdict } from '@/lib/inspection/state'

/** What of the board is shown. */
export interface BoardFilter {
  /** A part of a number, plate, car or name; empty for all. */
  readonly text: string
  readonly show: Verdict | 'all' | 'needs-somebody'
}

export const EVERYTHING: BoardFilter = { text: '', show: 'all' }

/** The rows that the filter lets through, in their order. A number is found by its beginning, a plate with or without its spaces. */
export function filterRows(rows: readonly BoardRow[], { text, show }: BoardFilter): readonly BoardRow[] {
  const wanted = fold(text)
  return rows.filter((row) => isShown(row, show) && (wanted === '' || isFound(row, wanted)))
}

function isShown({ verdict, needs }: BoardRow, show: BoardFilter['show']): boolean {
  if (show === 'all') return true
  return show === 'needs-somebody' ? needs.length > 0 : verdict === show
}

function isFound({ number, plate, model, colour, drivers }: BoardRow, wanted: string): boolean {
  const words = [plate, model, colour, ...drivers].map(fold)
  return fold(number).startsWith(wanted) || words.some((word) => word.includes(wanted))
}

/** Without case, marks on letters, spaces and signs. */
function fold(text: string): string {
  return text
    .normalize('NFKD')
    .toLowerCase()
    .replace(/[^\p{L}\p{N}]/gu, '')
}
