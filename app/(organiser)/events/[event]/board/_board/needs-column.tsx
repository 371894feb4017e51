'use client'

import { useState } from 'react'
import Link from 'next/link'
import { Button } from '@/app/_ui/button'
import { classNames } from '@/app/_ui/class-names'
import { HardLink } from '@/app/_ui/hard-link'
import { NumberPlate } from '@/app/_ui/number-plate'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import type { BoardRow } from '@/lib/contracts/board'
import { byPressing, NEED_SHAPES } from './need-shapes'

/** On a phone the groups stand below this list, so it shows only so many until asked for all. */
const FIRST = 5

interface NeedsColumnProps {
  readonly rows: readonly BoardRow[]
  /** The page of the holds; null for who may not open it. */
  readonly holdsPath: string | null
  readonly className?: string
}

/** Who needs somebody, and for what; the most pressing on top. Whatever the board is searched for, all of them stay. */
export function NeedsColumn({ rows, holdsPath, className }: NeedsColumnProps) {
  const [all, setAll] = useState(false)
  const needing = byPressing(rows)
  return (
    <aside aria-labelledby="needs" className={classNames('border-2 p-4', className)}>
      <h2 id="needs" className="text-2xl">
        {needing.length === 0 ? 'Nobody needs somebody' : `Needs somebody: ${needing.length}`}
      </h2>
      {needing.length === 0 ? (
        <p className="mt-2 text-muted">Held and failed entries, disagreements and passes that no longer count come here with the reason.</p>
      ) : (
        <ul className="mt-2 xl:max-h-[calc(100dvh-120px)] xl:overflow-y-auto" tabIndex={0} aria-labelledby="needs">
          {needing.map((row, index) => (
            <li
              key={row.id}
              className={classNames('grid grid-cols-[72px_minmax(0,1fr)] gap-x-3 border-t py-2', !all && index >= FIRST && 'max-xl:hidden')}
            >
              <NumberPlate number={row.number} size="row" />
              <ul>
                {row.needs.map(({ kind, words }) => (
                  <li key={`${kind} ${words}`} className="flex gap-2">
                    <OutcomeShape state={NEED_SHAPES[kind]} className="mt-0.5 size-5" />
                    {words}
                  </li>
                ))}
                <li className="flex flex-wrap gap-x-4">
                  <HardLink href={`/bay/car/${row.id}`} className={LINK}>
                    Open in the bay
                  </HardLink>
                  {holdsPath !== null && row.needs.some(({ kind }) => IN_HOLDS.includes(kind)) && (
                    <Link href={holdsPath} className={LINK}>
                      {row.needs.some(({ kind }) => kind === 'two-passes') ? 'Void one' : 'Holds'}
                    </Link>
                  )}
                </li>
              </ul>
            </li>
          ))}
        </ul>
      )}
      {needing.length > FIRST && (
        <Button look="quiet" className="xl:hidden" onClick={() => setAll(!all)}>
          {all ? `Show the first ${FIRST}` : `Show all ${needing.length}`}
        </Button>
      )}
    </aside>
  )
}

const LINK = 'target inline-flex items-center text-accent underline underline-offset-4'
/** What the page of the holds tells more of, or does something about. */
const IN_HOLDS: readonly string[] = ['held', 'person', 'two-passes']
