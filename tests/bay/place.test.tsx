import { cleanup, screen, waitFor } from '@testing-library/react'
import { expect, test } from 'vitest'
import { presents, finds } from '../support/sync-walk'
import { aBegunBay, pick, saved, type Bay } from './a-bay'

const prompt = () => screen.getByRole('heading', { level: 3 }).textContent

async function atTheRest(bay: Bay): Promise<void> {
  bay.open(`/bay/car/${bay.car}/front`)
  await pick(bay, /the rest$/)
}

test('[M1] a place is closed by one sentence that names what was seen: one finding per check, one action', async () => {
  const bay = await aBegunBay()
  await atTheRest(bay)
  const before = bay.phone.day.status().unsent
  await bay.press('Front: seat.mounts, body.mirror seen, nothing found')

  expect(await saved(bay, 'seat.mounts')).toMatchObject({ outcome: 'ok' })
  expect(await saved(bay, 'body.mirror')).toMatchObject({ outcome: 'ok' })
  expect(bay.phone.day.status().unsent).toBe(before + 2)
})

test('[M1] where the store fails in the middle of a sentence, none of it is saved and the sentence stands', async () => {
  const bay = await aBegunBay()
  await atTheRest(bay)
  bay.phone.disk.faults.push('full')
  await bay.press(/seen, nothing found$/)

  expect(await screen.findByText('This device has no room left.')).toBeVisible()
  expect(screen.getByText(/^Nothing of this action was saved/)).toBeVisible()
  expect(screen.getByText(/^Free some room/)).toBeVisible()
  expect([...bay.findings('seat.mounts'), ...bay.findings('body.mirror')]).toEqual([])
  await bay.press(/seen, nothing found$/)
  await saved(bay, 'body.mirror')
})

test('one of the rest that is not so is answered by itself, and the rest is still there afterwards', async () => {
  const bay = await aBegunBay()
  await atTheRest(bay)
  await bay.press(/body\.mirror in order/)
  await bay.press('Not so')
  await bay.press('anything else')
  await bay.user.type(screen.getByRole('textbox', { name: /In your own words/ }), 'cracked')
  await bay.press('anything else')
  expect(await saved(bay, 'body.mirror')).toMatchObject({ outcome: 'fail' })
  expect(await screen.findByRole('button', { name: 'Front: seat.mounts seen, nothing found' })).toBeVisible()
})

test('when saving fails, what was typed and the words of the reason are kept', async () => {
  const bay = await aBegunBay()
  bay.open(`/bay/car/${bay.car}/front`)
  await pick(bay, /wheels\.tread$/)
  await bay.user.type(screen.getByRole('textbox', { name: /tread depth/ }), '1.2')
  await bay.press('Not so')
  await bay.user.type(screen.getByRole('textbox', { name: /In your own words/ }), 'down to the wire')
  bay.phone.disk.faults.push('failed')
  await bay.press('anything else')

  expect(await screen.findByText('This device could not write to its own storage.')).toBeVisible()
  expect(screen.getByText(/^Save again\./)).toBeVisible()
  expect(screen.getByRole('textbox', { name: /tread depth/ })).toHaveValue('1.2')
  await bay.press('Not so')
  expect(screen.getByRole('textbox', { name: /In your own words/ })).toHaveValue('down to the wire')
  await bay.press('anything else')
  expect(await saved(bay, 'wheels.tread')).toMatchObject({ outcome: 'fail', measured: { depthMm: 1.2 } })
  expect(screen.queryByText('This device could not write to its own storage.')).toBeNull()
})

test('[F4] undo takes the last answer back and returns to its check', async () => {
  const bay = await aBegunBay()
  bay.open(`/bay/car/${bay.car}/front`)
  await bay.press('Seen so')
  expect(await screen.findByText('Saved: brakes.pads: ok')).toBeVisible()
  expect(prompt()).toBe('wheels.nuts in order')

  await bay.press('Undo')
  expect(await saved(bay, 'brakes.pads', 2)).toMatchObject({ outcome: 'unseen' })
  await waitFor(() => expect(prompt()).toBe('brakes.pads in order'))
  expect(bay.state().checks.get('brakes.pads')?.standing).toBe('not-seen')
  expect(screen.queryByRole('button', { name: 'Undo' })).toBeNull()
})

