'use client'

import { CrewGate } from '@/app/_crew/crew-gate'
import { useDay } from '@/app/_crew/day-context'
import { goTo, useLocation } from '@/app/_crew/use-location'
import { Button } from '@/app/_ui/button'
import { Notice } from '@/app/_ui/notice'
import { CarScreen } from './car-screen'
import { FindCar } from './find-car'

/** The bay's screens. The address says which; it is read in the browser, since one kept shell answers for all of them. */
export function BayApp() {
  return (
    <CrewGate post="bay">
      <BayScreens />
    </CrewGate>
  )
}

function BayScreens() {
  const day = useDay()
  const [, , what, id, ...rest] = (useLocation() ?? '/bay').split('/')
  if (what === undefined || what === '') return <FindCar />
  const entry = what === 'car' && id !== undefined ? day.entry(id) : null
  if (entry) return <CarScreen key={entry.id} entry={entry} rest={rest} />
  return (
    <Notice
      happened="This address leads to no car on this device."
      kept="Nothing was lost."
      todo="Find the car by number or plate."
      actions={<Button onClick={() => goTo('/bay')}>Find a car</Button>}
      className="m-4"
    />
  )
}
