import { useArrival } from '@/app/_crew/use-arrival'
import type { DayEntry } from '@/lib/sync/client/day-client'

/** Which car this is. At a place of the walk it makes room for what is asked there; the number stays the largest thing. */
export function CarHeader({ entry, isCompact }: { readonly entry: DayEntry; readonly isCompact: boolean }) {
  // At a place it is the check that is arrived at.
  const heading = useArrival<HTMLHeadingElement>(isCompact ? 'place' : entry.id)
  return (
    <header className={`flex items-end gap-4 border-b border-line px-4 ${isCompact ? 'py-2' : 'py-3'}`}>
      <h1 ref={heading} tabIndex={-1} className={`figures outline-none ${isCompact ? 'text-5xl' : 'text-7xl'}`}>
        {entry.number}
      </h1>
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
