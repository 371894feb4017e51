import { cleanup, screen } from '@testing-library/react'
import { expect, test } from 'vitest'
import { aBegunBay, pick, saved, type Bay } from './a-bay'

const depth = () => screen.getByRole('textbox', { name: /tread depth/ })

async function putsTreadRight(bay: Bay): Promise<void> {
  bay.open(`/bay/car/${bay.car}/front`)
  await pick(bay, /wheels\.tread$/)
  await bay.user.type(depth(), '1.2')
  await bay.press('Put right here')
  await bay.user.type(screen.getByRole('textbox', { name: /In your own words/ }), 'spare wheel on')
  await bay.press('anything else')
}

test('[F10] put right here measures anew: the state met and the state left stand in one finding', async () => {
  const bay = await aBegunBay()
  await putsTreadRight(bay)
  expect(screen.getByText('Put right here: take it anew as it is now.')).toBeVisible()
  expect(depth()).toHaveValue('')
  expect(screen.getByRole('button', { name: 'Seen again, right' })).toBeDisabled()
  expect(bay.findings('wheels.tread')).toEqual([])

  await bay.user.type(depth(), '6')
  await bay.press('Seen again, right')
  const finding = await saved(bay, 'wheels.tread')
  expect(finding).toMatchObject({
    outcome: 'ok',
    measured: { depthMm: 6 },
    found: { outcome: 'fail', values: { depthMm: 1.2 }, reason: 'other' },
  })
  expect(bay.phone.day.note(finding.notes?.[0] ?? '')).toBe('spare wheel on')
})

test('[F10] a check without a value is put right and seen again in one action, and what it disturbed is asked again', async () => {
  const bay = await aBegunBay()
  await bay.phone.day.record([{ kind: 'finding', subject: { car: bay.car }, check: 'wheels.nuts.front', outcome: 'ok' }])
  bay.open(`/bay/car/${bay.car}/front`)
  await pick(bay, /brakes\.pads$/)
  await bay.press('Put right here')
  await bay.user.type(screen.getByRole('textbox', { name: /In your own words/ }), 'new pads')
  await bay.press('anything else')

  expect(await saved(bay, 'brakes.pads')).toMatchObject({ outcome: 'ok', found: { outcome: 'fail' } })
  expect(await screen.findByRole('button', { name: /wheels\.nuts ?\(again\)$/ })).toBeVisible()
})

test('a repair outlives a reload: it is never recorded as if nothing had been wrong', async () => {
  const bay = await aBegunBay()
  await putsTreadRight(bay)
  cleanup()
  bay.open(`/bay/car/${bay.car}/front`)
  expect(screen.getByText('Put right here: take it anew as it is now.')).toBeVisible()
  await bay.user.type(depth(), '6')
  await bay.press('Seen again, right')
  expect(await saved(bay, 'wheels.tread')).toMatchObject({ found: { values: { depthMm: 1.2 } } })
})

test('what was not put right after all goes back to what was measured, and can be failed', async () => {
  const bay = await aBegunBay()
  await putsTreadRight(bay)
  await bay.user.type(depth(), '1')
  expect(screen.getByRole('button', { name: 'Seen again, right' })).toBeDisabled()
  await bay.press('It was not put right')
  expect(screen.getByRole('button', { name: /^tread depth/ })).toHaveTextContent('1.2')
  await bay.press('Not so')
  await bay.press('anything else')
  expect(await saved(bay, 'wheels.tread')).toMatchObject({ outcome: 'fail', measured: { depthMm: 1.2 } })
})
