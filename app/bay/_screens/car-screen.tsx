'use client'

import { useDay } from '@/app/_crew/day-context'
import { factsPinned } from '@/app/_crew/facts-pinned'
import { goTo } from '@/app/_crew/use-location'
import { Button } from '@/app/_ui/button'
import { applicableChecks } from '@/lib/checklist/applicable-checks'
import type { DayEntry } from '@/lib/sync/client/day-client'
import { useSubjectState } from '@/lib/sync/client/use-day'
import { CarActs } from './car-acts'
import { CarHeader } from './car-header'
import { CarTabs } from './car-tabs'
import { DeclaredAgain } from './declared-again'
import { WalkOrPlace } from '@/app/_walk/walk-or-place'

interface CarScreenProps {
  readonly entry: DayEntry
  /** What the address says below `/bay/car/<entry>`: nothing, a place, or `person/<id>` or `fit/<id>` and a place. */
  readonly rest: readonly string[]
}

/** One car: its number first, then the two tabs of its walk, the car and the kit of each who sits in it. */
export function CarScreen({ entry, rest }: CarScreenProps) {
  const day = useDay()
  const car = useSubjectState(day, `car:${entry.id}`)
  const minorOf = (id: string) => {
    const known = day.snapshot()?.people.find((one) => one.id === id)
    return known ? { minor: known.minor } : {}
  }
  const base = `/bay/car/${entry.id}`
  const isFit = rest[0] === 'fit'
  const person = rest[0] === 'person' || isFit ? (rest[1] ?? null) : null
  const { facts } = factsPinned(day, `car:${entry.id}`, entry.facts)
  const book = day.book()
  // Before the car has been presented nobody knows what it is; then the fit waits, as its pass does.
  const asksFit = book !== null && car.presentedHeads.length > 0 && facts.some((one) => applicableChecks(book, 'fit', one).length > 0)
  const place = (person === null ? rest[0] : rest[2]) ?? null
  return (
    <main className="flex grow flex-col">
      <CarHeader entry={entry} isCompact={place !== null} />
      <CarTabs entry={entry} base={base} person={person} isFit={isFit} asksFit={asksFit} />
      {entry.note !== '' && person === null && place === null && (
        <p className="border-l-4 border-accent px-4 py-2">Said on the entry: {entry.note}</p>
      )}
      {person === null && place === null && <DeclaredAgain entry={entry} />}
      {person === null ? (
        <WalkOrPlace key={entry.id} subject={{ car: entry.id }} base={base} place={place} told={entry.facts} />
      ) : isFit ? (
        <WalkOrPlace
          key={`fit ${person}`}
          subject={{ fit: entry.id, person }}
          base={`${base}/fit/${person}`}
          place={place}
          told={facts.at(-1) ?? {}}
        />
      ) : (
        <WalkOrPlace
          key={person}
          subject={{ person }}
          base={`${base}/person/${person}`}
          place={place}
          told={{ ...toldOfPerson(car.presentedHeads[0]?.record.facts.roof), ...minorOf(person) }}
        />
      )}
      {place === null && (
        <CarActs entry={entry} subject={person === null ? { car: entry.id } : isFit ? { fit: entry.id, person } : { person }} />
      )}
      <div className="px-4 pb-6">
        <Button look="quiet" onClick={() => goTo('/bay')}>
          Another car
        </Button>
      </div>
    </main>
  )
}

/** An open car asks more of a helmet: what the car's walk said is offered, not decided. */
function toldOfPerson(roof: unknown): Readonly<Record<string, boolean>> {
  return roof === 'open' ? { openCar: true } : roof === 'closed' ? { openCar: false } : {}
}
