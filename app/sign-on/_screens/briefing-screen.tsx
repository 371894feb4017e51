'use client'

import { useState } from 'react'
import { ProblemNotice } from '@/app/_crew/problem-notice'
import { useArrival } from '@/app/_crew/use-arrival'
import { goTo } from '@/app/_crew/use-location'
import { Button } from '@/app/_ui/button'
import { EmptyState } from '@/app/_ui/empty-state'
import { UndoBar } from '@/app/_ui/undo-bar'
import { OneOf } from '@/app/_walk/one-of'
import { searchPeople } from '@/lib/desk/search-people'
import { briefingTimes } from './briefing-times'
import { TickList } from './tick-list'
import { useBriefing } from './use-briefing'
import type { Desk } from './use-desk'

/** Stands for a briefing that the timetable does not have. */
const OTHER = 'another time'

/** Who was at a briefing: which one, who, and one press for all of them. */
export function BriefingScreen({ desk }: { readonly desk: Desk }) {
  const heading = useArrival<HTMLHeadingElement>('briefing')
  const { people, busy, problem, done, save, takeBack } = useBriefing(desk)
  const snapshot = desk.day.snapshot()
  const times = snapshot === null ? [] : briefingTimes(snapshot, desk.day.status().day)
  const [picked, setPicked] = useState<string | undefined>(undefined)
  const [typed, setTyped] = useState('')
  const [query, setQuery] = useState('')
  const [ticked, setTicked] = useState<ReadonlySet<string>>(new Set())
  const time = times.length === 0 || picked === OTHER ? typedTime(typed) : (times.find(({ label }) => label === picked)?.time ?? '')
  const shown = query.trim() === '' ? people : searchPeople(people, query)
  const chosen = people.filter(({ id, briefing }) => briefing === 'open' && ticked.has(id)).length
  const send = () => void save(ticked, time).then((isSaved) => isSaved && setTicked(new Set()))
  return (
    <main className="grid grid-cols-[minmax(0,1fr)] gap-4 px-4 pt-4 pb-6">
      <h1 ref={heading} tabIndex={-1} className="text-xl outline-none">
        Who was at a briefing
      </h1>
      {people.length === 0 ? (
        <EmptyState title="No briefing is asked for here">
          The checklist of this event has no check for it, or nobody is entered yet.
        </EmptyState>
      ) : (
        <>
          {times.length > 0 && (
            <OneOf
              name="briefing"
              label="Which briefing"
              options={[...times.map(({ label }) => ({ value: label, label })), { value: OTHER, label: 'Another time' }]}
              value={picked}
              onPick={setPicked}
              isStrong
            />
          )}
          {(times.length === 0 || picked === OTHER) && (
            <label className="grid gap-1">
              <span className="font-bold">Time of the briefing</span>
              <input
                // Not the browser's own clock field: where its language says so, that one writes 8:15 AM.
                inputMode="numeric"
                placeholder="08:15"
                maxLength={5}
                autoComplete="off"
                className="target rounded-sm border border-line bg-ground px-3 text-xl"
                value={typed}
                onChange={(event) => setTyped(event.target.value)}
              />
            </label>
          )}
          <label className="grid gap-1">
            <span className="font-bold">Name, car number or plate</span>
            <input
              className="target rounded-sm border border-line bg-ground px-3 text-xl"
              value={query}
              onChange={(event) => setQuery(event.target.value)}
              autoComplete="off"
              spellCheck={false}
            />
          </label>
          <TickList people={shown} groups={desk.groups} ticked={ticked} onTicked={setTicked} isSearch={query.trim() !== ''} />
          <ProblemNotice problem={problem} />
          <div className="sticky bottom-0 grid gap-2 border-t border-line bg-ground py-3">
            <UndoBar done={done} onUndo={takeBack} />
            <Button size="large" isBusy={busy} disabled={chosen === 0 || time === ''} onClick={send}>
              {chosen === 0 ? 'Tick who was there' : time === '' ? 'Say which briefing' : `${chosen} at the ${time} briefing`}
            </Button>
          </div>
        </>
      )}
      <Button look="quiet" className="justify-self-start" onClick={() => goTo('/sign-on')}>
        Back to sign-on
      </Button>
    </main>
  )
}

/** `8:15`, `0815` and `08.15` are 08:15; what is no time of a day is empty. */
function typedTime(typed: string): string {
  const [, hours = '', minutes = ''] = /^(\d{1,2})[:.]?(\d{2})$/.exec(typed.trim()) ?? []
  return hours !== '' && Number(hours) < 24 && Number(minutes) < 60 ? `${hours.padStart(2, '0')}:${minutes}` : ''
}