test('closing a place does not close the way back: undo is still there at the next place', async () => {
  const bay = await aBegunBay()
  for (const check of ['brakes.pads', 'wheels.nuts.front', 'wheels.tread']) await finds(bay.phone.day, bay.car, check, 'ok')
  await atTheRest(bay)
  await bay.press(/seen, nothing found$/)
  expect(await screen.findByRole('heading', { level: 2, name: /^Rear/ })).toBeVisible()

  await bay.press('Undo')
  expect(await saved(bay, 'body.mirror', 2)).toMatchObject({ outcome: 'unseen' })
  expect(await screen.findByRole('button', { name: 'Front: seat.mounts, body.mirror seen, nothing found' })).toBeVisible()
})

test('a walk that was interrupted reopens at the very check, with what was typed, and says how long it is', async () => {
  const bay = await aBegunBay()
  bay.open(`/bay/car/${bay.car}/front`)
  await pick(bay, /wheels\.tread$/)
  await bay.user.type(screen.getByRole('textbox', { name: /tread depth/ }), '1.7')
  cleanup()
  bay.paddock.time.now += 6 * 60_000

  bay.open()
  await bay.press('Go on: Front, you were here 6 min ago')
  expect(prompt()).toBe('wheels.tread in order')
  expect(screen.getByText('You were here, 6 min ago.')).toBeVisible()
  expect(screen.getByRole('button', { name: /^tread depth/ })).toHaveTextContent('1.7')
})

test('a skipped check leaves a hole that everybody sees', async () => {
  const bay = await aBegunBay()
  for (const check of ['wheels.nuts.front', 'wheels.tread', 'seat.mounts', 'body.mirror']) await finds(bay.phone.day, bay.car, check, 'ok')
  bay.open()
  expect(await screen.findByRole('button', { name: 'Front 1 to see' })).toBeVisible()
  await bay.press('Go on: Front')
  expect(prompt()).toBe('brakes.pads in order')
})

test('[F2] two who differ are both shown, with who, when and why, and neither is an answer', async () => {
  const bay = await aBegunBay()
  const other = await bay.paddock.phone(['scrutineer'])
  await other.day.loadDay()
  await presents(other.day, bay.car)
  await finds(other.day, bay.car, 'brakes.pads', 'fail', { reason: 'other' })
  await finds(bay.phone.day, bay.car, 'brakes.pads', 'ok')
  await other.day.drain()
  await bay.phone.day.drain()

  bay.open(`/bay/car/${bay.car}/front`)
  await pick(bay, /brakes\.pads$/)
  expect(screen.getByText(/^Two looks differ\./)).toBeVisible()
  expect(screen.getByText('07:30 ok, Crew 1.1')).toBeVisible()
  expect(screen.getByText('07:30 fail, Crew 2.1: anything else')).toBeVisible()
  expect(bay.state()).toMatchObject({ verdict: 'not passed' })

  // A new look that names both ends it.
  await bay.press('Seen so')
  await waitFor(() => expect(bay.state().checks.get('brakes.pads')).toMatchObject({ standing: 'ok', disagreement: false }))
})

test('a helper alone may record what is wrong, and is told why an ok is not theirs', async () => {
  const bay = await aBegunBay({ roles: ['helper'] })
  bay.open(`/bay/car/${bay.car}/front`)
  await bay.press('Seen so')
  expect(await screen.findByText('Whoever is unlocked here may not record this.')).toBeVisible()
  expect(bay.findings('brakes.pads')).toEqual([])
  await bay.press('Could not see')
  expect(await saved(bay, 'brakes.pads')).toMatchObject({ outcome: 'could-not-see' })
})
