import type { Board, BoardGroup, BoardRow } from '@/lib/contracts/board'
import { BoardLine } from './board-line'
import { forecastWords } from './forecast-words'

interface BoardGroupListProps {
  readonly group: BoardGroup
  readonly rows: readonly BoardRow[]
  readonly board: Board
}

/** One run group: how many of it pass, and each of its entries. Nothing where the filter leaves none. */
export function BoardGroupList({ group, rows, board }: BoardGroupListProps) {
  if (rows.length === 0) return null
  const headingId = `group-${group.id}`
  return (
    <section aria-labelledby={headingId} className="@container">
      <div className="flex flex-wrap items-baseline justify-between gap-x-6 border-b-[3px] pb-1">
        <h2 id={headingId} className="text-2xl">
          {group.name}
        </h2>
        <p>
          <span className="font-bold">
            {group.passed} of {group.entries} passed
          </span>
          {forecastWords(group, board.timeZone)}
        </p>
      </div>
      <p className="text-muted">
        Sign-on: {group.banded} of {group.people} banded{group.banded < group.people && `, ${group.people - group.banded} missing`}
      </p>
      <ul>
        {rows.map((row) => (
          <BoardLine key={row.id} row={row} stations={board.stations} />
        ))}
      </ul>
    </section>
  )
}
