import { memo } from 'react'
import { VERDICT_SHAPES } from '@/app/bay/_screens/verdict-words'
import { NumberPlate } from '@/app/_ui/number-plate'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import { Wire } from '@/app/_ui/wire'
import type { Board, BoardRow } from '@/lib/contracts/board'

interface BoardLineProps {
  readonly row: BoardRow
  readonly stations: Board['stations']
}

/** One entry: two lines on a phone, one on a wide screen. What it is beside what was seen of it. */
export const BoardLine = memo(function BoardLine({ row, stations }: BoardLineProps) {
  return (
    <li
      data-slot="board-line"
      className="grid grid-cols-[76px_minmax(0,1fr)] items-center gap-x-3 border-b py-1.5 @3xl:grid-cols-[76px_minmax(0,5fr)_minmax(0,4fr)_minmax(104px,auto)_200px]"
    >
      <NumberPlate number={row.number} size="row" className="row-span-2 self-start pt-1 @3xl:row-span-1 @3xl:self-center @3xl:pt-0" />
      <p className="min-w-0 truncate">
        {row.model}, {row.colour} <span className="serial whitespace-nowrap text-muted">{row.plate}</span>
      </p>
      <p className="hidden min-w-0 truncate @3xl:block">{row.drivers.join(', ')}</p>
      <div className="hidden @3xl:block">
        <Wire scale="strip" bolts={boltsOf(row, stations)} sentence={row.sentence} />
      </div>
      <p className="flex items-center gap-2">
        <OutcomeShape state={VERDICT_SHAPES[row.verdict]} className="size-5" />
        <span>
          {row.verdict}
          {row.open !== null && row.open > 0 && <span className="text-muted">, {row.open} to see</span>}
        </span>
      </p>
    </li>
  )
})

function boltsOf({ wire }: BoardRow, stations: Board['stations']) {
  return stations.map(({ short }, index) => ({ label: short, state: wire[index] ?? 'na' }))
}
