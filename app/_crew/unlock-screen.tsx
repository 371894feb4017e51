'use client'

import { useState } from 'react'
import { Button } from '@/app/_ui/button'
import { useDayVersion } from '@/lib/sync/client/use-day'
import { useDay } from './day-context'
import { PinForm } from './pin-form'

/** Who holds this device now: six digits that say so. They are for attribution and protect nothing. */
export function UnlockScreen() {
  const day = useDay()
  useDayVersion(day)
  const people = day.people()
  const [chosen, setChosen] = useState<string | null>(people.length === 1 ? (people[0]?.id ?? null) : null)
  const person = people.find(({ id }) => id === chosen) ?? null
  return (
    <main className="grid gap-4 p-4">
      <h1 className="text-xl">Who holds this device?</h1>
      {people.length > 1 && (
        <div className="grid gap-2">
          {people.map((one) => (
            <Button
              key={one.id}
              look={one.id === chosen ? 'primary' : 'secondary'}
              aria-pressed={one.id === chosen}
              onClick={() => setChosen(one.id)}
            >
              {one.name}, {one.roles.join(', ')}
            </Button>
          ))}
        </div>
      )}
      {person && <PinForm key={person.id} person={person} />}
    </main>
  )
}
