import { screen, waitFor } from '@testing-library/react'
import { expect, test } from 'vitest'
import { presents } from '../support/sync-walk'
import { axeFindings } from './axe-findings'
import { aBay, aBegunBay, aHarnessBay } from './a-bay'

const presented = (bay: Awaited<ReturnType<typeof aBay>>) => bay.state().presentedHeads.map(({ record }) => record)

test('what nobody has said is not chosen beforehand, and stays unknown', async () => {
  const bay = await aBay({ isShipped: true })
  bay.open()
  expect(await screen.findByRole('radio', { name: 'Harness' })).not.toBeChecked()
  expect(screen.getByRole('radio', { name: 'Road belts' })).not.toBeChecked()
  expect(screen.getByText(/^Not answered: belts/)).toBeVisible()
  await bay.user.click(screen.getByRole('radio', { name: 'Harness' }))
  expect(screen.getByRole('group', { name: 'Head restraint worn with the harness' })).toBeVisible()

  await bay.press('Begin the walk')
  await waitFor(() => expect(presented(bay)).toHaveLength(1))
  expect(presented(bay)[0]?.facts).toEqual({ belts: 'harness' })
})

test('what the entry declared is offered, and the walk begins with one press', async () => {
  const bay = await aBay()
  bay.open()
  await bay.press('Begin the walk')
  await screen.findByRole('navigation', { name: 'Places' })
  expect(presented(bay)).toMatchObject([{ facts: { cage: false, slicks: false }, depth: 'standard' }])
})

test('[F12] a helper who would look less deep is refused in words, and the walk goes on as it was', async () => {
  const bay = await aBegunBay({ roles: ['helper'] })
  bay.open()
  await bay.press('The car is otherwise than said')
  await bay.user.click(screen.getByRole('radio', { name: /^Look-over/ }))
  await bay.press('Begin the walk')
  expect(await screen.findByText('Only a scrutineer may look less deep, or take back what was said of it.')).toBeVisible()
  expect(screen.getByText('Nothing was changed; the walk goes on as it was.')).toBeVisible()
  expect(presented(bay)).toMatchObject([{ depth: 'standard' }])
  await bay.press('Leave it as it was')
  expect(screen.getByRole('navigation', { name: 'Places' })).toBeVisible()
})

test('[F12] a scrutineer may, and a helper may always ask more', async () => {
  const bay = await aBegunBay()
  bay.open()
  await bay.press('The car is otherwise than said')
  await bay.user.click(screen.getByRole('radio', { name: /^Look-over/ }))
  await bay.press('Begin the walk')
  await waitFor(() => expect(presented(bay)).toMatchObject([{ depth: 'look-over' }]))
})

test('[F12] two devices that said different things are both heard, and it is said', async () => {
  const bay = await aBegunBay()
  const other = await bay.paddock.phone(['scrutineer'])
  await other.day.loadDay()
  await presents(other.day, bay.car, { cage: true, slicks: false })
  await other.day.drain()
  await bay.phone.day.drain()
  bay.open()
  expect(screen.getByText(/^Two devices said different things/)).toBeVisible()
  expect(screen.getByRole('button', { name: /^Go on: Front/ })).toBeVisible()
})

test('the wire’s bolts lead to their stations', async () => {
  const bay = await aBegunBay()
  bay.open()
  await bay.press(/^wheels/)
  expect(await screen.findByRole('heading', { level: 3, name: 'wheels.nuts in order' })).toBeVisible()
})

test('axe finds nothing in the bay’s screens', async () => {
  const bay = await aHarnessBay()
  bay.open()
  expect(await axeFindings()).toEqual([])
  await bay.press('Go on: Cabin')
  expect(await axeFindings()).toEqual([])
  await bay.press(/^the rest$|the rest$/)
  expect(await axeFindings()).toEqual([])
  await bay.press('Another car')
  expect(await axeFindings()).toEqual([])
})
