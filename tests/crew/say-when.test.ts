import { expect, test } from 'vitest'
import { ago, clockTime, dayWords } from '@/app/_crew/say-when'

test.each([
  [0, 'just now'],
  [59_999, 'just now'],
  [60_000, '1 min ago'],
  [3_599_999, '59 min ago'],
  [3_600_000, '1 h ago'],
  [3 * 3_600_000 + 1, '3 h ago'],
])('%i ms are told as “%s”', (ms, words) => expect(ago(ms)).toBe(words))

test('midnight is 00, and the time is that of the venue', () => {
  expect(clockTime(Date.UTC(2026, 0, 9), 'UTC')).toBe('00:00')
  expect(clockTime(Date.UTC(2026, 4, 9, 6, 40), 'Europe/London')).toBe('07:40')
})

test('a day is told so that nobody mistakes it, and what is no day is not guessed', () => {
  expect(dayWords('2026-05-09')).toBe('Sat 9 May 2026')
  expect(() => dayWords('2026-02-30')).toThrow()
})
