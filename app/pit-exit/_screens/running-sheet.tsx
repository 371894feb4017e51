'use client'

import { useDay } from '@/app/_crew/day-context'
import { Button } from '@/app/_ui/button'
import { Sheet } from '@/app/_ui/sheet'
import { ANY_GROUP } from '@/lib/pass/pit-device'
import type { UsedPitMemory } from './use-pit-memory'

interface RunningSheetProps {
  readonly isOpen: boolean
  readonly pit: UsedPitMemory
  readonly onClose: () => void
}

/** Which group is on track now, as the marshal says it; kept on this device. A car of another group is CHECK. */
export function RunningSheet({ isOpen, pit, onClose }: RunningSheetProps) {
  const day = useDay()
  const groups = [...(day.snapshot()?.groups ?? [])].sort((a, b) => a.order - b.order)
  const choose = (group: string) => {
    pit.setRunningGroup(group)
    onClose()
  }
  return (
    <Sheet isOpen={isOpen} title="Which group is running?" onClose={onClose}>
      <div className="grid gap-3">
        {[...groups, { id: ANY_GROUP, name: 'Pit lane open to all groups' }].map(({ id, name }) => (
          <Button
            key={id}
            size="large"
            look={pit.memory.runningGroup === id ? 'primary' : 'secondary'}
            aria-pressed={pit.memory.runningGroup === id}
            onClick={() => choose(id)}
          >
            {name}
          </Button>
        ))}
      </div>
    </Sheet>
  )
}
