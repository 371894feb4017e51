import { screen, within } from '@testing-library/react'
import { expect, test } from 'vitest'
import { finds, presents, seesAll } from '../support/sync-walk'
import { aBay, aBegunBay, type Bay } from './a-bay'

async function types(bay: Bay, text: string): Promise<void> {
  const input = screen.getByRole('textbox', { name: 'Number, plate or code on the sticker' })
  await bay.user.clear(input)
  await bay.user.type(input, text)
}

const found = () =>
  within(screen.getByRole('main'))
    .queryAllByRole('listitem')
    .map((row) => row.textContent ?? '')

test.each([
  ['its number', '48'],
  ['its plate as written', 'OT12 KLM'],
  ['its plate without the gap, in small letters', 'ot12klm'],
  ['a part of its plate', '12k'],
])('a car is found by %s', async (_, text) => {
  const bay = await aBay()
  bay.open('/bay')
  await types(bay, text)
  expect(found()).toHaveLength(1)
  expect(found()[0]).toContain('48')
  await bay.user.keyboard('{Enter}')
  expect(await screen.findByRole('heading', { level: 1, name: '48' })).toBeVisible()
})

test('a car is found by the code typed off its sticker', async () => {
  const bay = await aBegunBay()
  await seesAll(bay.phone.day, bay.car)
  const { typedCode } = await bay.phone.day.issuePass({ entry: bay.car, passengerSeatUsable: false })
  bay.open('/bay')
  await types(bay, typedCode.toLowerCase())
  expect(found()).toHaveLength(1)
  expect(found()[0]).toContain('47')
})

test('a number that begins so comes after the number itself', async () => {
  const bay = await aBay()
  bay.open('/bay')
  await types(bay, '4')
  expect(found().map((row) => row.slice(0, 2))).toEqual(['47', '48'])
})

test('nothing that fits is said in words, and what to do', async () => {
  const bay = await aBay()
  bay.open('/bay')
  await types(bay, '999')
  expect(found()).toEqual([])
  expect(screen.getByText('No car with this number, plate or code')).toBeVisible()
  await types(bay, '-')
  expect(found()).toEqual([])
})

test('with nothing typed the cars that are begun and not finished are listed', async () => {
  const bay = await aBay()
  bay.open('/bay')
  expect(screen.getByText('No car is half done')).toBeVisible()
  await presents(bay.phone.day, bay.car)
  await finds(bay.phone.day, bay.car, 'brakes.pads', 'ok')
  expect(await screen.findByText('in progress')).toBeVisible()
  expect(found()).toHaveLength(1)
})

test('an address that leads to no car says where to go', async () => {
  const bay = await aBay()
  bay.open('/bay/car/nobody')
  await bay.press('Find a car')
  expect(await screen.findByRole('heading', { name: 'Find a car' })).toBeVisible()
})
