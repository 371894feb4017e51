'use client'

import { useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { clockTime } from '@/app/_crew/say-when'
import { crewName } from '@/app/_crew/crew-name'
import { TextAreaField } from '@/app/_ui/field'
import type { PassState } from '@/lib/inspection/state'
import { showTypedCode, typedCode } from '@/lib/pass/typed-code'
import { ChiefSheet } from './chief-sheet'
import type { Walk } from './use-walk'

interface VoidSheetProps {
  readonly walk: Walk
  readonly pass: PassState
  readonly onClose: () => void
}

/** Declares one pass or band void, with the reason. It is dead for ever; a new one is one tap where everything still stands well. */
export function VoidSheet({ walk, pass, onClose }: VoidSheetProps) {
  const day = useDay()
  const [reason, setReason] = useState('')
  const { record } = pass
  const zone = day.snapshot()?.event.timeZone ?? 'UTC'
  // A fit has neither pass nor band (rule F14).
  const subject = 'car' in walk.subject ? walk.subject : { person: walk.subject.person }
  return (
    <ChiefSheet
      title={record.kind === 'band' ? `Void band ${record.bandNumber}` : 'Void its pass'}
      does="Declare it void"
      isReady={reason.trim().length >= 3}
      save={() => day.record([{ kind: 'void', subject, voids: pass.hash, reason: reason.trim() }])}
      onClose={onClose}
    >
      <p>
        Issued {clockTime(record.at + record.offset, zone)} by {crewName(day, record.actor)}
        {record.kind === 'pass' && `, code ${showTypedCode(typedCode(record.token))}`}. From now on it is HOLD at the pit exit, for good.
      </p>
      <TextAreaField label="Why" value={reason} maxLength={500} required onChange={({ target }) => setReason(target.value)} />
    </ChiefSheet>
  )
}
