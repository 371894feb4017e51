'use client'

import { useMemo, useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { goTo } from '@/app/_crew/use-location'
import { Button } from '@/app/_ui/button'
import { EmptyState } from '@/app/_ui/empty-state'
import { OutcomeShape } from '@/app/_ui/outcome-shape'
import { Wire } from '@/app/_ui/wire'
import { wireSentence, wireStations } from '@/lib/inspection/wire'
import { parseTypedCode } from '@/lib/pass/typed-code'
import type { DayEntry } from '@/lib/sync/client/day-client'
import { useDayEntries, useDayVersion } from '@/lib/sync/client/use-day'
import { VERDICT_SHAPES } from './verdict-words'

/** Cars shown at most; nobody scrolls through more with a glove on. */
const MOST_SHOWN = 12

/** Finds a car by plate or number, as fast as it can be typed; nothing typed shows the cars that are begun and not finished. */
export function FindCar() {
  const day = useDay()
  const entries = useDayEntries(day)
  const version = useDayVersion(day)
  const [query, setQuery] = useState('')
  const found = useMemo(
    () =>
      query.trim() === ''
        ? begun(entries, (id) => day.state(`car:${id}`).verdict)
        : search(entries, query, passEntry(day.passList(), query)),
    // `version` stands for all that the day's states are made of.
    // eslint-disable-next-line react-hooks/exhaustive-deps -- the dependency stands in another form, as the line above says
    [entries, query, version],
  )
  return (
    <div className="flex grow flex-col gap-4 px-4 pb-4 pt-4">
      <h1 className="text-xl">Find a car</h1>
      <label className="grid gap-1">
        <span>Number, plate or code on the sticker</span>
        <input
          className="figures target-outcome w-full rounded-sm border border-line bg-ground px-4 text-6xl uppercase"
          value={query}
          onChange={(event) => setQuery(event.target.value)}
          onKeyDown={(event) => {
            if (event.key === 'Enter' && found[0]) goTo(`/bay/car/${found[0].id}`)
          }}
          autoComplete="off"
          autoCapitalize="characters"
          spellCheck={false}
          enterKeyHint="go"
        />
      </label>
      {query !== '' && (
        <Button look="quiet" className="self-start" onClick={() => setQuery('')}>
          Clear
        </Button>
      )}
      <h2 className="text-lg">{query.trim() === '' ? 'Begun, not finished' : `${found.length === 0 ? 'No' : found.length} found`}</h2>
      {found.length === 0 ? (
        <EmptyState title={query.trim() === '' ? 'No car is half done' : 'No car with this number or plate'}>
          {query.trim() === ''
            ? `Type the number on the door or the plate; ${entries.length} entries are loaded.`
            : 'Read it again; letters and digits are enough. An entry added since this device last heard from the server comes with the next pull.'}
        </EmptyState>
      ) : (
        <ul>
          {found.slice(0, MOST_SHOWN).map((entry) => (
            <CarRow key={entry.id} entry={entry} />
          ))}
        </ul>
      )}
      {found.length > MOST_SHOWN && <p className="text-muted">{found.length - MOST_SHOWN} more: type further.</p>}
    </div>
  )
}

function CarRow({ entry }: { readonly entry: DayEntry }) {
  const day = useDay()
  const state = day.state(`car:${entry.id}`)
  const head = state.presentedHeads[0]?.record
  const book = head ? day.book(head.checklist, head.limits) : day.book()
  const stations = book ? wireStations(state, book) : []
  return (
    <li className="border-t border-line">
      <button
        type="button"
        onClick={() => goTo(`/bay/car/${entry.id}`)}
        className="target-outcome grid w-full grid-cols-[auto_1fr] items-center gap-x-4 py-2 text-left"
      >
        <span className="figures text-6xl">{entry.number}</span>
        <span className="grid gap-1">
          <span className="font-bold">
            {entry.plate} · {entry.model}
          </span>
          <span className="text-muted">
            {entry.colour} · {entry.groupName}
          </span>
          <span className="flex items-center gap-2">
            <OutcomeShape state={VERDICT_SHAPES[state.verdict]} className="size-5" />
            {state.verdict}
          </span>
          <Wire
            scale="strip"
            bolts={stations.map(({ short, state: bolt }) => ({ label: short, state: bolt }))}
            sentence={wireSentence(stations)}
          />
        </span>
      </button>
    </li>
  )
}

function begun(entries: readonly DayEntry[], verdictOf: (id: string) => string): readonly DayEntry[] {
  return entries.filter((entry) => ['in progress', 'not passed', 'held'].includes(verdictOf(entry.id)))
}

function search(entries: readonly DayEntry[], query: string, byCode: string | null): readonly DayEntry[] {
  const wanted = fold(query)
  const rank = (entry: DayEntry) => {
    if (entry.id === byCode || fold(entry.number) === wanted) return 0
    if (fold(entry.plate) === wanted) return 1
    if (fold(entry.number).startsWith(wanted)) return 2
    return fold(entry.plate).includes(wanted) ? 3 : 4
  }
  return entries
    .map((entry) => ({ entry, rank: rank(entry) }))
    .filter((one) => one.rank < 4)
    .sort((a, b) => a.rank - b.rank || a.entry.number.localeCompare(b.entry.number, 'en', { numeric: true }))
    .map(({ entry }) => entry)
}

/** The entry whose pass has this typed code; null where the text is no code or no pass has it. */
function passEntry(list: ReturnType<ReturnType<typeof useDay>['passList']>, query: string): string | null {
  const code = parseTypedCode(query)
  return list?.entries.find((entry) => entry.passes.some((pass) => pass.typedCode === code))?.entry ?? null
}

function fold(text: string): string {
  return text.toUpperCase().replace(/[^\p{L}\p{N}]/gu, '')
}
