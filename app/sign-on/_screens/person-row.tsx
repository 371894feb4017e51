import { goTo } from '@/app/_crew/use-location'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import type { DeskPerson } from '@/lib/desk/desk-people'
import { standingShape, standingWords } from './standing-words'
import type { AtDesk } from './use-desk'

/** Cars named in a line at most; an instructor may have a dozen. */
const MOST_CARS = 4

/** One person found: name, cars, and how they stand. */
export function PersonRow({ person }: { readonly person: AtDesk }) {
  return (
    <li className="border-t border-line">
      <button
        type="button"
        onClick={() => goTo(`/sign-on/person/${person.id}`)}
        className="target-outcome grid w-full grid-cols-[minmax(0,1fr)_auto] items-center gap-x-4 py-2 text-left"
      >
        <span className="grid">
          <span className="text-lg font-bold wrap-anywhere">{person.name}</span>
          <span className="text-muted">{seatsInLine(person)}</span>
        </span>
        <span className="flex items-center gap-2">
          <OutcomeShape state={standingShape(person.stands)} className="size-6" />
          {standingWords(person.stands)}
        </span>
      </button>
    </li>
  )
}

/** `47 and 112, instructor · under age`. */
export function seatsInLine({ seats, minor }: DeskPerson): string {
  const numbers = seats.slice(0, MOST_CARS).map(({ entry }) => entry.number)
  const more = seats.length - numbers.length
  const roles = [...new Set(seats.map(({ role }) => role))].filter((role) => role !== 'driver')
  return [
    `${numbers.join(', ')}${more > 0 ? ` and ${more} more` : ''}${roles.length > 0 ? `, ${roles.join(' and ')}` : ''}`,
    ...(minor ? ['under age'] : []),
  ].join(' · ')
}
