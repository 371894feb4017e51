import { expect, test } from 'vitest'
import { blockByClock, recallsByClock } from '@/lib/pass/recalls-by-clock'
import { CAR, CREW, GROUP_A, day, lifted, recall } from '../support/paddock'

const HOUR = 3_600_000
const MADE = 8 * HOUR
const session = (count: number, startsAt: number) => ({
  kind: 'session',
  group: GROUP_A,
  session: count,
  startsAt,
  endsAt: startsAt + HOUR,
})
const TIMETABLE = [session(1, 9 * HOUR), session(2, 11 * HOUR)]
const AFTER_1 = { when: 'session-over', group: GROUP_A, session: 1 } as const
const due = (records: Parameters<typeof recallsByClock>[0], now: number) =>
  recallsByClock(records, CAR, TIMETABLE, now).map(({ since }) => since)

test('[P2] a recall after a session blocks from the moment the timetable ends it', () => {
  const later = recall(AFTER_1, { stations: ['brakes'], at: MADE })
  expect(due([later], 10 * HOUR - 1)).toEqual([])
  expect(due([later], 10 * HOUR)).toEqual([10 * HOUR])
})

test('[P2] a recall at a time blocks from that time', () => {
  const later = recall({ when: 'time', at: 12 * HOUR }, { at: MADE })
  expect([due([later], 12 * HOUR - 1), due([later], 12 * HOUR)]).toEqual([[], [12 * HOUR]])
})

test('what a record has made due already is the fold’s, and the clock says nothing of it twice', () => {
  const later = recall(AFTER_1, { at: MADE })
  expect(due([later, day({ what: 'session-over', group: GROUP_A, session: 1 })], 13 * HOUR)).toEqual([])
})

test('a session that was over when the recall was made does not count, the next one does', () => {
  expect(due([recall(AFTER_1, { at: 10 * HOUR })], 11 * HOUR)).toEqual([])
  expect(due([recall(AFTER_1, { at: 10 * HOUR })], 12 * HOUR)).toEqual([12 * HOUR])
})

test('no clock knows of rain or of a passenger, and a timetable without the session says nothing', () => {
  for (const trigger of [{ when: 'wet' }, { when: 'passenger' }, { ...AFTER_1, session: 9 }, { ...AFTER_1, group: CREW.asha }] as const)
    expect(due([recall(trigger, { at: MADE })], 99 * HOUR)).toEqual([])
})

test('one that the chief lifted does not block; a lift without the right to lift does not count', () => {
  const later = recall(AFTER_1, { at: MADE })
  expect(due([later, lifted([later])], 13 * HOUR)).toEqual([])
  expect(due([later, lifted([later], { quarantined: 'wrong-role' })], 13 * HOUR)).toEqual([10 * HOUR])
})

test('[P2] a recall without the right to recall still blocks', () => {
  expect(due([recall(AFTER_1, { at: MADE, quarantined: 'wrong-role' })], 13 * HOUR)).toEqual([10 * HOUR])
})

test('the pit exit is told of it in words, about the car', () => {
  const [one] = recallsByClock([recall(AFTER_1, { at: MADE })], CAR, TIMETABLE, 13 * HOUR)
  const names = { groups: [{ id: GROUP_A, name: 'Novice' }], event: { timeZone: 'UTC' } }
  expect(one && blockByClock(one, names)).toEqual({
    about: { entry: CAR.car },
    words: 'Recall due by this device’s clock: to be shown after session 1 of Novice',
    at: 10 * HOUR,
  })
})
