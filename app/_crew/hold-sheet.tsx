'use client'

import { useState } from 'react'
import { Button } from '@/app/_ui/button'
import { Choice } from '@/app/_ui/choice'
import { Sheet } from '@/app/_ui/sheet'
import type { HoldRow } from '@/lib/checklist/hold-table'
import { pickableHolds } from '@/lib/checklist/resolve-hold'
import type { DayEntry } from '@/lib/sync/client/day-client'
import { useDay } from './day-context'
import { holdDrafts } from './hold-drafts'
import { ProblemNotice } from './problem-notice'
import { useAction } from './use-action'
import { WhoIsHeld } from './who-is-held'

interface HoldSheetProps {
  readonly entry: string
  readonly onHeld: (number: string) => void
  readonly onClose: () => void
}

const STICKER = [
  { says: 'not known', removed: null },
  { says: 'taken off', removed: true },
  { says: 'still on', removed: false },
] as const

/** Why a car, or somebody in it, is held: one press on a reason records it, with what is to be seen again filled in from the hold table. */
export function HoldSheet({ entry: id, onHeld, onClose }: HoldSheetProps) {
  const day = useDay()
  const { busy, problem, act } = useAction()
  const [removed, setRemoved] = useState<boolean | null>(null)
  const [asking, setAsking] = useState<HoldRow | null>(null)
  const entry = day.entry(id)
  if (entry === null) return null

  const hold = async (row: HoldRow, people: readonly string[]) => {
    const asked = { entry, row, people, stickerRemoved: removed, now: Date.now() }
    if (await act(() => day.record(holdDrafts(day, asked)))) onHeld(entry.number)
  }
  const pick = (row: HoldRow) => {
    const people = entry.people.map(({ person }) => person)
    // Whose it is cannot be guessed of several; of one it need not be asked.
    if (row.who !== null && (people.length > 1 || (people.length === 0 && row.car === null))) setAsking(row)
    else void hold(row, row.who === null ? [] : people)
  }
  return (
    <Sheet isOpen title={`Hold ${entry.number}, because …`} onClose={onClose}>
      <div className="grid gap-4">
        <CarLine entry={entry} />
        <ProblemNotice problem={problem} />
        {asking === null ? (
          <>
            <fieldset className="flex flex-wrap gap-x-4">
              <legend className="font-bold">Its sticker</legend>
              {STICKER.map(({ says, removed: value }) => (
                <Choice key={says} type="radio" name="sticker" checked={removed === value} onChange={() => setRemoved(value)}>
                  {says}
                </Choice>
              ))}
            </fieldset>
            <Reasons rows={pickableHolds(day.book())} busy={busy} onPick={pick} />
            <Button look="quiet" onClick={onClose}>
              Do not hold
            </Button>
          </>
        ) : (
          <WhoIsHeld row={asking} entry={entry} busy={busy} onPick={(people) => void hold(asking, people)} onBack={() => setAsking(null)} />
        )}
      </div>
    </Sheet>
  )
}

function CarLine({ entry }: { readonly entry: DayEntry }) {
  return (
    <p>
      {entry.plate} · {entry.colour} · {entry.model}
    </p>
  )
}

interface ReasonsProps {
  readonly rows: readonly HoldRow[]
  readonly busy: boolean
  readonly onPick: (row: HoldRow) => void
}

/** The whole table: what stops the car first, then what stops a person and no car. */
function Reasons({ rows, busy, onPick }: ReasonsProps) {
  const button = (row: HoldRow) => (
    <Button key={row.id} look="secondary" className="target-outcome text-lg" isBusy={busy} onClick={() => onPick(row)}>
      {row.words}
    </Button>
  )
  return (
    <>
      <fieldset className="grid grid-cols-2 gap-3">
        <legend className="mb-2 font-bold">The car stops, whoever drives it</legend>
        {rows.filter(({ car }) => car !== null).map(button)}
      </fieldset>
      <p className="text-muted">“Something else” names nothing to see again: only the chief lifts it.</p>
      <fieldset className="grid grid-cols-2 gap-3">
        <legend className="mb-2 font-bold">One person stops, and no car</legend>
        {rows.filter(({ car }) => car === null).map(button)}
      </fieldset>
    </>
  )
}
