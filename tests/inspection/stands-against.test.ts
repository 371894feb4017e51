import { expect, test } from 'vitest'
import { foldSubject } from '@/lib/inspection/fold-subject'
import type { LogEntry } from '@/lib/inspection/log-entry'
import { rulingChoices } from '@/lib/inspection/ruling-choices'
import { lastSessionOver, nextWholeSession, sessionsOf, sessionToEnd } from '@/lib/inspection/sessions'
import { standsAgainst } from '@/lib/inspection/stands-against'
import { CAR_KEY, CREW, GROUP_A, allOk, context, day, finding, hold, lifted, presented, recall } from '../support/paddock'

const against = (...records: readonly LogEntry[]) => standsAgainst(records, CAR_KEY, foldSubject(records, CAR_KEY, context()))
const AFTER_1 = { when: 'session-over', group: GROUP_A, session: 1 } as const
const OVER_1 = { what: 'session-over', group: GROUP_A, session: 1 } as const

test('a hold stands until it is answered, and then says who saw the last of it', () => {
  const stop = hold({ stations: ['brakes'], at: 10 })
  expect(against(presented(), stop)).toMatchObject([{ kind: 'hold', state: 'standing', at: 10, ending: null }])

  const look = finding('brakes.pads', 'ok', { answers: [stop], at: 20, actor: CREW.ben })
  expect(against(presented(), stop, look)).toMatchObject([
    { state: 'ended', block: null, ending: { how: 'seen', at: 20, actor: CREW.ben } },
  ])
})

test('a hold that was lifted says by whom and why', () => {
  const stop = hold()
  expect(against(presented(), stop, lifted([stop]))).toMatchObject([
    { state: 'ended', ending: { how: 'lifted', actor: CREW.chief, why: 'seen by the chief' } },
  ])
})

test('a lift without the right to lift ends nothing', () => {
  const stop = hold()
  expect(against(presented(), stop, lifted([stop], { quarantined: 'wrong-role' }))).toMatchObject([{ state: 'standing' }])
})

test('[F13] a recall waits, stands once due, and has ended once seen', () => {
  const later = recall(AFTER_1, { stations: ['brakes'] })
  expect(against(presented(), later)).toMatchObject([{ kind: 'recall', state: 'waiting', ending: null }])
  const over = day(OVER_1)
  expect(against(presented(), later, over)).toMatchObject([{ state: 'standing' }])
  const look = finding('brakes.pads', 'ok', { answers: [later] })
  expect(against(presented(), later, over, look)).toMatchObject([{ state: 'ended', ending: { how: 'seen' } }])
})

test('a recall lifted before it was due has ended', () => {
  const later = recall(AFTER_1, { stations: ['brakes'] })
  expect(against(presented(), later, lifted([later]))).toMatchObject([{ state: 'ended', ending: { how: 'lifted' } }])
})

test('wet stands against the cars it touches, and says nothing of the others', () => {
  const wet = day({ what: 'wet', on: true })
  expect(against(presented({ facts: { cage: false, slicks: true } }), ...allOk(), wet)).toMatchObject([{ kind: 'wet', state: 'standing' }])
  expect(against(presented(), ...allOk(), wet)).toEqual([])
  const dry = day({ what: 'wet', on: false }, { basis: [wet] })
  expect(against(presented({ facts: { cage: false, slicks: true } }), wet, dry)).toMatchObject([{ state: 'ended', ending: { how: 'dry' } }])
})

test('newest first', () => {
  const [early, late] = [hold({ at: 10 }), hold({ at: 20 })]
  expect(against(early, late).map(({ hash }) => hash)).toEqual([late.hash, early.hash])
})

const choicesOf = (...records: readonly LogEntry[]) => rulingChoices(records, foldSubject(records, CAR_KEY, context()), 'seat.mounts')

test('[F4] a ruling may say what the mildest who disagrees said, and anything more severe', () => {
  const [ok, advisory, fail] = [finding('seat.mounts', 'ok'), finding('seat.mounts', 'advisory'), finding('seat.mounts', 'fail')]
  expect(choicesOf(presented(), ok, fail)).toEqual(['ok', 'advisory', 'could-not-see', 'fail'])
  expect(choicesOf(presented(), advisory, fail)).toEqual(['advisory', 'could-not-see', 'fail'])
})

test('[F4] nobody disagrees who looked knowing the other: nothing to rule on', () => {
  const ok = finding('seat.mounts', 'ok')
  const fail = finding('seat.mounts', 'fail', { basis: [ok] })
  expect(choicesOf(presented(), ok, fail)).toEqual([])
  expect(choicesOf(presented(), ok)).toEqual([])
  expect(choicesOf(presented())).toEqual([])
})

test('[F4] a fail worked out from values leaves no choice but fail', () => {
  const judgement = { outcome: 'fail' as const, code: 'seat.bolt', facts: {} }
  expect(choicesOf(presented(), finding('seat.mounts', 'ok'), finding('seat.mounts', 'fail', { judgement }))).toEqual(['fail'])
})

const HOUR = 3_600_000
const session = (count: number, startsAt: number, group = GROUP_A) => ({
  kind: 'session',
  group,
  session: count,
  startsAt,
  endsAt: startsAt + HOUR / 3,
})
const TIMETABLE = [
  { kind: 'briefing', group: null, session: null, startsAt: 0, endsAt: HOUR },
  session(2, 10 * HOUR),
  session(1, 9 * HOUR),
  session(1, 8 * HOUR, 'another'),
]

test('a group’s sessions are its own, in their order', () => {
  expect(sessionsOf(TIMETABLE, GROUP_A).map((one) => one.session)).toEqual([1, 2])
})

test('the session that ends next is the one after the last said to be over, whatever the clock says', () => {
  expect([lastSessionOver([], GROUP_A), sessionToEnd([], GROUP_A)]).toEqual([0, 1])
  expect(sessionToEnd([day(OVER_1)], GROUP_A)).toBe(2)
  expect(sessionToEnd([day({ ...OVER_1, group: CREW.asha })], GROUP_A)).toBe(1)
})

test.each([
  ['before the first session', 8 * HOUR, [], 1],
  ['in the middle of the first', 9 * HOUR + 1, [], 2],
  ['before the first, said over all the same', 8 * HOUR, [day(OVER_1)], 2],
  ['after the last of the timetable', 12 * HOUR, [day(OVER_1)], 2],
  ['at the very start of the first: it can no longer be run whole', 9 * HOUR, [], 2],
])('the next whole session, %s', (_, now, said, next) => {
  expect(nextWholeSession(said, TIMETABLE, GROUP_A, now)).toBe(next)
})
