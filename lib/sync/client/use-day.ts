'use client'

import { useSyncExternalStore } from 'react'
import type { SubjectState } from '@/lib/inspection/state'
import type { SubjectKey } from '@/lib/inspection/subject'
import type { PassList } from '@/lib/pass/pass-list'
import type { DayClient, DayEntry, DayStatus } from './day-client'

/** The day's status; drawn again when anything in it changes. */
export function useDayStatus(client: DayClient): DayStatus {
  return useSyncExternalStore(client.subscribe, client.status, client.status)
}

/** How one subject stands; drawn again when its records or the day change. */
export function useSubjectState(client: DayClient, key: SubjectKey): SubjectState {
  const read = () => client.state(key)
  return useSyncExternalStore(client.subscribe, read, read)
}

export function useDayEntries(client: DayClient): readonly DayEntry[] {
  return useSyncExternalStore(client.subscribe, client.entries, client.entries)
}

export function usePassList(client: DayClient): PassList | null {
  return useSyncExternalStore(client.subscribe, client.passList, client.passList)
}

/** Moves on with every change of the day; for what is made of several reads. */
export function useDayVersion(client: DayClient): number {
  return useSyncExternalStore(client.subscribe, client.version, client.version)
}
