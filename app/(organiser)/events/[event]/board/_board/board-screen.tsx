'use client'

import Link from 'next/link'
import { useState } from 'react'
import { EmptyState } from '@/app/_ui/empty-state'
import { EVERYTHING, filterRows } from '@/lib/board/filter-rows'
import { useBoard } from '@/lib/board/use-board'
import type { Board } from '@/lib/contracts/board'
import { BoardFilterBar } from './board-filter-bar'
import { BoardGroupList } from './board-group-list'
import { ConnectionLine } from './connection-line'
import { NeedsColumn } from './needs-column'

interface BoardScreenProps {
  readonly eventId: string
  readonly first: Board
  /** Whether who looks may open the list of holds. */
  readonly seesHolds?: boolean
}

/** The board: how every entry stands, by run group, and beside it who needs somebody. */
export function BoardScreen({ eventId, first, seesHolds = false }: BoardScreenProps) {
  const { board, connection } = useBoard(eventId, first)
  const [filter, setFilter] = useState(EVERYTHING)
  const rows = filterRows(board.rows, filter)
  if (board.rows.length === 0)
    return (
      <EmptyState title="No entries yet">
        When the organiser has imported the entry list, every car stands here with its verdict, sorted by number inside its run group.
      </EmptyState>
    )
  return (
    <div className="grid gap-x-8 gap-y-6 xl:grid-cols-[minmax(0,1fr)_400px] xl:grid-rows-[auto_1fr]">
      <div className="grid min-w-0 content-start gap-4">
        <div className="flex flex-wrap items-center justify-between gap-x-6">
          <ConnectionLine connection={connection} board={board} />
          <Link href={`/events/${eventId}/wall`} className="target inline-flex items-center text-accent underline underline-offset-4">
            For the big screen
          </Link>
        </div>
        <BoardFilterBar filter={filter} onChange={setFilter} rows={board.rows} shown={rows.length} />
      </div>
      <NeedsColumn
        rows={board.rows}
        holdsPath={seesHolds ? `/events/${eventId}/holds` : null}
        className="xl:sticky xl:top-4 xl:col-start-2 xl:row-span-2 xl:row-start-1 xl:self-start"
      />
      <div className="grid min-w-0 content-start gap-8">
        {board.groups.map((group) => (
          <BoardGroupList key={group.id} group={group} rows={rows.filter((row) => row.group === group.id)} board={board} />
        ))}
        {rows.length === 0 && <p>No entry fits what you are looking for. Clear the search, or show all verdicts.</p>}
        <p className="max-w-prose border-t pt-4 text-muted">
          A verdict says what was seen today without dismantling, and by these checks alone. It is no certificate and no warranty; what
          could not be seen is listed with the entry. Venue, national rules, road law and makers stand above it.
        </p>
      </div>
    </div>
  )
}
