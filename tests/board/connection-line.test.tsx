import { cleanup, render, screen } from '@testing-library/react'
import { afterEach, expect, test } from 'vitest'
import { ConnectionLine } from '@/app/(organiser)/events/[event]/board/_board/connection-line'
import type { Connection } from '@/lib/board/use-board'
import type { Board } from '@/lib/contracts/board'

afterEach(cleanup)

const board: Board = {
  at: Date.UTC(2026, 4, 9, 8, 12),
  seq: 3,
  day: '2026-05-09',
  timeZone: 'Europe/London',
  stations: [],
  groups: [],
  rows: [],
}
const problem = { type: '', title: '', status: 0, what: 'W.', kept: '', todo: 'T.', issues: [], serverTime: 0 }
const show = (connection: Connection) => render(<ConnectionLine connection={connection} board={board} />)

test('live and polling are one quiet line with the venue’s time', () => {
  show({ state: 'live' })
  expect(screen.getByText(/as at 09:12/)).toHaveTextContent('Live · as at 09:12 at the venue · 3 records')
  cleanup()
  show({ state: 'polling' })
  expect(screen.getByRole('status')).toHaveTextContent('Checking every 15 s')
})

test.each(['no-network', 'not-our-server'] as const)('%s says since when, and that what is shown is from then', (code) => {
  show({ state: 'lost', problem: { ...problem, code } })
  expect(screen.getByRole('alert')).toHaveTextContent('No connection since 09:12; what you see is from then.')
})

test('a sign-in that is over leads to the sign-in', () => {
  show({ state: 'lost', problem: { ...problem, code: 'not-signed-in' } })
  expect(screen.getByRole('link', { name: 'Sign in again' })).toHaveAttribute('href', '/sign-in')
})
