import { screen, waitFor } from '@testing-library/react'
import { expect, test } from 'vitest'
import { aBay, type Bay } from './a-bay'

const HARNESS_CAR = { belts: 'harness', roof: 'closed', build: 'standard' }
const ROAD_CAR = { ...HARNESS_CAR, belts: 'standard' }

async function aPresentedBay(facts: Readonly<Record<string, string>>): Promise<Bay> {
  const bay = await aBay({ isShipped: true })
  const event = bay.phone.day.snapshot()?.event
  if (!event) throw new Error('the day is not loaded')
  const pins = { checklist: event.checklistHash, limits: event.limitsHash, declaration: null, depth: 'standard' } as const
  await bay.phone.day.record([{ kind: 'presented', subject: { car: bay.car }, ...pins, facts }])
  return bay
}

test('in a closed road car nobody is asked how they sit', async () => {
  const bay = await aPresentedBay(ROAD_CAR)
  bay.open()
  await screen.findByRole('navigation', { name: 'Places' })
  expect(screen.queryByRole('button', { name: /^Fit:/ })).toBeNull()
})

test('[F14] with a harness each driver has a fit: it pins what was seen of the car, and bars that person from that car until it is seen', async () => {
  const bay = await aPresentedBay(HARNESS_CAR)
  bay.open()
  await bay.press('Fit: Driver 1')
  await bay.press('Begin')
  const key = `fit:${bay.car}:${bay.driver}`
  await waitFor(() => expect(bay.phone.day.state(key).presentedHeads.map(({ record }) => record.facts)).toEqual([HARNESS_CAR]))

  expect(await screen.findByText('May not drive this car yet.')).toBeVisible()
  expect(screen.queryByRole('region', { name: /^(Pass|Band)$/ })).toBeNull()
  const open = bay.phone.day.state(key).open
  expect(open).toEqual(expect.arrayContaining(['fit.belts', 'fit.head-line']))
  await bay.phone.day.record(
    open.map((check) => ({ kind: 'finding', subject: { fit: bay.car, person: bay.driver }, check, outcome: 'ok' })),
  )
  expect(await screen.findByText(/^Fits this car\./)).toBeVisible()
  expect(bay.state().verdict).toBe('in progress')
})
