import { screen } from '@testing-library/react'
import { expect, test } from 'vitest'
import { aBegunBay, aHarnessBay, pick, saved } from './a-bay'

test('a shoulder strap that runs 250 mm back and drops 300 mm reads 50.2° beside its limit, and ok cannot be pressed', async () => {
  const bay = await aHarnessBay()
  bay.open(`/bay/car/${bay.car}/cabin`)
  await pick(bay, /shoulder angle$/)

  await bay.user.type(screen.getByRole('textbox', { name: 'Level run back to the anchor, mm' }), '250')
  await bay.press('Next value')
  await bay.user.type(screen.getByRole('textbox', { name: /^Drop to the anchor/ }), '300')

  expect(screen.getByText('50.2° is 5.2° over the limit of 45°.')).toBeVisible()
  expect(screen.getByRole('button', { name: 'Seen so' })).toBeDisabled()
  expect(screen.getByRole('button', { name: 'Advisory' })).toBeDisabled()

  await bay.press('Done')
  expect(screen.getByText('50.2° is 5.2° over the limit of 45°.')).toBeVisible()
  await bay.press('Not so')
  await bay.press('Pulls down too steeply')
  await bay.press('No photograph can be taken')
  expect(await saved(bay, 'harness.shoulder-angle')).toMatchObject({
    outcome: 'fail',
    reason: 'steep',
    measured: { runMm: 250, dropMm: 300 },
    judgement: { outcome: 'fail', code: 'shoulder-angle.over-limit' },
  })
})

test('a value is judged at each keystroke, on the keypad for gloves as by keyboard', async () => {
  const bay = await aBegunBay()
  bay.open(`/bay/car/${bay.car}/front`)
  await pick(bay, /wheels\.tread$/)
  expect(screen.getByRole('button', { name: 'Seen so' })).toBeDisabled()

  await bay.press('1')
  expect(screen.getByRole('button', { name: 'Seen so' })).toBeDisabled()
  await bay.press('5')
  expect(screen.getByRole('button', { name: 'Seen so' })).toBeEnabled()
})

test('between the limits the mild answer is an advisory, and asks its reason', async () => {
  const bay = await aBegunBay()
  bay.open(`/bay/car/${bay.car}/front`)
  await pick(bay, /wheels\.tread$/)
  await bay.user.type(screen.getByRole('textbox', { name: /tread depth/ }), '1,8')
  expect(screen.queryByRole('button', { name: 'Seen so' })).toBeNull()

  await bay.press('May run, with a note')
  await bay.press('anything else')
  // “Anything else” wants words: nothing is saved without.
  expect(bay.findings('wheels.tread')).toEqual([])
  await bay.user.type(screen.getByRole('textbox', { name: /In your own words/ }), 'wears on the inside')
  await bay.press('anything else')

  const finding = await saved(bay, 'wheels.tread')
  expect(finding).toMatchObject({ outcome: 'advisory', measured: { depthMm: 1.8 }, reason: 'other' })
  expect(bay.phone.day.note(finding.notes?.[0] ?? '')).toBe('wears on the inside')
})

test('a value that cannot be is named with what can be, and is no ok', async () => {
  const bay = await aBegunBay()
  bay.open(`/bay/car/${bay.car}/front`)
  await pick(bay, /wheels\.tread$/)
  await bay.user.type(screen.getByRole('textbox', { name: /tread depth/ }), '31')
  expect(screen.getByText('tread depth: a number from 0 to 20 mm.')).toBeVisible()
  expect(screen.getByRole('button', { name: 'Seen so' })).toBeDisabled()
})

test('could not see is one press, and never passes a required check', async () => {
  const bay = await aBegunBay()
  bay.open(`/bay/car/${bay.car}/front`)
  await bay.press('Could not see')
  expect(await saved(bay, 'brakes.pads')).toMatchObject({ outcome: 'could-not-see' })
  expect(bay.state().checks.get('brakes.pads')?.standing).toBe('could-not-see')
  expect(bay.state().open).toContain('brakes.pads')
})
