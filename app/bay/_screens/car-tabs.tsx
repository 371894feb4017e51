import { useDay } from '@/app/_crew/day-context'
import { goTo } from '@/app/_crew/use-location'
import type { DayEntry } from '@/lib/sync/client/day-client'

interface CarTabsProps {
  readonly entry: DayEntry
  readonly base: string
  /** Whose kit or fit is shown; null for the car. */
  readonly person: string | null
  readonly isFit: boolean
  /** Whether this car asks how each driver sits in it. */
  readonly asksFit: boolean
}

/** The car, the helmet and kit of each who sits in it, and where it matters how they sit. Each has an address of its own, so these lead on like links. */
export function CarTabs({ entry, base, person, isFit, asksFit }: CarTabsProps) {
  const names = new Map(
    useDay()
      .snapshot()
      ?.people.map(({ id, name }) => [id, name]),
  )
  return (
    <nav aria-label="Car and people" className="flex gap-2 overflow-x-auto border-b border-line px-4">
      <Tab label="Car" isHere={person === null} to={base} />
      {entry.people.map(({ person: id, role }) => (
        <Tab
          key={id}
          label={`Helmet & kit: ${names.get(id) ?? 'unnamed'}${role === 'driver' ? '' : ` (${role})`}`}
          isHere={person === id && !isFit}
          to={`${base}/person/${id}`}
        />
      ))}
      {asksFit &&
        entry.people.map(({ person: id }) => (
          <Tab key={`fit ${id}`} label={`Fit: ${names.get(id) ?? 'unnamed'}`} isHere={person === id && isFit} to={`${base}/fit/${id}`} />
        ))}
    </nav>
  )
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
