'use client'

import { useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { HoldSheet } from '@/app/_crew/hold-sheet'
import { Button } from '@/app/_ui/button'
import { can } from '@/lib/permissions/policy'
import type { DayEntry } from '@/lib/sync/client/day-client'
import { useDayStatus } from '@/lib/sync/client/use-day'
import { DaySwitchesButton } from './day-switches-button'
import { RecallSheet } from './recall-sheet'
import type { WalkSubject } from '@/app/_walk/use-walk'

interface CarActsProps {
  readonly entry: DayEntry
  /** Whose walk is shown: the car's, or a person's who sits in it. */
  readonly subject: WalkSubject
}

/** What may be done besides looking: hold it or somebody in it, recall it, and for whoever may the switches of the whole day. */
export function CarActs({ entry, subject }: CarActsProps) {
  const { unlocked } = useDayStatus(useDay())
  const [open, setOpen] = useState<'hold' | 'recall' | null>(null)
  const roles = unlocked?.roles ?? []
  const close = () => setOpen(null)
  return (
    <section className="flex flex-wrap gap-3 px-4 pb-4" aria-label="Hold and recall">
      {can(roles, 'record:hold') && (
        <Button look="secondary" onClick={() => setOpen('hold')}>
          Hold {entry.number}
        </Button>
      )}
      {can(roles, 'record:recall') && (
        <Button look="secondary" onClick={() => setOpen('recall')}>
          {'car' in subject ? `Recall ${entry.number}` : 'Recall this person'}
        </Button>
      )}
      <DaySwitchesButton />
      {open === 'hold' && <HoldSheet entry={entry.id} onHeld={close} onClose={close} />}
      {open === 'recall' && <RecallSheet entry={entry} subject={subject} onClose={close} />}
    </section>
  )
}
