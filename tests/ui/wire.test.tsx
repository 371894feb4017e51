import { render, screen } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { expect, test, vi } from 'vitest'
import { Wire } from '@/app/_ui/wire'

const BOLTS = [
  { label: 'seat', state: 'ok' },
  { label: 'harness', state: 'advisory' },
  { label: 'brakes', state: 'fail' },
  { label: 'wheels', state: 'none' },
] as const

test.each(['strip', 'mark'] as const)('the %s is heard as the sentence and nothing else', (scale) => {
  render(<Wire scale={scale} bolts={BOLTS} sentence="2 of 4 stations ok, brakes failed, 1 to see" />)

  expect(screen.getByRole('img', { name: '2 of 4 stations ok, brakes failed, 1 to see' })).toBeInTheDocument()
})

test('the full wire names each bolt with its state, and a press says which', async () => {
  const onSelect = vi.fn()
  render(<Wire scale="full" bolts={BOLTS} sentence="2 of 4" onSelect={onSelect} current={3} />)

  await userEvent.click(screen.getByRole('button', { name: 'brakes: fail' }))

  expect(onSelect).toHaveBeenCalledExactlyOnceWith(2)
  expect(screen.getByRole('button', { name: 'wheels: not seen yet' })).toHaveAttribute('aria-current', 'step')
})

test('the mark counts what is closed, and leaves out what does not apply', () => {
  render(<Wire scale="mark" bolts={[...BOLTS, { label: 'cage', state: 'na' }]} sentence="2 of 4" />)

  expect(screen.getByText('2/4')).toBeInTheDocument()
})

test('the wire moves only when a bolt closes, not when the page opens', () => {
  const closed = [
    { label: 'seat', state: 'ok' },
    { label: 'harness', state: 'ok' },
  ] as const
  const open = [
    { label: 'seat', state: 'ok' },
    { label: 'harness', state: 'none' },
  ] as const
  const moving = (container: HTMLElement) => container.querySelectorAll('[class*=wire-threads]').length

  const first = render(<Wire scale="full" bolts={closed} sentence="2 of 2" />)
  expect(moving(first.container)).toBe(0)

  const second = render(<Wire scale="full" bolts={open} sentence="1 of 2" />)
  second.rerender(<Wire scale="full" bolts={closed} sentence="2 of 2" />)
  expect(moving(second.container)).toBe(2)
})
