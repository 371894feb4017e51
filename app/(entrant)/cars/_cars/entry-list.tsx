import Link from 'next/link'
import { daysInWords } from '@/app/(organiser)/_frame/event-frame'
import { EmptyState } from '@/app/_ui/empty-state'
import { NumberPlate } from '@/app/_ui/number-plate'
import type { MyEntryLine } from '@/lib/entrants/queries/my-garage'

/** The entries one sits in, the newest first; each leads to how it stands. */
export function EntryList({ entries }: { readonly entries: readonly MyEntryLine[] }) {
  if (entries.length === 0)
    return (
      <EmptyState title="No entry yet">
        An entry comes from the organiser’s list. Open the link in their mail, or ask them whether your e-mail address stands in the entry.
      </EmptyState>
    )
  return (
    <section aria-labelledby="entries">
      <h2 id="entries" className="text-xl">
        My entries
      </h2>
      <ul className="mt-2 grid gap-3">
        {entries.map((entry) => (
          <li key={entry.id}>
            <Link href={`/entries/${entry.id}`} className="grid grid-cols-[auto_1fr] items-center gap-x-4 border-2 p-3 active:bg-surface">
              <NumberPlate number={entry.number} size="row" />
              <span>
                <strong className="block">{entry.event}</strong>
                <span className="block">{daysInWords(entry)}</span>
                <span className="block">
                  {entry.model} · {entry.declared ? 'declared' : 'not declared'}
                </span>
              </span>
            </Link>
          </li>
        ))}
      </ul>
    </section>
  )
}
