import { expect, test } from 'vitest'
import type { OutcomeState } from '@/app/_ui/outcome-shape'
import { linkBetween, wireLinks } from '@/app/_ui/wire-links'

const bolts = (...states: readonly OutcomeState[]) => states.map((state) => ({ label: state, state }))

test.each([
  ['ok', 'ok', 'whole'],
  ['ok', 'advisory', 'whole'],
  ['na', 'ok', 'whole'],
  ['ok', 'fail', 'cut-after'],
  ['ok', 'held', 'cut-after'],
  ['fail', 'ok', 'cut-before'],
  ['fail', 'fail', 'none'],
  ['ok', 'none', 'none'],
  ['ok', 'ask', 'none'],
  ['none', 'fail', 'none'],
] as const)('between %s and %s the wire is %s', (left, right, link) => {
  expect(linkBetween(left, right)).toBe(link)
})

test('no wire passes a bolt that is not closed, wherever it stands', () => {
  const closed: readonly OutcomeState[] = ['ok', 'advisory', 'na']
  const open: readonly OutcomeState[] = ['fail', 'held', 'ask', 'none']

  for (const state of open)
    for (const other of [...closed, ...open]) {
      expect(linkBetween(state, other)).not.toBe('whole')
      expect(linkBetween(other, state)).not.toBe('whole')
    }
})

test('bolts close in any order: wire appears only between neighbours that are both closed', () => {
  expect(wireLinks(bolts('ok', 'none', 'ok', 'ok', 'fail', 'ok'))).toEqual([
    'none',
    'none',
    'none',
    'whole',
    'cut-after',
    'cut-before',
    'none',
  ])
})

test('a wire without bolts has no links to draw', () => {
  expect(wireLinks([])).toEqual(['none', 'none'])
})
