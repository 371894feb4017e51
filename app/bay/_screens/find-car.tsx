'use client'

import { useMemo, useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { HandOver } from '@/app/_crew/hand-over'
import { useArrival } from '@/app/_crew/use-arrival'
import { goTo } from '@/app/_crew/use-location'
import { Button } from '@/app/_ui/button'
import { EmptyState } from '@/app/_ui/empty-state'
import { useDayEntries, useDayVersion } from '@/lib/sync/client/use-day'
import { CarRow } from './car-row'
import { entryOfScan } from './entry-of-scan'
import { ScanToFind } from './scan-to-find'
import { DaySwitchesButton } from './day-switches-button'
import { entryOfCode, isUnfinished, searchCars } from './search-cars'

/** Cars shown at most; nobody scrolls through more with a glove on. */
const MOST_SHOWN = 12

/** Finds a car by plate, number or the code on its sticker, as fast as it can be typed; nothing typed shows the cars that are begun and not finished. */
export function FindCar() {
  const day = useDay()
  const entries = useDayEntries(day)
  const version = useDayVersion(day)
  const [query, setQuery] = useState('')
  const input = useArrival<HTMLInputElement>('find')
  const isAsked = query.trim() !== ''
  const found = useMemo(
    () =>
      isAsked
        ? searchCars(entries, query, entryOfScan(query, day.snapshot(), day.passList()) ?? entryOfCode(day.passList(), query))
        : entries.filter(({ id }) => isUnfinished(day.state(`car:${id}`).verdict)),
    // eslint-disable-next-line react-hooks/exhaustive-deps -- `version` stands for all that the day's states and list are made of
    [day, entries, query, isAsked, version],
  )
  const heading = isAsked ? `${found.length === 0 ? 'No car' : found.length} found` : 'Begun, not finished'
  return (
    <main className="flex grow flex-col gap-4 px-4 pb-4 pt-4">
      <h1 className="text-xl">Find a car</h1>
      <label className="grid gap-1">
        <span>Number, plate or code on the sticker</span>
        <input
          ref={input}
          className="figures target-outcome w-full rounded-sm border border-line bg-ground px-4 text-6xl uppercase"
          value={query}
          onChange={(event) => setQuery(event.target.value)}
          onKeyDown={(event) => {
            if (event.key === 'Enter' && isAsked && found[0]) goTo(`/bay/car/${found[0].id}`)
          }}
          autoComplete="off"
          autoCapitalize="characters"
          spellCheck={false}
          enterKeyHint="go"
        />
      </label>
      <ScanToFind />
      {query !== '' && (
        <Button look="quiet" className="self-start" onClick={() => setQuery('')}>
          Clear
        </Button>
      )}
      <h2 className="text-lg">{heading}</h2>
      <p role="status" className="sr-only">
        {isAsked ? heading : ''}
      </p>
      {found.length === 0 ? (
        <NoneFound isAsked={isAsked} loaded={entries.length} />
      ) : (
        <ul>
          {found.slice(0, MOST_SHOWN).map((entry) => (
            <CarRow key={entry.id} entry={entry} />
          ))}
        </ul>
      )}
      {found.length > MOST_SHOWN && <p className="text-muted">{found.length - MOST_SHOWN} more: type further.</p>}
      <DaySwitchesButton />
      <HandOver />
    </main>
  )
}

function NoneFound({ isAsked, loaded }: { readonly isAsked: boolean; readonly loaded: number }) {
  if (!isAsked)
    return <EmptyState title="No car is half done">{`Type the number on the door or the plate; ${loaded} entries are loaded.`}</EmptyState>
  return (
    <EmptyState title="No car with this number, plate or code">
      Read it again; letters and digits are enough. An entry added since this device last heard from the server comes with the next pull.
    </EmptyState>
  )
}
