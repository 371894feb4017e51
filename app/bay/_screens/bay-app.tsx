'use client'

import { Suspense, useEffect } from 'react'
import { CrewGate } from '@/app/_crew/crew-gate'
import { useDay } from '@/app/_crew/day-context'
import { goTo, useLocation } from '@/app/_crew/use-location'
import { Button } from '@/app/_ui/button'
import { Notice } from '@/app/_ui/notice'
import { useDayEntries } from '@/lib/sync/client/use-day'
import { CarScreen, fetchCarScreenWhenIdle } from './car-screen-when-needed'
import { FindCar } from './find-car'

/** The bay's screens, behind the gate of every crew device. */
export function BayApp() {
  return (
    <CrewGate post="bay">
      <BayScreens />
    </CrewGate>
  )
}

/** Which of the bay's screens the address says; it is read in the browser, since one kept shell answers for all of them. */
export function BayScreens() {
  // Drawn again when an entry changes: a record says what number its screen showed (rule T1), so the screen may never lag behind.
  const entries = useDayEntries(useDay())
  useEffect(fetchCarScreenWhenIdle, [])
  const [, , what, id, ...rest] = (useLocation() ?? '/bay').split('/')
  if (what === undefined || what === '') return <FindCar />
  const entry = what === 'car' ? entries.find((one) => one.id === id) : undefined
  if (entry)
    return (
      <Suspense
        fallback={
          <p role="status" className="p-6">
            Opening {entry.number} …
          </p>
        }
      >
        <CarScreen key={entry.id} entry={entry} rest={rest} />
      </Suspense>
    )
  return (
    <main>
      <Notice
        happened="This address leads to no car on this device."
        kept="Nothing was lost."
        todo="Find the car by number or plate."
        actions={<Button onClick={() => goTo('/bay')}>Find a car</Button>}
        className="m-4"
      />
    </main>
  )
}
