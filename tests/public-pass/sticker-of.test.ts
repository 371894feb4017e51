import { expect, test } from 'vitest'
import type { PassPayload } from '@/lib/pass/pass-payload'
import type { Verdict } from '@/lib/inspection/state'
import { type Reported, stickerOf } from '@/lib/public-pass/sticker-of'

const payload: PassPayload = {
  type: 'pass',
  kid: 1,
  event: 7,
  counter: 1,
  entry: 1,
  validFrom: '2026-05-09',
  days: 2,
  conditions: false,
  passengerSeatUsable: true,
  printedAhead: false,
  number: '47',
  plateTail: '11KLM',
}

function reported(state: 'live' | 'dead' | 'quarantined', verdict: Verdict, conditions: readonly string[] = []): Reported {
  return { pass: { state, conditions }, subject: { verdict } } as unknown as Reported
}

const worth = (today: string, said: Reported | null) => stickerOf(payload, { name: 'Day', venue: 'Ring', today }, said).is

test.each([
  ['2026-05-08', 'another-day'],
  ['2026-05-09', 'valid'],
  ['2026-05-10', 'valid'],
  ['2026-05-11', 'another-day'],
])('a live pass of Saturday and Sunday is, on %s, %s', (today, is) => {
  expect(worth(today, reported('live', 'passed with advisories'))).toBe(is)
})

test.each(['dead', 'quarantined'] as const)('a %s pass is not valid on its day nor on any other', (state) => {
  expect([worth('2026-05-09', reported(state, 'passed')), worth('2026-06-01', reported(state, 'passed'))]).toEqual([
    'not-valid',
    'not-valid',
  ])
})

test.each<Verdict>(['held', 'not passed', 'withdrawn', 'in progress', 'declared only', 'not presented'])(
  'with a verdict of %s even a live pass is not valid',
  (verdict) => {
    expect(worth('2026-05-09', reported('live', verdict))).toBe('not-valid')
  },
)

test('one that the server has not heard of is never valid', () => {
  expect(worth('2026-05-09', null)).toBe('not-reported')
  expect(worth('2026-06-01', null)).toBe('another-day')
})

test('conditions come from the token or from what stands in the log', () => {
  const event = { name: 'Day', venue: 'Ring', today: '2026-05-09' }
  expect(stickerOf(payload, event, reported('live', 'passed', ['group C only']))).toMatchObject({ conditions: true, lastDay: '2026-05-10' })
  expect(stickerOf(payload, event, reported('live', 'passed'))).toMatchObject({ conditions: false })
})
