import type { OutcomeState } from '@/app/_ui/outcome-shape'
import { compareNumbers } from '@/lib/board/compare-numbers'
import { type BoardRow, NEED_KINDS } from '@/lib/contracts/board'

/** What asks for a person has the shape that says so. */
export const NEED_SHAPES: Readonly<Record<BoardRow['needs'][number]['kind'], OutcomeState>> = {
  held: 'held',
  'not-passed': 'fail',
  disagreement: 'ask',
  'set-aside': 'ask',
  'two-passes': 'ask',
  'could-not-see': 'ask',
  'pass-dead': 'ask',
  'no-pass': 'ask',
  person: 'ask',
}

/** Rows that need somebody, the most pressing first, then by number. */
export function byPressing(rows: readonly BoardRow[]): readonly BoardRow[] {
  return rows.filter(({ needs }) => needs.length > 0).toSorted((a, b) => pressing(a) - pressing(b) || compareNumbers(a.number, b.number))
}

function pressing({ needs }: BoardRow): number {
  return Math.min(...needs.map(({ kind }) => NEED_KINDS.indexOf(kind)))
}
