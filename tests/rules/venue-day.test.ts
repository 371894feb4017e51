import { expect, test } from 'vitest'
import { civilDate } from '@/lib/rules/civil-date'
import { venueDay } from '@/lib/rules/venue-day'
import { venueInstant } from '@/lib/rules/venue-instant'

test.each([
  ['2026-05-08T22:59:59.999Z', 'Europe/London', '2026-05-08'],
  ['2026-05-08T23:00:00.000Z', 'Europe/London', '2026-05-09'],
  ['2026-12-01T23:59:59.999Z', 'Europe/London', '2026-12-01'],
  ['2026-12-01T23:00:00.000Z', 'Europe/Berlin', '2026-12-02'],
  ['2026-05-09T11:59:00.000Z', 'Pacific/Auckland', '2026-05-09'],
  ['2026-05-09T12:00:00.000Z', 'Pacific/Auckland', '2026-05-10'],
  ['2026-01-01T04:59:59.999Z', 'America/New_York', '2025-12-31'],
])('the venue day turns at midnight of the venue: %s in %s is %s', (instant, zone, day) => {
  expect(venueDay(Date.parse(instant), zone)).toBe(day)
})

test('a zone that does not exist is an error, never a day', () => {
  expect(() => venueDay(0, 'Ottermere/Ring')).toThrow(RangeError)
})

test.each([
  ['2026-05-09', '09:00', 'Europe/London', '2026-05-09T08:00:00.000Z'],
  ['2026-12-01', '09:00', 'Europe/London', '2026-12-01T09:00:00.000Z'],
  ['2026-03-29', '09:00', 'Europe/London', '2026-03-29T08:00:00.000Z'],
  ['2026-05-09', '00:10', 'Pacific/Auckland', '2026-05-08T12:10:00.000Z'],
  // An hour that comes twice: the first. An hour that is skipped: as late after the change.
  ['2026-10-25', '01:30', 'Europe/London', '2026-10-25T00:30:00.000Z'],
  ['2026-03-29', '01:30', 'Europe/London', '2026-03-29T01:30:00.000Z'],
])('clocks at the venue show %s %s in %s at %s', (day, time, zone, instant) => {
  expect(new Date(venueInstant(civilDate(day), time, zone)).toISOString()).toBe(instant)
})
