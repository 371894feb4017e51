import { expect, test } from 'vitest'
import { wantsPhoto } from '@/lib/walk/wants-photo'

test.each([
  ['on-fail', 'fail', true],
  ['on-fail', 'advisory', false],
  ['on-fail', 'ok', false],
  ['on-fail', 'put-right', false],
  ['on-fail', 'could-not-see', false],
  ['always', 'fail', true],
  ['always', 'advisory', true],
  ['always', 'ok', true],
  ['always', 'put-right', true],
  ['always', 'could-not-see', false],
] as const)('a check that asks a photograph %s asks one with %s: %s', (photo, say, asked) => {
  expect(wantsPhoto({ photo }, { say })).toBe(asked)
})

test.each(['ok', 'advisory', 'fail', 'put-right', 'could-not-see'] as const)('a check that asks none asks none with %s', (say) => {
  expect(wantsPhoto({}, { say })).toBe(false)
})
