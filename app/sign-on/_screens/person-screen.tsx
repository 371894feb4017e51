'use client'

import { useDay } from '@/app/_crew/day-context'
import { useArrival } from '@/app/_crew/use-arrival'
import { goTo } from '@/app/_crew/use-location'
import { Button } from '@/app/_ui/button'
import { WalkOrPlace } from '@/app/_walk/walk-or-place'
import type { DeskPerson } from '@/lib/desk/desk-people'
import type { DayClient } from '@/lib/sync/client/day-client'

interface PersonScreenProps {
  readonly person: DeskPerson
  /** A place of their walk; null for it from above. */
  readonly place: string | null
}

/** One person: who they are and what they sit in, then their papers and kit as the bay's walk asks them, and the band. */
export function PersonScreen({ person, place }: PersonScreenProps) {
  const day = useDay()
  const heading = useArrival<HTMLHeadingElement>(place === null ? person.id : 'place')
  return (
    <main className="flex grow flex-col">
      <header className={`border-b border-line px-4 ${place === null ? 'py-3' : 'py-2'}`}>
        <h1 ref={heading} tabIndex={-1} className={`outline-none wrap-anywhere ${place === null ? 'text-3xl' : 'text-xl'}`}>
          {person.name}
        </h1>
        {place === null && <Seats person={person} />}
      </header>
      <WalkOrPlace
        key={person.id}
        subject={{ person: person.id }}
        base={`/sign-on/person/${person.id}`}
        place={place}
        told={toldOf(person, day)}
      />
      <div className="px-4 pb-6">
        <Button look="quiet" onClick={() => goTo('/sign-on')}>
          Another person
        </Button>
      </div>
    </main>
  )
}

/** Every car they sit in: the desk says it aloud, and hears that one is missing. */
function Seats({ person }: { readonly person: DeskPerson }) {
  return (
    <>
      {person.minor && <p className="font-bold">Under age</p>}
      <ul className="flex flex-wrap gap-x-6">
        {person.seats.map(({ entry, role }) => (
          <li key={`${entry.id} ${role}`} className="flex items-baseline gap-2">
            <span className="figures text-3xl">{entry.number}</span>
            <span>
              {entry.model}
              {role === 'driver' ? '' : ` (${role})`} · {entry.groupName}
            </span>
          </li>
        ))}
      </ul>
    </>
  )
}

/** What is offered as known, never decided: under age by the list, an open car by the walk or the entry of each car they sit in. */
function toldOf({ id, minor, seats }: DeskPerson, day: DayClient): Readonly<Record<string, boolean>> {
  const roofs = seats.map(({ entry }) => day.state(`car:${entry.id}`).presentedHeads[0]?.record.facts.roof ?? entry.facts.roof)
  const open = roofs.includes('open')
    ? { openCar: true }
    : roofs.length > 0 && roofs.every((roof) => roof === 'closed')
      ? { openCar: false }
      : {}
  return { ...open, minor: day.snapshot()?.people.find((one) => one.id === id)?.minor ?? minor }
}
