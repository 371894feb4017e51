'use client'

import { useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { DaySwitchesPanel } from '@/app/_crew/day-switches-panel'
import { Button } from '@/app/_ui/button'
import { Sheet } from '@/app/_ui/sheet'
import { can } from '@/lib/permissions/policy'
import { useDayStatus } from '@/lib/sync/client/use-day'

/** The switches of the whole day, for whoever may say them in the bay; nothing for anybody else. */
export function DaySwitchesButton() {
  const { unlocked } = useDayStatus(useDay())
  const [isOpen, setOpen] = useState(false)
  if (!can(unlocked?.roles ?? [], 'record:day')) return null
  return (
    <>
      <Button look="secondary" className="justify-self-start" onClick={() => setOpen(true)}>
        Wet, sessions over
      </Button>
      {isOpen && (
        <Sheet isOpen title="For the whole event" onClose={() => setOpen(false)}>
          <DaySwitchesPanel />
        </Sheet>
      )}
    </>
  )
}
