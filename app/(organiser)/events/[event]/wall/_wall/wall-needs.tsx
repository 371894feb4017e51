import { NumberPlate } from '@/app/_ui/number-plate'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import type { BoardRow } from '@/lib/contracts/board'
import { byPressing, NEED_SHAPES } from '../../board/_board/need-shapes'

/** As many as stand under one another on a big screen; the board has the rest. */
const SHOWN = 16

/** Who needs somebody, most pressing first, one line each. */
export function WallNeeds({ rows }: { readonly rows: readonly BoardRow[] }) {
  const needing = byPressing(rows)
  return (
    <aside aria-labelledby="wall-needs" className="self-start border-2 p-4">
      <h2 id="wall-needs" className="text-2xl">
        {needing.length === 0 ? 'Nobody needs somebody' : `Needs somebody: ${needing.length}`}
      </h2>
      <ul className="mt-1">
        {needing.slice(0, SHOWN).map((row) => (
          <li key={row.id} className="grid grid-cols-[72px_minmax(0,1fr)] items-baseline gap-x-3 border-t py-1">
            <NumberPlate number={row.number} size="row" />
            {row.needs.slice(0, 1).map(({ kind, words }) => (
              <p key={kind} className="flex gap-2">
                <OutcomeShape state={NEED_SHAPES[kind]} className="mt-0.5 size-5" />
                <span className="line-clamp-2">{words}</span>
              </p>
            ))}
          </li>
        ))}
      </ul>
      {needing.length > SHOWN && <p className="border-t pt-2">and {needing.length - SHOWN} more on the board</p>}
    </aside>
  )
}
