'use client'

import { useDay } from '@/app/_crew/day-context'
import { goTo } from '@/app/_crew/use-location'
import { Button } from '@/app/_ui/button'
import { Notice } from '@/app/_ui/notice'
import type { DayEntry } from '@/lib/sync/client/day-client'
import { PlaceScreen } from './place-screen'
import { SubjectWalk } from './subject-walk'
import { useWalk, type WalkSubject } from './use-walk'

interface CarScreenProps {
  readonly entry: DayEntry
  /** What the address says below `/bay/car/<entry>`: nothing, a place, or `person/<id>` and a place. */
  readonly rest: readonly string[]
}

/** One car: its number first, then the two tabs of its walk, the car and the kit of each who sits in it. */
export function CarScreen({ entry, rest }: CarScreenProps) {
  const day = useDay()
  const base = `/bay/car/${entry.id}`
  const person = rest[0] === 'person' ? (rest[1] ?? null) : null
  const place = (person === null ? rest[0] : rest[2]) ?? null
  const names = new Map(day.snapshot()?.people.map(({ id, name }) => [id, name]))
  return (
    <div className="flex grow flex-col">
      <CarHeader entry={entry} isCompact={place !== null} />
      <nav aria-label="Car and people" className="flex gap-2 overflow-x-auto border-b border-line px-4">
        <Tab label="Car" isHere={person === null} to={base} />
        {entry.people.map(({ person: id, role }) => (
          <Tab
            key={id}
            label={`Helmet & kit: ${names.get(id) ?? 'unnamed'}${role === 'driver' ? '' : ` (${role})`}`}
            isHere={person === id}
            to={`${base}/person/${id}`}
          />
        ))}
      </nav>
      {entry.note !== '' && person === null && place === null && (
        <p className="border-l-4 border-accent px-4 py-2">Said on the entry: {entry.note}</p>
      )}
      {person === null ? (
        <WalkOrPlace key={entry.id} subject={{ car: entry.id }} base={base} place={place} told={entry.facts} />
      ) : (
        <WalkOrPlace
          key={person}
          subject={{ person }}
          base={`${base}/person/${person}`}
          place={place}
          told={toldOfPerson(day.state(`car:${entry.id}`).presentedHeads[0]?.record.facts.roof)}
        />
      )}
      <div className="px-4 pb-6">
        <Button look="quiet" onClick={() => goTo('/bay')}>
          Another car
        </Button>
      </div>
    </div>
  )
}

/** Which car this is. At a place of the walk it makes room for what is asked there; the number stays the largest thing. */
function CarHeader({ entry, isCompact }: { readonly entry: DayEntry; readonly isCompact: boolean }) {
  return (
    <header className={`flex items-end gap-4 border-b border-line px-4 ${isCompact ? 'py-2' : 'py-3'}`}>
      <h1 className={`figures ${isCompact ? 'text-5xl' : 'text-7xl'}`}>{entry.number}</h1>
      {isCompact ? (
        <p className="min-w-0 truncate">
          {entry.plate} · {entry.colour} {entry.model}
        </p>
      ) : (
        <div>
          <p className="text-lg font-bold">{entry.model}</p>
          <p>
            {entry.colour} · {entry.plate}
          </p>
          <p>{entry.groupName}</p>
        </div>
      )}
    </header>
  )
}

/** An open car asks more of a helmet: what the car's walk said is offered, not decided. */
function toldOfPerson(roof: unknown): Readonly<Record<string, boolean>> {
  return roof === 'open' ? { openCar: true } : roof === 'closed' ? { openCar: false } : {}
}

function Tab({ label, isHere, to }: { readonly label: string; readonly isHere: boolean; readonly to: string }) {
  return (
    <button
      type="button"
      aria-current={isHere ? 'page' : undefined}
      onClick={() => goTo(to)}
      className="target shrink-0 border-b-4 border-transparent px-2 py-2 aria-[current=page]:border-accent aria-[current=page]:font-bold"
    >
      {label}
    </button>
  )
}

interface WalkOrPlaceProps {
  readonly subject: WalkSubject
  readonly base: string
  readonly place: string | null
  readonly told: Readonly<Record<string, string | number | boolean | null>>
}

function WalkOrPlace({ subject, base, place, told }: WalkOrPlaceProps) {
  const walk = useWalk(subject)
  if (place === null) return <SubjectWalk walk={walk} base={base} told={told} />
  const here = walk.plan.find((one) => one.place.id === place)
  if (here) return <PlaceScreen key={place} walk={walk} here={here} base={base} />
  return (
    <Notice
      happened="Nothing is asked at this place for this car."
      todo="Go back to its places."
      actions={<Button onClick={() => goTo(base)}>All places</Button>}
      className="m-4"
    />
  )
}
