import { render, screen } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { useState } from 'react'
import { expect, test } from 'vitest'
import { Keypad } from '@/app/_ui/keypad'
import { FIGURE_KEYS, TextKeys } from '@/app/_ui/text-keys'

function Pad(props: { readonly allowsNegative?: boolean; readonly maxLength?: number }) {
  const [value, setValue] = useState('')
  return <Keypad label="Thinner pad" unit="mm" value={value} onChange={setValue} judgement={`read ${value}`} {...props} />
}

async function press(...names: readonly string[]) {
  for (const name of names) await userEvent.click(screen.getByRole('button', { name }))
}

test('what is pressed is judged at each keystroke, as typed', async () => {
  render(<Pad />)

  await press('2', 'Decimal point', '6')

  expect(screen.getByLabelText('Thinner pad, mm')).toHaveValue('2.6')
  expect(screen.getByText('read 2.6')).toBeInTheDocument()
})

test('a second point is not taken, a point in front stands after a nought, and the last digit can be taken back', async () => {
  render(<Pad />)

  await press('Decimal point', '5', 'Decimal point', '7', 'Take back the last digit')

  expect(screen.getByLabelText('Thinner pad, mm')).toHaveValue('0.5')
})

test('a keyboard types into the same value: a comma is a point, letters are not taken', async () => {
  render(<Pad allowsNegative />)

  await userEvent.type(screen.getByLabelText('Thinner pad, mm'), '-1,5mm')

  expect(screen.getByLabelText('Thinner pad, mm')).toHaveValue('-1.5')
})

test('more digits than a measurement has are not taken', async () => {
  render(<Pad maxLength={3} />)

  await press('1', '2', '3', '4')

  expect(screen.getByLabelText('Thinner pad, mm')).toHaveValue('123')
})

test('keys for a date code take only what is on them', async () => {
  function Week() {
    const [value, setValue] = useState('')
    return <TextKeys label="Date code" value={value} onChange={setValue} keys={FIGURE_KEYS} maxLength={4} />
  }
  render(<Week />)

  await userEvent.type(screen.getByLabelText('Date code'), 'DOT 14x')
  await press('1', '9', '9')

  expect(screen.getByLabelText('Date code')).toHaveValue('1419')
})
