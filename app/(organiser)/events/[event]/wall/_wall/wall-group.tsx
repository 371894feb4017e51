import { memo } from 'react'
import { classNames } from '@/app/_ui/class-names'
import { Wire } from '@/app/_ui/wire'
import type { Board, BoardGroup, BoardRow } from '@/lib/contracts/board'
import { forecastWords } from '../../board/_board/forecast-words'

/** Cars above which the numbers stand a size smaller. */
const CROWDED = 150

interface WallGroupProps {
  readonly group: BoardGroup
  /** In the order of their numbers. */
  readonly rows: readonly BoardRow[]
  readonly board: Board
}

/** A run group on the wall: one line that says how it stands, and each number with its mark. Withdrawn cars are nobody's business here. */
export function WallGroup({ group, rows, board }: WallGroupProps) {
  const running = rows.filter(({ verdict }) => verdict !== 'withdrawn')
  if (running.length === 0) return null
  const headingId = `wall-${group.id}`
  return (
    <section aria-labelledby={headingId}>
      <h2 id={headingId} className="text-2xl">
        {group.name}: {group.passed} of {group.entries} passed{forecastWords(group, board.timeZone)}
      </h2>
      <ul
        className={classNames(
          'mt-1 grid grid-cols-[repeat(auto-fill,minmax(162px,1fr))] gap-x-1 border-t',
          // A full event must stand on one screen; a small one is read from further away.
          board.rows.length > CROWDED ? 'text-2xl' : 'text-3xl',
        )}
      >
        {running.map((row) => (
          <WallCar key={row.id} row={row} stations={board.stations} />
        ))}
      </ul>
    </section>
  )
}

const WallCar = memo(function WallCar({ row, stations }: { readonly row: BoardRow; readonly stations: Board['stations'] }) {
  const bolts = stations.map(({ short }, index) => ({ label: short, state: row.wire[index] ?? 'na' }))
  return (
    <li className="flex items-center gap-1.5 border-b">
      <span className="figures min-w-12">{row.number}</span>
      <Wire scale="mark" bolts={bolts} sentence={`${row.verdict}. ${row.sentence}`} />
    </li>
  )
})
