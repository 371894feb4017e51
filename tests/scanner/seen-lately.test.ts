import { expect, test } from 'vitest'
import { seenLately } from '@/lib/scanner/seen-lately'

test('a code held in view is told once, however long it is held', () => {
  const isNew = seenLately(2000)

  expect([0, 40, 1900, 3800, 5700].map((ms) => isNew('A', ms))).toEqual([true, false, false, false, false])
})

test('a code that was out of view for longer than the quiet time is told again', () => {
  const isNew = seenLately(2000)

  expect([isNew('A', 0), isNew('A', 2000), isNew('A', 4001)]).toEqual([true, false, true])
})

test('another code is told at once, and the first one again after it', () => {
  const isNew = seenLately(2000)

  expect([isNew('A', 0), isNew('B', 10), isNew('A', 20)]).toEqual([true, true, true])
})
