import { screen, waitFor, within } from '@testing-library/react'
import { expect, test } from 'vitest'
import { finds, one, seesAll } from '../support/sync-walk'
import { aBegunBay, pick, saved } from './a-bay'

const ISSUE = 'Issue the pass for 47'

test('a pass can be issued only once the car has passed', async () => {
  const bay = await aBegunBay()
  const [first, ...rest] = bay.state().open as [string, ...string[]]
  for (const check of rest) await finds(bay.phone.day, bay.car, check, 'ok')
  bay.open()
  expect(await screen.findByText('in progress')).toBeVisible()
  expect(screen.queryByRole('button', { name: ISSUE })).toBeNull()

  await finds(bay.phone.day, bay.car, first, 'ok')
  expect(await screen.findByText('passed')).toBeVisible()
  await bay.press(ISSUE)
  expect(await screen.findByRole('button', { name: 'Print both labels' })).toBeVisible()
  expect(bay.state().passes).toMatchObject([{ state: 'live' }])
})

test('a pass is issued with no network at all', async () => {
  const bay = await aBegunBay()
  await seesAll(bay.phone.day, bay.car)
  bay.phone.network.weather = () => 'drop'
  bay.open()
  await bay.press(ISSUE)
  await screen.findByRole('button', { name: 'Print both labels' })
  expect(screen.getAllByText('Sat 9 May 2026').length).toBeGreaterThan(0)
  expect(screen.getAllByRole('img', { name: 'Code of the pass for 47', hidden: true })).toHaveLength(3)
})

test('before the verdict the no-go items and what is open or noted are shown again', async () => {
  const bay = await aBegunBay()
  await finds(bay.phone.day, bay.car, 'body.mirror', 'could-not-see')
  await seesAll(bay.phone.day, bay.car)
  bay.open()
  expect(screen.getByText('passed with advisories')).toBeVisible()
  const again = screen.getByRole('region', { name: 'No-go items, once more' })
  expect(within(again).getByRole('button', { name: /^Front.*brakes\.pads.*wheels\.nuts/ })).toBeVisible()
  expect(within(again).getByRole('button', { name: /^Rear.*wheels\.nuts/ })).toBeVisible()
  expect(screen.getByRole('region', { name: 'Open and noted' })).toHaveTextContent('Front: body.mirror')
})

test('a car that is not passed shows what to mend, in the words of who saw it', async () => {
  const bay = await aBegunBay()
  bay.open(`/bay/car/${bay.car}/front`)
  await bay.press('Not so')
  await bay.user.type(screen.getByRole('textbox', { name: /In your own words/ }), 'pads down to the steel')
  await bay.press('anything else')
  await saved(bay, 'brakes.pads')
  await bay.press('All places')

  expect(screen.getByText('not passed')).toBeVisible()
  const open = screen.getByRole('region', { name: 'Open and noted' })
  expect(open).toHaveTextContent('Front: brakes.pads')
  expect(open).toHaveTextContent('pads down to the steel')
  expect(screen.queryByRole('button', { name: ISSUE })).toBeNull()
})

test('[F7] a new pass kills the one before it, and the screen says so first', async () => {
  const bay = await aBegunBay()
  await seesAll(bay.phone.day, bay.car)
  bay.open()
  await bay.press(ISSUE)
  await bay.press('Issue anew (this one dies)')
  await waitFor(() => expect(bay.state().passes.map(({ state }) => state)).toEqual(['dead', 'live']))
})

test('a pass that could not be saved is no pass: the three sentences stand, and the press can be made again', async () => {
  const bay = await aBegunBay()
  await seesAll(bay.phone.day, bay.car)
  bay.open()
  bay.phone.disk.faults.push('full')
  await bay.press(ISSUE)
  expect(await screen.findByText('This device has no room left.')).toBeVisible()
  expect(bay.state().passes).toEqual([])
  await bay.press(ISSUE)
  await screen.findByRole('button', { name: 'Print both labels' })
})

test('a helper sees that the car is ready, and that a scrutineer issues its pass', async () => {
  const bay = await aBegunBay({ roles: ['helper'] })
  const other = await bay.paddock.phone(['scrutineer'])
  await other.day.loadDay()
  await bay.phone.day.drain()
  await other.day.drain()
  await seesAll(other.day, bay.car)
  await other.day.drain()
  await bay.phone.day.drain()
  bay.open()
  expect(screen.getByText('Ready for its pass. A scrutineer issues it.')).toBeVisible()
  expect(screen.queryByRole('button', { name: ISSUE })).toBeNull()
})

const HOLD = { kind: 'hold', reason: 'contact', stations: ['body'], checks: [], stickerRemoved: false } as const

test('[F5] a hold is shown with what is to be seen again; the chief may lift it in words', async () => {
  const bay = await aBegunBay({ roles: ['chief'] })
  await one(bay.phone.day, { ...HOLD, subject: { car: bay.car } })
  bay.open()
  const held = screen.getByRole('region', { name: 'Held' })
  expect(held).toHaveTextContent('light contact')
  expect(held).toHaveTextContent('The sticker was left on: take it off.')
  await bay.press('Lift without a new look')
  await bay.user.type(screen.getByRole('textbox', { name: 'Why it needs no new look' }), 'wrong car, it was 48')
  await bay.press('Lift it')
  await waitFor(() => expect(screen.queryByRole('region', { name: 'Held' })).toBeNull())
  expect(bay.state().blocks).toEqual([])
})

test('[F5] a scrutineer is not offered to lift a hold, but to see it again, and the walk says what', async () => {
  const bay = await aBegunBay()
  await seesAll(bay.phone.day, bay.car)
  await finds(bay.phone.day, bay.car, 'body.mirror', 'ok')
  await one(bay.phone.day, { ...HOLD, subject: { car: bay.car } })
  bay.open()
  expect(screen.getByRole('region', { name: 'Held' })).toBeVisible()
  expect(screen.queryByRole('button', { name: 'Lift without a new look' })).toBeNull()
  expect(screen.getByRole('button', { name: /^Front.*again/ })).toBeVisible()

  await bay.press(/^Go on: Front/)
  await pick(bay, /the rest/)
  await bay.press(/seen, nothing found$/)
  await waitFor(() => expect(bay.state().verdict).toBe('passed'))
})
