import type { BoardRow } from '@/lib/contracts/board'
import { VERDICTS } from '@/lib/inspection/state'
import { compareNumbers } from './compare-numbers'

export const ENTRY_COLUMNS = ['number', 'plate', 'car', 'colour', 'group', 'driver', 'verdict'] as const
export type EntryColumn = (typeof ENTRY_COLUMNS)[number]

/** How two rows stand to each other by a column. Verdicts go from the one that passes to the one that stops. */
export function compareRows(column: EntryColumn, groupOrder: readonly string[]): (a: BoardRow, b: BoardRow) => number {
  const byText = (read: (row: BoardRow) => string) => (a: BoardRow, b: BoardRow) => compareText(read(a), read(b))
  switch (column) {
    case 'number':
      return (a, b) => compareNumbers(a.number, b.number)
    case 'group':
      return (a, b) => groupOrder.indexOf(a.group) - groupOrder.indexOf(b.group)
    case 'verdict':
      return (a, b) => VERDICTS.indexOf(b.verdict) - VERDICTS.indexOf(a.verdict)
    case 'plate':
      return byText((row) => row.plate)
    case 'car':
      return byText((row) => row.model)
    case 'colour':
      return byText((row) => row.colour)
    case 'driver':
      return byText((row) => row.drivers.join(', '))
  }
}

/** Without case and marks; not by locale, so that server and browser give one order. */
function compareText(a: string, b: string): number {
  const [left, right] = [a, b].map((text) => text.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase()) as [string, string]
  return left < right ? -1 : left > right ? 1 : 0
}
