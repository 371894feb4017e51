import { expect, test } from 'vitest'
import { forecastWords } from '@/app/(organiser)/events/[event]/board/_board/forecast-words'
import { firstSessionOn, forecastOf, holesOf, morningOf, type TimetableLine } from '@/lib/board/forecast-of'
import { foldSubject } from '@/lib/inspection/fold-subject'
import { allOk, CAR_KEY, context, pass, presented, SATURDAY, SUNDAY } from '../support/paddock'

const at = (hours: number, minutes = 0) => Date.UTC(2026, 4, 9, hours, minutes)
const line = (given: Partial<TimetableLine>): TimetableLine => ({
  day: SATURDAY,
  kind: 'session',
  group: 'a',
  startsAt: at(9),
  endsAt: at(9, 20),
  ...given,
})

test('a group’s first session is the earliest of its own on that day', () => {
  const timetable = [line({ startsAt: at(11) }), line({}), line({ group: 'b', startsAt: at(8) }), line({ day: SUNDAY, startsAt: at(7) })]
  expect(firstSessionOn(SATURDAY, 'a', timetable)).toBe(at(9))
  expect(firstSessionOn(SATURDAY, 'c', timetable)).toBeNull()
})

test('the bay stands still for what is everybody’s, and not for one group’s briefing', () => {
  const timetable = [line({}), line({ kind: 'briefing', group: null, startsAt: at(8), endsAt: at(8, 15) }), line({ kind: 'briefing' })]
  expect(holesOf(timetable)).toEqual([{ from: at(8), to: at(8, 15) }])
})

test('a car is through with its first pass of the day, by the corrected clock; yesterday’s does not count', () => {
  const shown = presented()
  const looks = allOk()
  const log = [shown, ...looks, pass({ answers: [shown.hash] })]
  const state = foldSubject(log, CAR_KEY, context())
  const issued = state.passes[0]?.record
  expect(morningOf(state, 'a', SATURDAY).doneAt).toBe((issued?.at ?? 0) + (issued?.offset ?? 0))
  expect(morningOf(state, 'a', SUNDAY).doneAt).toBeNull()
})

test('the morning of two groups is told from what was passed so far', () => {
  const cars = Array.from({ length: 10 }, (_, index) => ({ group: 'a', presentedAt: at(7, 30), doneAt: at(7, 33 + 3 * index) }))
  const groups = [
    { id: 'a', entries: 15, firstSessionAt: at(9) },
    { id: 'b', entries: 20, firstSessionAt: at(9, 20) },
  ]
  const said = forecastOf(groups, cars, [], at(8))
  expect(said.get('a')).toEqual({ is: 'in time', lastAt: at(8, 15), toGo: 5 })
  expect(said.get('b')).toEqual({ is: 'in time', lastAt: at(9, 15), toGo: 20 })
  expect(forecastOf(groups, [], [], at(8)).get('a')).toEqual({ is: 'too early to say', lastAt: null, toGo: 15 })
})

test.each([
  [
    'in time',
    { entries: 38, firstSessionAt: at(9, 40), forecast: { is: 'in time', lastAt: at(9, 22), toGo: 7 } },
    ', last about 09:22, first session 09:40',
  ],
  [
    'too late',
    { entries: 38, firstSessionAt: at(9), forecast: { is: 'late', lastAt: at(9, 22), toGo: 7 } },
    ', last about 09:22, too late, first session 09:00',
  ],
  ['through', { entries: 38, firstSessionAt: null, forecast: { is: 'all through', lastAt: null, toGo: 0 } }, ', all through'],
  [
    'not known yet',
    { entries: 38, firstSessionAt: at(9), forecast: { is: 'too early to say', lastAt: null, toGo: 38 } },
    ', first session 09:00',
  ],
  ['nobody in it', { entries: 0, firstSessionAt: null, forecast: { is: 'all through', lastAt: null, toGo: 0 } }, ''],
] as const)('a group that is %s reads so', (_, group, words) => {
  expect(forecastWords(group, 'UTC')).toBe(words)
})
