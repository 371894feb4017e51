'use client'

import { useDay } from '@/app/_crew/day-context'
import { DaySwitchesPanel } from '@/app/_crew/day-switches-panel'
import { Button } from '@/app/_ui/button'
import { Sheet } from '@/app/_ui/sheet'
import { ANY_GROUP } from '@/lib/pass/pit-device'
import type { UsedPitMemory } from './use-pit-memory'

interface RunningSheetProps {
  readonly isOpen: boolean
  readonly pit: UsedPitMemory
  readonly onClose: () => void
}

/** Which group is on track now, kept on this device: a car of another group is CHECK. Beside it what is said for the whole event. */
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
        <h3 className="mt-4 text-xl">The whole event</h3>
        <DaySwitchesPanel />
      </div>
    </Sheet>
  )
}
