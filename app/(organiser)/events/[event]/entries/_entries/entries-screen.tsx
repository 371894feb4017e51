'use client'

import Link from 'next/link'
import { buttonClass } from '@/app/_ui/button'
import { EmptyState } from '@/app/_ui/empty-state'
import { useBoard } from '@/lib/board/use-board'
import type { Board } from '@/lib/contracts/board'
import type { MissingData } from '@/lib/entries/missing-data'
import { EntriesTable } from './entries-table'

interface EntriesScreenProps {
  readonly eventId: string
  readonly first: Board
  readonly missing: Readonly<Record<string, readonly MissingData[]>>
  readonly mayImport: boolean
}

/** Every entry of the event in one table that can be sorted, filtered and searched; each opens its own page. */
export function EntriesScreen({ eventId, first, missing, mayImport }: EntriesScreenProps) {
  const { board } = useBoard(eventId, first)
  if (board.rows.length === 0)
    return (
      <EmptyState
        title="No entries yet"
        actions={
          mayImport && (
            <Link className={buttonClass('primary')} href={`/events/${eventId}/import`}>
              Import an entry list
            </Link>
          )
        }
      >
        Entries come from the organiser’s list. A dry run shows what would be added before anything is.
      </EmptyState>
    )
  return (
    <div className="grid gap-4">
      <EntriesTable eventId={eventId} board={board} missing={missing} />
      <p className="max-w-prose text-muted">
        A verdict says what was seen today without dismantling. It is no certificate and no warranty.
      </p>
    </div>
  )
}
