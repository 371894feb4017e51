'use client'

import Link from 'next/link'
import { useState } from 'react'
import { buttonClass } from '@/app/_ui/button'
import { EmptyState } from '@/app/_ui/empty-state'
import { TextField } from '@/app/_ui/field'
import { filterRows } from '@/lib/board/filter-rows'
import { type EntrySort, sortRows } from '@/lib/board/sort-rows'
import { useBoard } from '@/lib/board/use-board'
import type { Board } from '@/lib/contracts/board'
import { EntriesTable } from './entries-table'

interface EntriesScreenProps {
  readonly eventId: string
  readonly first: Board
  readonly mayImport: boolean
}

/** Every entry of the event in one table that can be sorted and searched. */
export function EntriesScreen({ eventId, first, mayImport }: EntriesScreenProps) {
  const { board } = useBoard(eventId, first)
  const [text, setText] = useState('')
  const [sort, setSort] = useState<EntrySort>({ column: 'number', descending: false })
  const importLink = mayImport && (
    <Link className={buttonClass('primary')} href={`/events/${eventId}/import`}>
      Import an entry list
    </Link>
  )
  if (board.rows.length === 0)
    return (
      <EmptyState title="No entries yet" actions={importLink}>
        Entries come from the organiser’s list. A dry run shows what would be added before anything is.
      </EmptyState>
    )
  const groupOrder = board.groups.map(({ id }) => id)
  const rows = sortRows(filterRows(board.rows, { text, show: 'all' }), sort, groupOrder)
  return (
    <div className="grid gap-4">
      <search className="max-w-96">
        <TextField
          label="Find"
          type="search"
          placeholder="Number, plate, car or name"
          autoComplete="off"
          spellCheck={false}
          value={text}
          onChange={({ target }) => setText(target.value)}
        />
      </search>
      <EntriesTable rows={rows} groups={board.groups} total={board.rows.length} sort={sort} onSort={setSort} />
      {rows.length === 0 && <p>No entry fits “{text}”. A number is found by its beginning, a plate with or without spaces.</p>}
      <p className="max-w-prose text-muted">
        A verdict says what was seen today without dismantling. It is no certificate and no warranty.
      </p>
    </div>
  )
}
