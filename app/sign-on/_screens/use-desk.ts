'use client'

import { useMemo } from 'react'
import { useDay } from '@/app/_crew/day-context'
import type { DaySnapshot } from '@/lib/contracts/day-snapshot'
import { deskPeople, type DeskPerson } from '@/lib/desk/desk-people'
import { deskStanding, type DeskStanding } from '@/lib/desk/desk-standing'
import type { DayClient } from '@/lib/sync/client/day-client'
import { useDayEntries, useDayStatus, useDayVersion } from '@/lib/sync/client/use-day'

/** Somebody at the desk, and how they stand. */
export interface AtDesk extends DeskPerson {
  readonly stands: DeskStanding
}

export interface Desk {
  readonly day: DayClient
  readonly people: readonly AtDesk[]
  readonly groups: DaySnapshot['groups']
}

const NO_GROUPS: DaySnapshot['groups'] = []

/** Everybody who is to sit in a car, drawn again with every change of the day. */
export function useDesk(): Desk {
  const day = useDay()
  const entries = useDayEntries(day)
  const version = useDayVersion(day)
  const { day: venueDay } = useDayStatus(day)
  return useMemo(() => {
    const snapshot = day.snapshot()
    const people = deskPeople(snapshot?.people ?? [], entries).map((person) => ({
      ...person,
      stands: deskStanding(day.state(`person:${person.id}`), venueDay),
    }))
    return { day, people, groups: snapshot?.groups ?? NO_GROUPS }
    // eslint-disable-next-line react-hooks/exhaustive-deps -- `version` stands for all that the day's states and snapshot are made of
  }, [day, entries, version, venueDay])
}
