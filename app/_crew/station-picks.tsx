'use client'

import { Choice } from '@/app/_ui/choice'

interface StationPicksProps {
  readonly legend: string
  readonly stations: readonly { readonly id: string; readonly title: string }[]
  readonly picked: readonly string[]
  readonly onPick: (picked: readonly string[]) => void
}

/** Stations to be seen, each a box of its own; nothing is picked beforehand. */
export function StationPicks({ legend, stations, picked, onPick }: StationPicksProps) {
  return (
    <fieldset>
      <legend className="font-bold">{legend}</legend>
      <div className="grid gap-x-6 sm:grid-cols-2">
        {stations.map(({ id, title }) => (
          <Choice
            key={id}
            checked={picked.includes(id)}
            onChange={() => onPick(picked.includes(id) ? picked.filter((one) => one !== id) : [...picked, id])}
          >
            {title}
          </Choice>
        ))}
      </div>
    </fieldset>
  )
}
