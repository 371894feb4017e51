import { expect, test } from 'vitest'
import { nextTry } from '@/lib/mail/next-try'

const MINUTE = 60_000
const waits = (random: number) => Array.from({ length: 18 }, (_, index) => nextTry(index + 1, random) ?? 0)

test.each([
  [1, 1],
  [2, 2],
  [7, 64],
  [8, 120],
  [18, 120],
])('after %i failed tries it waits %i minutes, a quarter more or less', (tries, minutes) => {
  expect(nextTry(tries, 0.5)).toBe(minutes * MINUTE)
  expect(nextTry(tries, 0)).toBe(minutes * MINUTE * 0.75)
  expect(nextTry(tries, 1)).toBe(minutes * MINUTE * 1.25)
})

test('it is given up after about a day: 18 waits, 24 hours in the middle, and then none', () => {
  const hours = waits(0.5).reduce((sum, wait) => sum + wait, 0) / (60 * MINUTE)
  expect(hours).toBeGreaterThan(23)
  expect(hours).toBeLessThan(25)
  expect(nextTry(19, 0.5)).toBeNull()
})
