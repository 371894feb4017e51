'use client'

import { useState } from 'react'
import { crewName } from '@/app/_crew/crew-name'
import { useDay } from '@/app/_crew/day-context'
import { clockTime } from '@/app/_crew/say-when'
import { TextAreaField } from '@/app/_ui/field'
import type { LogEntry } from '@/lib/inspection/log-entry'
import { QUARANTINE_WORDS } from '@/lib/inspection/quarantine-words'
import { isKnown } from '@/lib/inspection/record'
import { ChiefSheet } from './chief-sheet'
import { HEAD_WORDS } from './heads-so-far'
import type { Walk } from './use-walk'

interface AdoptSheetProps {
  readonly walk: Walk
  readonly entry: LogEntry
  readonly onClose: () => void
}

/** Gives a record that was set aside its effect back: what it says, who made it, why it was set aside, and why the chief takes it over. */
export function AdoptSheet({ walk, entry, onClose }: AdoptSheetProps) {
  const day = useDay()
  const [why, setWhy] = useState('')
  const { record, disposition, hash } = entry
  const zone = day.snapshot()?.event.timeZone ?? 'UTC'
  const says = isKnown(record) && record.kind === 'finding' ? `: ${HEAD_WORDS[record.outcome]}` : ''
  const check = isKnown(record) && 'check' in record ? walk.book?.byId.get(record.check)?.prompt : undefined
  return (
    <ChiefSheet
      title="Adopt a record that was set aside"
      does="Adopt it"
      isReady={why.trim().length >= 3}
      save={() => day.record([{ kind: 'adopted', subject: walk.subject, adopts: hash, why: why.trim() }])}
      onClose={onClose}
    >
      <p className="font-bold">
        {record.kind.replaceAll('-', ' ')}
        {says}
        {check === undefined ? '' : `, “${check}”`}
      </p>
      <p>
        Made {clockTime(record.at, zone)} by {crewName(day, record.actor)}. Set aside:{' '}
        {disposition.state === 'quarantined' ? QUARANTINE_WORDS[disposition.code] : ''}.
      </p>
      <TextAreaField
        label="Why it counts all the same"
        value={why}
        maxLength={500}
        required
        onChange={({ target }) => setWhy(target.value)}
      />
    </ChiefSheet>
  )
}
