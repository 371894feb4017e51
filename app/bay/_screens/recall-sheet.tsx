'use client'

import { useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { ProblemNotice } from '@/app/_crew/problem-notice'
import { StationPicks } from '@/app/_crew/station-picks'
import { useAction } from '@/app/_crew/use-action'
import { Button } from '@/app/_ui/button'
import { Choice } from '@/app/_ui/choice'
import { TextField } from '@/app/_ui/field'
import { Sheet } from '@/app/_ui/sheet'
import type { DayEntry } from '@/lib/sync/client/day-client'
import { timeTrigger, triggerChoices } from './recall-trigger'
import { stationsHere } from '@/app/_walk/stations-here'
import type { WalkSubject } from '@/app/_walk/use-walk'

interface RecallSheetProps {
  readonly entry: DayEntry
  readonly subject: WalkSubject
  readonly onClose: () => void
}

const AT_A_TIME = 'time'

/** “Show me after your first session”: when, and what. Once it is due the pit exit says HOLD until it has been seen. */
export function RecallSheet({ entry, subject, onClose }: RecallSheetProps) {
  const day = useDay()
  const { busy, problem, act } = useAction()
  const [now] = useState(() => Date.now())
  const [when, setWhen] = useState<string | null>(null)
  const [time, setTime] = useState('')
  const [stations, setStations] = useState<readonly string[]>([])
  const choices = triggerChoices(day, entry, now)
  const trigger = when === AT_A_TIME ? timeTrigger(day, time) : (choices.find(({ id }) => id === when)?.trigger ?? null)
  const recall = async () => {
    if (trigger !== null && (await act(() => day.record([{ kind: 'recall', subject, stations, checks: [], trigger }])))) onClose()
  }
  return (
    <Sheet isOpen title={`Recall ${'car' in subject ? entry.number : 'this person'}`} onClose={onClose}>
      <div className="grid gap-4">
        <fieldset>
          <legend className="font-bold">To be shown</legend>
          {[...choices, { id: AT_A_TIME, words: 'at a time today' }].map(({ id, words }) => (
            <Choice key={id} type="radio" name="recall-when" checked={when === id} onChange={() => setWhen(id)}>
              {words}
            </Choice>
          ))}
        </fieldset>
        {when === AT_A_TIME && <TextField label="Time, 24 h" type="time" value={time} onChange={({ target }) => setTime(target.value)} />}
        <StationPicks legend="What is to be seen" stations={stationsHere(day, subject)} picked={stations} onPick={setStations} />
        {stations.length === 0 && (
          <p className="text-muted">Pick at least one: of a recall that names nothing, only the chief could end the HOLD.</p>
        )}
        <ProblemNotice problem={problem} />
        <Button size="large" disabled={trigger === null || stations.length === 0} isBusy={busy} onClick={() => void recall()}>
          Recall it
        </Button>
        <Button look="quiet" onClick={onClose}>
          No recall
        </Button>
      </div>
    </Sheet>
  )
}
