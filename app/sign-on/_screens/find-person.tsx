'use client'

import { useMemo, useState } from 'react'
import { HandOver } from '@/app/_crew/hand-over'
import { useArrival } from '@/app/_crew/use-arrival'
import { goTo } from '@/app/_crew/use-location'
import { Button } from '@/app/_ui/button'
import { EmptyState } from '@/app/_ui/empty-state'
import { searchPeople } from '@/lib/desk/search-people'
import { MissingByGroup } from './missing-by-group'
import { PersonRow } from './person-row'
import type { Desk } from './use-desk'

/** People shown at most; nobody scrolls through more. */
const MOST_SHOWN = 20

/** Finds somebody by name, car number or plate; nothing typed shows who is still missing, group by group. */
export function FindPerson({ desk }: { readonly desk: Desk }) {
  const [query, setQuery] = useState('')
  const input = useArrival<HTMLInputElement>('find')
  const found = useMemo(() => searchPeople(desk.people, query), [desk.people, query])
  const isAsked = query.trim() !== ''
  const heading = `${found.length === 0 ? 'Nobody' : found.length} found`
  return (
    <main className="flex grow flex-col gap-4 px-4 pt-4 pb-4">
      <h1 className="text-xl">Sign-on</h1>
      <label className="grid gap-1">
        <span>Name, car number or plate</span>
        <input
          ref={input}
          className="target-outcome w-full rounded-sm border border-line bg-ground px-4 text-3xl"
          value={query}
          onChange={(event) => setQuery(event.target.value)}
          onKeyDown={(event) => {
            if (event.key === 'Enter' && found[0]) goTo(`/sign-on/person/${found[0].id}`)
          }}
          autoComplete="off"
          spellCheck={false}
          enterKeyHint="go"
        />
      </label>
      {query !== '' && (
        <Button look="quiet" className="self-start" onClick={() => setQuery('')}>
          Clear
        </Button>
      )}
      <p role="status" className="sr-only">
        {isAsked ? heading : ''}
      </p>
      {isAsked ? (
        <>
          <h2 className="text-lg">{heading}</h2>
          {found.length === 0 ? <NobodyFound /> : <ul>{found.slice(0, MOST_SHOWN).map(toRow)}</ul>}
          {found.length > MOST_SHOWN && <p className="text-muted">{found.length - MOST_SHOWN} more: type further.</p>}
        </>
      ) : (
        <>
          <MissingByGroup desk={desk} />
          <nav aria-label="At the desk" className="grid gap-3 sm:grid-cols-2">
            <Button size="large" look="secondary" onClick={() => goTo('/sign-on/briefing')}>
              Who was at a briefing
            </Button>
            <Button size="large" look="secondary" onClick={() => goTo('/sign-on/turned-up')}>
              Somebody turned up
            </Button>
          </nav>
        </>
      )}
      <HandOver />
    </main>
  )
}

const toRow = (person: Desk['people'][number]) => <PersonRow key={person.id} person={person} />

function NobodyFound() {
  return (
    <EmptyState
      title="Nobody of this name, number or plate"
      actions={
        <Button look="secondary" onClick={() => goTo('/sign-on/turned-up')}>
          Somebody turned up
        </Button>
      }
    >
      Try the number of the car. Who is on no list can be added to a car here, with or without a network.
    </EmptyState>
  )
}
