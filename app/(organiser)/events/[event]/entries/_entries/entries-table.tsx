'use client'

import { useTable } from '@tanstack/react-table'
import Link from 'next/link'
import { type KeyboardEvent, memo, useDeferredValue, useMemo, useState } from 'react'
import { VERDICT_SHAPES } from '@/app/_walk/verdict-words'
import { DataTable, Td, Th } from '@/app/_ui/data-table'
import { NumberPlate } from '@/app/_ui/number-plate'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import type { EntryColumn } from '@/lib/board/sort-rows'
import type { Board } from '@/lib/contracts/board'
import { MISSING_WORDS, type MissingData } from '@/lib/entries/missing-data'
import { EntriesFilter } from './entries-filter'
import { entryColumns, entryFeatures, HEADS, isFound, type EntryLine } from './entry-line'

interface EntriesTableProps {
  readonly eventId: string
  readonly board: Board
  readonly missing: Readonly<Record<string, readonly MissingData[]>>
}

const NONE: readonly MissingData[] = []

/** Pressing a head sorts by it, pressing it again turns the order. Arrow keys go from entry to entry. */
export function EntriesTable({ eventId, board, missing }: EntriesTableProps) {
  const [text, setText] = useState('')
  const looked = useDeferredValue(text)
  const names = useMemo(() => new Map(board.groups.map(({ id, name }) => [id, name])), [board.groups])
  const columns = useMemo(() => entryColumns(board.groups.map(({ id }) => id)), [board.groups])
  const data = useMemo(() => board.rows.map((row): EntryLine => ({ ...row, missing: missing[row.id] ?? NONE })), [board.rows, missing])
  const table = useTable({
    features: entryFeatures,
    columns,
    data,
    getRowId: (line) => line.id,
    initialState: { sorting: [{ id: 'number', desc: false }] },
    state: { globalFilter: looked },
    globalFilterFn: (row, _, wanted: string) => isFound(row.original, wanted),
    // One search over the whole line, not one for each of its cells.
    getColumnCanGlobalFilter: (column) => column.id === 'number',
    enableSortingRemoval: false,
    sortDescFirst: false,
  })
  const rows = table.getRowModel().rows
  const caption = rows.length === data.length ? `${data.length} entries` : `${rows.length} of ${data.length} entries`
  return (
    <>
      <EntriesFilter
        text={text}
        onText={setText}
        groups={board.groups}
        filterOf={(column) => (table.getColumn(column)?.getFilterValue() as string | undefined) ?? ''}
        onFilter={(column, value) => table.getColumn(column)?.setFilterValue(value === '' ? undefined : value)}
      />
      <DataTable caption={caption} className="[&_td]:align-middle [&_th]:align-middle">
        <thead>
          <tr>
            {table.getFlatHeaders().map(({ id, column }) => (
              <SortHead
                key={id}
                label={HEADS[id as EntryColumn | 'missing']}
                sorted={column.getIsSorted()}
                onSort={() => column.toggleSorting()}
              />
            ))}
          </tr>
        </thead>
        <tbody onKeyDown={goByArrow}>
          {rows.map(({ id, original }) => (
            <EntryRow key={id} eventId={eventId} line={original} group={names.get(original.group) ?? 'no group'} />
          ))}
        </tbody>
      </DataTable>
      {rows.length === 0 && (
        <p>
          {text === ''
            ? 'No entry is left by these choices.'
            : `No entry fits “${text}”. A number is found by its beginning, a plate with or without spaces.`}
        </p>
      )}
    </>
  )
}

const EntryRow = memo(function EntryRow({
  eventId,
  line,
  group,
}: {
  readonly eventId: string
  readonly line: EntryLine
  readonly group: string
}) {
  return (
    <tr className="has-[a:focus-visible]:bg-surface">
      <Th scope="row">
        <Link
          href={`/events/${eventId}/entries/${line.id}`}
          prefetch={false}
          className="target inline-flex items-center text-accent"
          aria-label={`Entry ${line.number}`}
        >
          <NumberPlate number={line.number} size="row" />
        </Link>
      </Th>
      <Td className="serial whitespace-nowrap">{line.plate}</Td>
      <Td>{line.model}</Td>
      <Td>{line.colour}</Td>
      <Td>{group}</Td>
      <Td>{line.drivers.join(', ')}</Td>
      <Td>
        <span className="flex items-center gap-2 whitespace-nowrap">
          <OutcomeShape state={VERDICT_SHAPES[line.verdict]} className="size-5" />
          {line.verdict}
        </span>
      </Td>
      <Td className="text-muted">{line.missing.map((one) => MISSING_WORDS[one]).join(', ')}</Td>
    </tr>
  )
})

/** Up and down between the entries, first and last by Home and End. */
function goByArrow(event: KeyboardEvent<HTMLTableSectionElement>): void {
  const links = [...event.currentTarget.querySelectorAll('a')]
  const at = links.indexOf(event.target as HTMLAnchorElement)
  const next = { ArrowDown: at + 1, ArrowUp: at - 1, Home: 0, End: links.length - 1 }[event.key]
  if (at < 0 || next === undefined) return
  event.preventDefault()
  links[next]?.focus()
}

interface SortHeadProps {
  readonly label: string
  readonly sorted: false | 'asc' | 'desc'
  readonly onSort: () => void
}

function SortHead({ label, sorted, onSort }: SortHeadProps) {
  return (
    <Th aria-sort={sorted === false ? undefined : sorted === 'desc' ? 'descending' : 'ascending'} className="!p-0">
      <button type="button" className="target flex w-full items-center gap-1.5 px-2 text-left font-bold" onClick={onSort}>
        {label}
        <svg viewBox="-6 -6 12 12" className="size-3 shrink-0" aria-hidden>
          {sorted !== false && <path d={sorted === 'desc' ? 'M-5-3H5L0 4Z' : 'M-5 3H5L0-4Z'} className="fill-ink" />}
        </svg>
      </button>
    </Th>
  )
}
