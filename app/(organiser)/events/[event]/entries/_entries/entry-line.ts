import {
  columnFilteringFeature,
  createColumnHelper,
  createFilteredRowModel,
  createSortedRowModel,
  globalFilteringFeature,
  rowSortingFeature,
  tableFeatures,
} from '@tanstack/react-table'
import { compareNumbers } from '@/lib/board/compare-numbers'
import { filterRows } from '@/lib/board/filter-rows'
import { compareRows, ENTRY_COLUMNS, type EntryColumn } from '@/lib/board/sort-rows'
import type { BoardRow } from '@/lib/contracts/board'
import type { MissingData } from '@/lib/entries/missing-data'

/** A row of the entries table: how it stands, and what it lacks. */
export interface EntryLine extends BoardRow {
  readonly missing: readonly MissingData[]
}

export const HEADS: Readonly<Record<EntryColumn | 'missing', string>> = {
  number: 'Number',
  plate: 'Plate',
  car: 'Car',
  colour: 'Colour',
  group: 'Run group',
  driver: 'Drivers',
  verdict: 'Verdict',
  missing: 'Missing',
}

/** Once for all tables: the library compares it by identity. */
export const entryFeatures = tableFeatures({
  rowSortingFeature,
  columnFilteringFeature,
  globalFilteringFeature,
  sortedRowModel: createSortedRowModel(),
  filteredRowModel: createFilteredRowModel(),
})

const helper = createColumnHelper<typeof entryFeatures, EntryLine>()

/** Columns as they sort and filter; equals stay in order of number, whichever way round. */
export function entryColumns(groupOrder: readonly string[]) {
  return helper.columns([
    ...ENTRY_COLUMNS.map((column) => {
      const compare = compareRows(column, groupOrder)
      return helper.accessor((line) => valueOf(line, column), {
        id: column,
        sortFn: (a, b) => compare(a.original, b.original) || compareNumbers(a.original.number, b.original.number),
        filterFn: (row, _, wanted: string) => valueOf(row.original, column) === wanted,
      })
    }),
    helper.accessor((line) => line.missing.length, {
      id: 'missing',
      filterFn: (row, _, wanted: string) =>
        wanted === 'any' ? row.original.missing.length > 0 : row.original.missing.some((one) => one === wanted),
    }),
  ])
}

/** Whether a line is found by what was typed: number from its beginning, plate, car or name by any part. */
export function isFound(line: EntryLine, text: string): boolean {
  return filterRows([line], { text, show: 'all' }).length > 0
}

function valueOf(line: EntryLine, column: EntryColumn): string {
  switch (column) {
    case 'car':
      return line.model
    case 'driver':
      return line.drivers.join(', ')
    default:
      return line[column]
  }
}
