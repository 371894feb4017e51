'use client'

import { useState } from 'react'
import { Button } from '@/app/_ui/button'
import type { DayEntry } from '@/lib/sync/client/day-client'

interface CarPicksProps {
  readonly entries: readonly DayEntry[]
  readonly picked: readonly string[]
  readonly onPicked: (picked: readonly string[]) => void
}

/** Cars offered at most. */
const MOST_SHOWN = 5

/** The cars somebody sits in, by number or plate; an instructor may have a dozen. */
export function CarPicks({ entries, picked, onPicked }: CarPicksProps) {
  const [query, setQuery] = useState('')
  const wanted = fold(query)
  const found = entries
    .filter(({ id, number, plate }) => !picked.includes(id) && (fold(number).startsWith(wanted) || fold(plate).includes(wanted)))
    .sort((a, b) => Number(fold(b.number) === wanted) - Number(fold(a.number) === wanted) || a.number.length - b.number.length)
  const own = entries.filter(({ id }) => picked.includes(id))
  return (
    <section className="grid gap-2" aria-label="Cars">
      <label className="grid gap-1">
        <span className="font-bold">Car number or plate</span>
        <input
          className="figures target-outcome w-full rounded-sm border border-line bg-ground px-4 text-4xl uppercase"
          value={query}
          autoComplete="off"
          spellCheck={false}
          onChange={(event) => setQuery(event.target.value)}
          // Enter takes the first car; it does not send what is not finished.
          onKeyDown={(event) => {
            if (event.key !== 'Enter' || wanted === '') return
            event.preventDefault()
            take(found[0]?.id)
          }}
        />
      </label>
      {wanted !== '' && (
        <ul className="grid gap-2">
          {found.slice(0, MOST_SHOWN).map((entry) => (
            <li key={entry.id}>
              <Button look="secondary" className="w-full justify-start" onClick={() => take(entry.id)}>
                <span className="figures text-2xl">{entry.number}</span> {entry.plate} · {entry.colour} {entry.model}
              </Button>
            </li>
          ))}
          {found.length === 0 && <li>No car of this number or plate to put them into.</li>}
        </ul>
      )}
      {own.length > 0 && (
        <ul className="flex flex-wrap gap-2" aria-label="Cars chosen">
          {own.map((entry) => (
            <li key={entry.id}>
              <Button look="secondary" onClick={() => onPicked(picked.filter((id) => id !== entry.id))}>
                <span className="figures text-2xl">{entry.number}</span> {entry.model}: take away
              </Button>
            </li>
          ))}
        </ul>
      )}
    </section>
  )

  function take(id: string | undefined) {
    if (id === undefined) return
    onPicked([...picked, id])
    setQuery('')
  }
}

function fold(text: string): string {
  return text.toUpperCase().replace(/[^\p{L}\p{N}]/gu, '')
}
