'use client'

import { useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { dayWords } from '@/app/_crew/say-when'
import { Choice } from '@/app/_ui/choice'
import { TextAreaField } from '@/app/_ui/field'
import { addDays, civilDate } from '@/lib/rules/civil-date'
import { ChiefSheet } from './chief-sheet'
import { LooksSideBySide } from './looks-side-by-side'
import type { Walk } from './use-walk'

interface DispenseSheetProps {
  readonly walk: Walk
  readonly check: string
  readonly onClose: () => void
}

/** The chief lets a car or person run in spite of one fail: why, under which conditions, until when. The fail stays in the record, and stands again afterwards. */
export function DispenseSheet({ walk, check, onClose }: DispenseSheetProps) {
  const day = useDay()
  const [reason, setReason] = useState('')
  const [conditions, setConditions] = useState('')
  const [until, setUntil] = useState<string | null | undefined>(undefined)
  const state = walk.state.checks.get(check)
  const definition = walk.book?.byId.get(check) ?? null
  const draft = { kind: 'dispensation', subject: walk.subject, check, reason: reason.trim(), conditions: conditions.trim() } as const
  return (
    <ChiefSheet
      title="Accept one fail, with conditions"
      does="Accept it with these conditions"
      isReady={until !== undefined && draft.reason.length >= 3 && draft.conditions.length >= 3}
      save={() => day.record(until === undefined ? [] : [{ ...draft, until }])}
      onClose={onClose}
    >
      <p className="font-bold">{definition?.prompt ?? check}</p>
      <LooksSideBySide heads={state?.heads ?? []} check={definition} />
      <TextAreaField label="Why it may run" value={reason} maxLength={500} required onChange={({ target }) => setReason(target.value)} />
      <TextAreaField
        label="Only with these conditions"
        description="The pit exit shows them at each scan, as CHECK."
        value={conditions}
        maxLength={500}
        required
        onChange={({ target }) => setConditions(target.value)}
      />
      <fieldset>
        <legend className="font-bold">Until</legend>
        {daysLeft(day.status().day, walk.lastDay).map((one) => (
          <Choice key={one} type="radio" name="until" checked={until === one} onChange={() => setUntil(one)}>
            the end of {dayWords(one)}
          </Choice>
        ))}
        <Choice type="radio" name="until" checked={until === null} onChange={() => setUntil(null)}>
          the end of the event
        </Choice>
      </fieldset>
    </ChiefSheet>
  )
}

/** Days from today to the one before the last: the last is the event's end. */
function daysLeft(today: string, lastDay: string): readonly string[] {
  const days: string[] = []
  for (let one = civilDate(today); one < lastDay; one = addDays(one, 1)) days.push(one)
  return days
}
