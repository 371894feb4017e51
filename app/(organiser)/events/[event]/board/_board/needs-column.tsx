import { classNames } from '@/app/_ui/class-names'
import { NumberPlate } from '@/app/_ui/number-plate'
import { OutcomeShape, type OutcomeState } from '@/app/_ui/outcome-shape'
import { type BoardRow, NEED_KINDS } from '@/lib/contracts/board'

/** Who needs somebody, and for what; the most pressing on top. */
export function NeedsColumn({ rows, className }: { readonly rows: readonly BoardRow[]; readonly className?: string }) {
  const needing = rows.filter(({ needs }) => needs.length > 0).toSorted((a, b) => pressing(a) - pressing(b))
  return (
    <aside aria-labelledby="needs" className={classNames('border-2 p-4', className)}>
      <h2 id="needs" className="text-2xl">
        {needing.length === 0 ? 'Nobody needs somebody' : `Needs somebody: ${needing.length}`}
      </h2>
      {needing.length === 0 ? (
        <p className="mt-2 text-muted">Held and failed entries, disagreements and passes that no longer count come here with the reason.</p>
      ) : (
        <ul className="mt-2 xl:max-h-[calc(100dvh-120px)] xl:overflow-y-auto" tabIndex={0} aria-label="Entries that need somebody">
          {needing.map((row) => (
            <li key={row.id} className="grid grid-cols-[76px_minmax(0,1fr)] gap-x-3 border-t py-2">
              <NumberPlate number={row.number} size="row" />
              <ul>
                {row.needs.map(({ kind, words }) => (
                  <li key={`${kind} ${words}`} className="flex gap-2">
                    <OutcomeShape state={SHAPES[kind]} className="mt-0.5 size-5" />
                    {words}
                  </li>
                ))}
              </ul>
            </li>
          ))}
        </ul>
      )}
    </aside>
  )
}

/** What asks for a person has the shape that says so. */
const SHAPES: Readonly<Record<BoardRow['needs'][number]['kind'], OutcomeState>> = {
  held: 'held',
  'not-passed': 'fail',
  disagreement: 'ask',
  'set-aside': 'ask',
  'two-passes': 'ask',
  'could-not-see': 'ask',
  'pass-dead': 'ask',
  'no-pass': 'ask',
  person: 'ask',
}

function pressing({ needs }: BoardRow): number {
  return Math.min(...needs.map(({ kind }) => NEED_KINDS.indexOf(kind)))
}
