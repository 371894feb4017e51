'use client'

import { can } from '@/lib/permissions/policy'
import { useDayStatus } from '@/lib/sync/client/use-day'
import { useDay } from './day-context'

/** Whether the chief holds a device enrolled for the chief alone: only that one makes the chief's acts (rule M3). */
export function useChiefsDevice(): boolean {
  const day = useDay()
  const { unlocked } = useDayStatus(day)
  return day.people().length === 1 && can(unlocked?.roles ?? [], 'record:lifted')
}
