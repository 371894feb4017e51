'use client'

import { CrewGate } from '@/app/_crew/crew-gate'
import { goTo, useLocation } from '@/app/_crew/use-location'
import { Button } from '@/app/_ui/button'
import { Notice } from '@/app/_ui/notice'
import { BriefingScreen } from './briefing-screen'
import { FindPerson } from './find-person'
import { PersonScreen } from './person-screen'
import { TurnedUpScreen } from './turned-up-screen'
import { useDesk } from './use-desk'

/** The desk's screens, behind the gate of every crew device. */
export function SignOnApp() {
  return (
    <CrewGate post="sign-on">
      <SignOnScreens />
    </CrewGate>
  )
}

/** Which of the desk's screens the address says; it is read in the browser, since one kept shell answers for all of them. */
export function SignOnScreens() {
  const desk = useDesk()
  const [, , what, id, place] = (useLocation() ?? '/sign-on').split('/')
  if (what === undefined || what === '') return <FindPerson desk={desk} />
  if (what === 'briefing') return <BriefingScreen desk={desk} />
  if (what === 'turned-up') return <TurnedUpScreen desk={desk} />
  const person = what === 'person' ? desk.people.find((one) => one.id === id) : undefined
  if (person) return <PersonScreen key={person.id} person={person} place={place ?? null} />
  return (
    <main>
      <Notice
        happened="This address leads to nobody on this device."
        kept="Nothing was lost."
        todo="Find the person by name, number or plate."
        actions={<Button onClick={() => goTo('/sign-on')}>Find a person</Button>}
        className="m-4"
      />
    </main>
  )
}
