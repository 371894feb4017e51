'use client'

import { useCallback, useState } from 'react'
import { useDay } from '@/app/_crew/day-context'
import { recallPit, rememberPit, type HeardReadBack, type PitMemory } from './pit-memory'

export interface UsedPitMemory {
  readonly memory: PitMemory
  readonly setRunningGroup: (group: string) => void
  readonly hear: (readBack: HeardReadBack) => void
  /** What was said last could not be kept on this device and is gone after a reload. */
  readonly isForgetful: boolean
}

/** What the marshal told this device about the pit exit, kept over reloads. */
export function usePitMemory(): UsedPitMemory {
  const { event, device } = useDay().status()
  const [memory, setMemory] = useState(() => recallPit(localStorage, event?.id ?? '', device.id))
  const [isForgetful, setForgetful] = useState(false)
  const keep = useCallback(
    (next: PitMemory) => {
      setMemory(next)
      setForgetful(!rememberPit(localStorage, event?.id ?? '', device.id, next))
    },
    [event?.id, device.id],
  )
  return {
    memory,
    isForgetful,
    setRunningGroup: (runningGroup) => keep({ ...memory, runningGroup }),
    hear: (readBack) => keep({ ...memory, readBacks: [...memory.readBacks, readBack] }),
  }
}
