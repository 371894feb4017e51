import { memo } from 'react'
import { VERDICT_SHAPES } from '@/app/_walk/verdict-words'
import { NumberPlate } from '@/app/_ui/number-plate'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import { Wire } from '@/app/_ui/wire'
import type { Board, BoardRow } from '@/lib/contracts/board'

interface BoardLineProps {
  readonly row: BoardRow
  readonly stations: Board['stations']
}

const WIDE = '@3xl:grid-cols-[72px_112px_minmax(0,5fr)_minmax(0,4fr)_minmax(72px,auto)_228px]'

/** One entry: a few lines on a phone, one on a wide screen. What it is, then what was seen of it. */
export const BoardLine = memo(function BoardLine({ row, stations }: BoardLineProps) {
  const bolts = stations.map(({ short }, index) => ({ label: short, state: row.wire[index] ?? 'na' }))
  return (
    <li
      data-slot="board-line"
      className={`grid grid-cols-[72px_minmax(0,1fr)_auto] items-center gap-x-3 border-b py-2 @3xl:min-h-12 @3xl:py-1 ${WIDE}`}
    >
      <NumberPlate number={row.number} size="row" className="row-span-3 self-start @3xl:row-span-1 @3xl:self-center" />
      <p className="serial font-bold whitespace-nowrap @3xl:font-normal">{row.plate}</p>
      {/* Two drawings of one wire: the strip has no room on a phone. Whichever is hidden is hidden from everybody. */}
      <div className="justify-self-end @3xl:hidden">
        <Wire scale="mark" bolts={bolts} sentence={row.sentence} />
      </div>
      <p className="col-span-2 min-w-0 truncate @3xl:col-span-1">
        {row.model}, {row.colour}
      </p>
      <p className="hidden min-w-0 truncate @3xl:block">{row.drivers.join(', ')}</p>
      <div className="hidden @3xl:block">
        <Wire scale="strip" bolts={bolts} sentence={row.sentence} />
      </div>
      <p className="col-span-2 flex items-center gap-2 @3xl:col-span-1">
        <OutcomeShape state={VERDICT_SHAPES[row.verdict]} className="size-5" />
        <span>
          {row.verdict}
          {row.open !== null && row.open > 0 && <span className="text-muted">, {row.open} to see</span>}
        </span>
      </p>
    </li>
  )
})
