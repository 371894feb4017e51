import { VERDICT_SHAPES } from '@/app/_walk/verdict-words'
import { DataTable, Td, Th } from '@/app/_ui/data-table'
import { NumberPlate } from '@/app/_ui/number-plate'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import { ENTRY_COLUMNS, type EntryColumn, type EntrySort } from '@/lib/board/sort-rows'
import type { BoardGroup, BoardRow } from '@/lib/contracts/board'

interface EntriesTableProps {
  readonly rows: readonly BoardRow[]
  readonly groups: readonly BoardGroup[]
  readonly total: number
  readonly sort: EntrySort
  readonly onSort: (sort: EntrySort) => void
}

const HEADS: Readonly<Record<EntryColumn, string>> = {
  number: 'Number',
  plate: 'Plate',
  car: 'Car',
  colour: 'Colour',
  group: 'Run group',
  driver: 'Driver',
  verdict: 'Verdict',
}

/** Pressing a head sorts by it, pressing it again turns the order. */
export function EntriesTable({ rows, groups, total, sort, onSort }: EntriesTableProps) {
  const names = new Map(groups.map(({ id, name }) => [id, name]))
  const caption = rows.length === total ? `${total} entries` : `${rows.length} of ${total} entries`
  return (
    <DataTable caption={caption} className="[&_td]:align-middle [&_th]:align-middle">
      <thead>
        <tr>
          {ENTRY_COLUMNS.map((column) => (
            <SortHead key={column} column={column} sort={sort} onSort={onSort} />
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.id}>
            <Th scope="row">
              <NumberPlate number={row.number} size="row" />
            </Th>
            <Td className="serial whitespace-nowrap">{row.plate}</Td>
            <Td>{row.model}</Td>
            <Td>{row.colour}</Td>
            <Td>{names.get(row.group) ?? 'no group'}</Td>
            <Td>{row.drivers.join(', ')}</Td>
            <Td>
              <span className="flex items-center gap-2 whitespace-nowrap">
                <OutcomeShape state={VERDICT_SHAPES[row.verdict]} className="size-5" />
                {row.verdict}
              </span>
            </Td>
          </tr>
        ))}
      </tbody>
    </DataTable>
  )
}

function SortHead({ column, sort, onSort }: Pick<EntriesTableProps, 'sort' | 'onSort'> & { readonly column: EntryColumn }) {
  const isSorted = sort.column === column
  const direction = sort.descending ? 'descending' : 'ascending'
  return (
    <Th aria-sort={isSorted ? direction : undefined} className="!p-0">
      <button
        type="button"
        className="target flex w-full items-center gap-1.5 px-2 text-left font-bold"
        onClick={() => onSort({ column, descending: isSorted && !sort.descending })}
      >
        {HEADS[column]}
        <svg viewBox="-6 -6 12 12" className="size-3 shrink-0" aria-hidden>
          {isSorted && <path d={sort.descending ? 'M-5-3H5L0 4Z' : 'M-5 3H5L0-4Z'} className="fill-ink" />}
        </svg>
      </button>
    </Th>
  )
}
