import { render } from '@testing-library/react'
import { vi } from 'vitest'
import { DayProvider } from '@/app/_crew/day-context'
import { PitExitScreen } from '@/app/pit-exit/_screens/pit-exit-screen'
import type { DayClient } from '@/lib/sync/client/day-client'
import { aFinding, one, presents, seesAll } from '../support/sync-walk'
import { aSyncPaddock, CHECKLIST_HASH, LIMITS_HASH, MORNING, type SyncPaddock } from '../support/sync-paddock'

/** A paddock at 08:00 with car 47 passed and its driver banded, and the marshal's phone beside it, its day loaded. */
export async function aPassedCar() {
  const paddock = await aSyncPaddock({ cars: 2 })
  const bay = await paddock.phone(['scrutineer'], ['sign-on'])
  const marshal = await paddock.phone(['marshal'])
  await bay.day.loadDay()
  const [car, driver] = [paddock.cars[0] as string, paddock.drivers[0] as string]
  await presents(bay.day, car)
  await seesAll(bay.day, car)
  const pass = await bay.day.issuePass({ entry: car, passengerSeatUsable: true })
  await bandFor(bay.day, car, driver)
  await bay.day.drain()
  await marshal.day.loadDay()
  return { paddock, bay, marshal, car, driver, pass }
}

/** Sees a person's helmet and their fit in the car, and gives the band. */
export async function bandFor(day: DayClient, car: string, person: string): Promise<void> {
  for (const subject of [{ person }, { fit: car, person }]) {
    await one(day, {
      kind: 'presented',
      subject,
      checklist: CHECKLIST_HASH,
      limits: LIMITS_HASH,
      declaration: null,
      facts: {},
      depth: 'standard',
    })
    const key = 'fit' in subject ? (`fit:${car}:${person}` as const) : (`person:${person}` as const)
    for (const check of day.state(key).open) await one(day, { ...aFinding(day, car, check, 'ok'), subject } as never)
  }
  await day.issueBand({ person, bandNumber: '118' })
}

/** Draws the pit exit with a day, its clock where the paddock's is. */
export function drawPitExit(day: DayClient, paddock: SyncPaddock | null = null) {
  vi.spyOn(Date, 'now').mockReturnValue(paddock?.time.now ?? MORNING)
  return render(
    <DayProvider client={day}>
      <PitExitScreen />
    </DayProvider>,
  )
}
