'use client'

import { ago } from '@/app/_crew/say-when'
import { useDay } from '@/app/_crew/day-context'
import { daySwitches } from '@/app/_crew/day-switches'
import { classNames } from '@/app/_ui/class-names'
import { ANY_GROUP } from '@/lib/pass/pit-device'
import type { PassList } from '@/lib/pass/pass-list'
import type { PitDevice } from '@/lib/pass/pit-device'
import { isStale, listAge } from '@/lib/pass/list-age'

interface PitStripProps {
  readonly list: PassList | null
  readonly device: PitDevice
  /** What the marshal said could not be kept. */
  readonly isForgetful: boolean
  readonly onList: () => void
  readonly onRunning: () => void
}

/** How old the list is and which group runs, each to be pressed. */
export function PitStrip({ list, device, isForgetful, onList, onRunning }: PitStripProps) {
  const day = useDay()
  const isOld = list !== null && isStale(list, device)
  const group = day.snapshot()?.groups.find(({ id }) => id === device.runningGroup)
  const running = device.runningGroup === ANY_GROUP ? 'open to all groups' : group ? `${group.name} running` : 'Which group is running?'
  const { isWet } = daySwitches(day, device.now)
  return (
    <div className="border-b">
      <div className="flex items-stretch justify-between">
        <button type="button" onClick={onList} className={classNames('target px-4 text-left', isOld && 'bg-ink font-bold text-ground')}>
          {list === null ? 'no list' : `list ${list.version} · ${age(listAge(list, device))}`}
        </button>
        <button type="button" onClick={onRunning} className="target px-4 text-right font-bold text-accent underline underline-offset-4">
          {isWet && 'WET · '}
          {running}
        </button>
      </div>
      {isForgetful && (
        <p role="alert" className="px-4 pb-2 font-bold">
          This device could not keep what you told it. It holds until this page is left; after that say it again.
        </p>
      )}
    </div>
  )
}

function age(ms: number): string {
  return ms < 60_000 ? 'fresh' : ago(ms).replace('ago', 'old')
}
