import Link from 'next/link'
import { VERDICT_SHAPES } from '@/app/_walk/verdict-words'
import { NumberPlate } from '@/app/_ui/number-plate'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import { Wire } from '@/app/_ui/wire'
import type { Board, BoardRow } from '@/lib/contracts/board'
import type { EntryView } from '@/lib/entries/entry-view'
import { EntryFacts } from './entry-facts'
import { EntryForm } from './entry-form'
import { EntryHistory } from './entry-history'

interface EntryScreenProps {
  readonly view: EntryView
  readonly row: BoardRow
  readonly stations: Board['stations']
  readonly timeZone: string
  readonly mayEdit: boolean
}

/** One entry as the office sees it: how it stands, who sits in it, what became of it, and its form. */
export function EntryScreen({ view, row, stations, timeZone, mayEdit }: EntryScreenProps) {
  const bolts = stations.map(({ short }, index) => ({ label: short, state: row.wire[index] ?? 'na' }))
  return (
    <div className="grid gap-8">
      <Link href={`/events/${view.eventId}/entries`} className="target inline-flex items-center text-accent underline underline-offset-4">
        All entries
      </Link>
      <section aria-label={`Entry ${row.number}`} className="grid gap-4">
        <div className="flex flex-wrap items-end gap-x-6 gap-y-2">
          <h2>
            <span className="sr-only">Entry </span>
            <NumberPlate number={row.number} />
          </h2>
          <div className="pb-1">
            <p className="serial text-xl font-bold">{row.plate}</p>
            <p>
              {row.model}
              {row.colour === '' ? '' : `, ${row.colour}`}
            </p>
          </div>
          <p className="flex items-center gap-2 pb-1 text-xl font-bold">
            <OutcomeShape state={VERDICT_SHAPES[row.verdict]} className="size-7" />
            {row.verdict}
          </p>
        </div>
        <div className="overflow-x-auto" tabIndex={0} role="region" aria-label="The wire">
          <Wire scale="full" bolts={bolts} sentence={row.sentence} />
        </div>
        {row.needs.length > 0 && (
          <ul className="grid gap-1 border-l-8 border-line pl-3">
            {row.needs.map(({ words }) => (
              <li key={words} className="font-bold">
                {words}
              </li>
            ))}
          </ul>
        )}
      </section>
      <div className="grid items-start gap-8 lg:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]">
        {mayEdit ? <EntryForm view={view} /> : <EntryFacts view={view} />}
        <EntryHistory history={view.history} timeZone={timeZone} />
      </div>
    </div>
  )
}
