'use client'

import { CrewGate } from '@/app/_crew/crew-gate'
import { PitExitScreen } from './pit-exit-screen'

/** The pit exit's screens, behind what stands before every crew screen. */
export function PitExitApp() {
  return (
    <CrewGate post="pit-exit">
      <PitExitScreen />
    </CrewGate>
  )
}
