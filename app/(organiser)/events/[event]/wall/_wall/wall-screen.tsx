'use client'

import { clockTime, dayWords } from '@/app/_crew/say-when'
import { useMinute } from '@/app/_crew/use-minute'
import { useBoard } from '@/lib/board/use-board'
import type { Board } from '@/lib/contracts/board'
import { WallGroup } from './wall-group'
import { WallNeeds } from './wall-needs'

interface WallScreenProps {
  readonly eventId: string
  readonly title: string
  readonly first: Board
}

/** For the big screen: every number with its mark, by run group, and beside them who needs somebody. Nothing here is pressed. */
export function WallScreen({ eventId, title, first }: WallScreenProps) {
  const { board, connection } = useBoard(eventId, first)
  const now = useMinute()
  const { day, timeZone } = board
  return (
    <div className="grid min-h-dvh content-start gap-4 p-5 xl:grid-cols-[minmax(0,1fr)_380px]">
      <header className="flex flex-wrap items-baseline gap-x-6 border-b-[3px] pb-2 xl:col-span-2">
        <h1 className="text-3xl">{title}</h1>
        <p className="text-xl">{dayWords(day)}</p>
        <p className="ml-auto text-xl" role="status">
          {connection.state === 'lost' ? `No connection: this is from ${clockTime(board.at, timeZone)}` : ''}
        </p>
        <p className="figures text-4xl" suppressHydrationWarning>
          {clockTime(now ?? board.at, timeZone)}
        </p>
      </header>
      <main className="grid min-w-0 content-start gap-4">
        {board.groups.map((group) => (
          <WallGroup key={group.id} group={group} rows={board.rows.filter((row) => row.group === group.id)} board={board} />
        ))}
        {board.rows.length === 0 && <p className="text-xl">No entries yet. They come here as the organiser imports them.</p>}
      </main>
      <WallNeeds rows={board.rows} />
    </div>
  )
}
