import { expect, test } from 'vitest'
import { ownPath } from '@/lib/accounts/own-path'

test.each(['/', '/bay', '/events/x/board', '/events/x/entries?sort=plate', '/entries/a%20b'])('%j is a path of ours', (next) => {
  expect(ownPath(next)).toBe(next)
})

test.each([
  'https://elsewhere.example/',
  '//elsewhere.example/',
  '/\\elsewhere.example',
  '/\t/elsewhere.example',
  '/.//elsewhere.example',
  '\\\\elsewhere.example',
  'javascript:alert(1)',
  'bay',
  '',
  '/api/sign-out',
  `/${'x'.repeat(600)}`,
  undefined,
  ['/bay', '/bay'],
])('%j leads nowhere', (next) => {
  expect(ownPath(next)).toBeNull()
})
