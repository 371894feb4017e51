'use client'

import { useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { TextField } from '@/app/_ui/field'
import { NumberPlate } from '@/app/_ui/number-plate'
import { Sheet } from '@/app/_ui/sheet'
import { useDayEntries } from '@/lib/sync/client/use-day'
import { describeCars } from '@/lib/walk/describe-cars'

/** Cars shown at most: with more it is quicker to say another word. */
const MOST_SHOWN = 12

interface FindSheetProps {
  readonly onPick: (entry: string) => void
  readonly onClose: () => void
}

/** Finds the car to hold by its plate, or by what was seen of it, as the radio tells it: “orange Oriel with a passenger”. */
export function FindSheet({ onPick, onClose }: FindSheetProps) {
  const day = useDay()
  const entries = useDayEntries(day)
  const [said, setSaid] = useState('')
  const names = new Map(day.snapshot()?.people.map(({ id, name }) => [id, name]) ?? [])
  const found = describeCars(entries, said, names)
  return (
    <Sheet isOpen title="Which car?" onClose={onClose}>
      <div className="grid gap-3">
        <TextField
          label="Plate, colour, model, driver; “passenger” where one rides along"
          value={said}
          autoComplete="off"
          autoFocus
          onChange={({ target }) => setSaid(target.value)}
        />
        <p role="status">
          {found.length === 0
            ? said.trim() === ''
              ? 'Say what you see.'
              : 'No car fits all of that. Say less.'
            : `${found.length} ${found.length === 1 ? 'car fits' : 'cars fit'}`}
        </p>
        <ul>
          {found.slice(0, MOST_SHOWN).map((entry) => (
            <li key={entry.id} className="border-t border-line">
              <button type="button" className="target flex w-full items-center gap-4 py-2 text-left" onClick={() => onPick(entry.id)}>
                <NumberPlate number={entry.number} size="row" />
                <span>
                  <span className="font-bold">
                    {entry.colour} {entry.model}
                  </span>
                  <span className="block">
                    {entry.plate} · {entry.groupName}
                    {entry.people.some(({ role }) => role !== 'driver') && ' · with a passenger'}
                  </span>
                </span>
              </button>
            </li>
          ))}
        </ul>
        {found.length > MOST_SHOWN && <p>And {found.length - MOST_SHOWN} more: say another word.</p>}
      </div>
    </Sheet>
  )
}
