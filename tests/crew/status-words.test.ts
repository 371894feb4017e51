import { expect, test } from 'vitest'
import { statusWords } from '@/app/_crew/status-words'
import type { DayStatus } from '@/lib/sync/client/day-client'

const at = (hours: number, minutes: number) => Date.UTC(2026, 4, 9, hours, minutes)

function aStatus(given: Partial<DayStatus> = {}): DayStatus {
  return {
    event: null,
    device: { id: 'd', name: 'tablet', kid: 1 },
    day: '2026-05-09',
    loaded: true,
    unlocked: null,
    unsent: 0,
    unsentSince: null,
    photosUnsent: 0,
    needsAttention: 0,
    lastPullAt: at(7, 12),
    lastPushAt: null,
    seq: 1,
    listMadeAt: null,
    clockOffset: 0,
    clockWentBackwards: false,
    link: 'live',
    busy: null,
    storage: { leftBytes: null, persisted: null },
    problem: null,
    ...given,
  }
}

test.each([
  ['all is well', {}, 'in step · all sent'],
  ['no live line', { link: 'polling' }, 'last heard 07:12 · all sent'],
  ['no network', { link: 'offline', unsent: 14, unsentSince: at(7, 20) }, 'offline since 07:12 · 14 to send'],
  ['something is stuck longer', { link: 'offline', unsent: 14, unsentSince: at(7, 5) }, 'offline since 07:12 · 14 to send since 07:05'],
  ['a line, and yet not sent', { unsent: 2, unsentSince: at(7, 20) }, 'in step · 2 to send since 07:20'],
  ['never heard, and no network', { link: 'offline', lastPullAt: null }, 'offline · all sent'],
  ['the records are through, two photographs are not', { photosUnsent: 2 }, 'in step · 2 photographs to send'],
  [
    'records and a photograph wait',
    { link: 'offline', unsent: 14, unsentSince: at(7, 5), photosUnsent: 1 },
    'offline since 07:12 · 14 and 1 photograph to send since 07:05',
  ],
  ['not asked yet', { link: 'polling', lastPullAt: null }, 'not heard from the server yet · all sent'],
] as const)('the strip says what waits to be sent and since when: %s', (_, given, words) => {
  expect(statusWords(aStatus(given), 'UTC')).toBe(words)
})

test('times are the venue’s, by the corrected clock: a phone ten minutes fast says what the wall says', () => {
  const status = aStatus({ link: 'polling', lastPullAt: at(7, 22), clockOffset: -600_000 })
  expect(statusWords(status, 'Europe/London')).toBe('last heard 08:12 · all sent')
})
