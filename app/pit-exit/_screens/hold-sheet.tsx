'use client'

import { useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { ProblemNotice } from '@/app/_crew/problem-notice'
import { useAction } from '@/app/_crew/use-action'
import { Button } from '@/app/_ui/button'
import { Choice } from '@/app/_ui/choice'
import { NumberPlate } from '@/app/_ui/number-plate'
import { Sheet } from '@/app/_ui/sheet'
import type { HoldReason } from '@/lib/checklist/checklist'
import { holdDraft, SOMETHING_ELSE } from './hold-draft'

interface HoldSheetProps {
  readonly entry: string
  readonly onHeld: (number: string) => void
  readonly onClose: () => void
}

type Subject = { readonly car: string } | { readonly person: string }

const STICKER = [
  { says: 'not known', removed: null },
  { says: 'taken off', removed: true },
  { says: 'still on', removed: false },
] as const

/** Why a car or one of its people is held: one press on a reason records it, with the stations to see again filled in. */
export function HoldSheet({ entry: id, onHeld, onClose }: HoldSheetProps) {
  const day = useDay()
  const { busy, problem, act } = useAction()
  const [removed, setRemoved] = useState<boolean | null>(null)
  const entry = day.entry(id)
  const book = day.book()
  if (entry === null) return null
  const reasons = book?.checklist.holdReasons ?? []
  const names = new Map(day.snapshot()?.people.map(({ id: person, name }) => [person, name]) ?? [])

  const hold = async (subject: Subject, reason: HoldReason) => {
    const sticker = 'car' in subject ? removed : null
    if (await act(() => day.record([holdDraft(subject, reason, sticker, book)]))) onHeld(entry.number)
  }
  const button = (subject: Subject, reason: HoldReason) => (
    <Button key={reason.id} look="secondary" size="large" isBusy={busy} onClick={() => void hold(subject, reason)}>
      {reason.text}
    </Button>
  )

  return (
    <Sheet isOpen title={`Hold ${entry.number}, because …`} onClose={onClose}>
      <div className="grid gap-4">
        <p className="flex flex-wrap items-center gap-4">
          <NumberPlate number={entry.number} size="row" />
          <span>
            {entry.plate} · {entry.colour} · {entry.model}
          </span>
        </p>
        <ProblemNotice problem={problem} />
        <fieldset className="flex flex-wrap gap-x-6">
          <legend className="font-bold">Its sticker</legend>
          {STICKER.map(({ says, removed: value }) => (
            <Choice key={says} type="radio" name="sticker" checked={removed === value} onChange={() => setRemoved(value)}>
              {says}
            </Choice>
          ))}
        </fieldset>
        <div className="grid gap-3">
          {reasons.filter(({ subject }) => subject === 'car').map((reason) => button({ car: id }, reason))}
          {button({ car: id }, SOMETHING_ELSE)}
          <p className="text-muted">“Something else” names nothing to see again: only the chief lifts it.</p>
        </div>
        {entry.people.map(({ person }) => (
          <fieldset key={person} className="grid gap-3">
            <legend className="mb-2 font-bold">Hold {names.get(person) ?? 'this person'}, not the car</legend>
            {reasons.filter(({ subject }) => subject === 'person').map((reason) => button({ person }, reason))}
          </fieldset>
        ))}
        <Button look="quiet" onClick={onClose}>
          Do not hold
        </Button>
      </div>
    </Sheet>
  )
}
