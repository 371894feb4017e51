'use client'

import { Button } from '@/app/_ui/button'
import type { HoldRow } from '@/lib/checklist/hold-table'
import type { DayEntry } from '@/lib/sync/client/day-client'
import { useDay } from './day-context'

interface WhoIsHeldProps {
  readonly row: HoldRow
  readonly entry: DayEntry
  readonly busy: boolean
  readonly onPick: (people: readonly string[]) => void
  readonly onBack: () => void
}

/** Whom of those named for the car a hold touches. Holding one person stops no car, and nobody else. */
export function WhoIsHeld({ row, entry, busy, onPick, onBack }: WhoIsHeldProps) {
  const names = new Map(
    useDay()
      .snapshot()
      ?.people.map(({ id, name }) => [id, name]),
  )
  const people = entry.people.map(({ person }) => person)
  return (
    <fieldset className="grid gap-3">
      <legend className="mb-2 text-xl font-bold">
        {row.words}: {row.who}?
      </legend>
      {people.length === 0 && <p>Nobody is named for this car, so nobody can be held. Whoever is aboard is HOLD: send them to sign-on.</p>}
      {row.car !== null && <p>The car is held in any case.</p>}
      {people.map((person) => (
        <Button key={person} size="large" look="secondary" isBusy={busy} onClick={() => onPick([person])}>
          {names.get(person) ?? 'Somebody without a name'}
        </Button>
      ))}
      {people.length > 1 && (
        <Button size="large" look="secondary" isBusy={busy} onClick={() => onPick(people)}>
          Not known: all of them
        </Button>
      )}
      <Button look="quiet" onClick={onBack}>
        Another reason
      </Button>
    </fieldset>
  )
}
