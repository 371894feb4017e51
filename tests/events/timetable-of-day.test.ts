import { expect, test } from 'vitest'
import { nextLine } from '@/app/(organiser)/events/[event]/timetable/_timetable/next-line'
import { demoTimetable } from '@/db/scenarios/demo-timetable'
import type { TimetableBlockBody } from '@/lib/contracts/events'
import { inOrder, timetableProblems } from '@/lib/events/timetable-of-day'

const GROUPS = new Set(['a', 'b', 'c'])

function line(given: Partial<TimetableBlockBody> = {}): TimetableBlockBody {
  return { kind: 'session', group: 'a', startsAt: '09:00', endsAt: '09:20', noiseLimitDb: null, ...given }
}

test.each([
  ['a session', [line()], []],
  ['one right after another', [line(), line({ group: 'b', startsAt: '09:20', endsAt: '09:40' })], []],
  ['a briefing beside a session', [line(), line({ kind: 'briefing', group: 'b' })], []],
  ['one that ends as it begins', [line({ endsAt: '09:00' })], [[0, 'endsAt']]],
  ['one that ends before it begins', [line({ endsAt: '08:00' })], [[0, 'endsAt']]],
  ['a session of everybody', [line({ group: null })], [[0, 'group']]],
  ['a group that is not there', [line({ group: 'x' })], [[0, 'group']]],
  ['two sessions on one track', [line(), line({ group: 'b', startsAt: '09:10', endsAt: '09:30' })], [[1, 'startsAt']]],
  [
    'all of it at once',
    [line({ endsAt: '08:00' }), line({ group: 'x' })],
    [
      [0, 'endsAt'],
      [1, 'group'],
    ],
  ],
] as const)('%s', (_, blocks, faults) => {
  expect(timetableProblems(blocks, GROUPS).map(({ line: at, field }) => [at, field])).toEqual(faults)
})

test('lines stand in order of time', () => {
  expect(inOrder([line({ startsAt: '11:00' }), line(), line({ startsAt: '10:00' })]).map(({ startsAt }) => startsAt)).toEqual([
    '09:00',
    '10:00',
    '11:00',
  ])
})

test('the next line is the next group’s session, as long as the last and right after it', () => {
  const groups = [{ id: 'a' }, { id: 'b' }]
  expect(nextLine([], groups)).toEqual(line())
  const long = line({ endsAt: '09:25', noiseLimitDb: 98 })
  expect(nextLine([long], groups)).toEqual(line({ group: 'b', startsAt: '09:25', endsAt: '09:50', noiseLimitDb: 98 }))
  expect(nextLine([long, line({ kind: 'break', group: null, startsAt: '12:00', endsAt: '13:00' })], groups)).toMatchObject({
    startsAt: '13:00',
    endsAt: '13:25',
  })
})

test('the demo’s own day has nothing wrong in it and a quieter last hour', () => {
  const day = demoTimetable(['a', 'b', 'c'])
  expect(timetableProblems(day, GROUPS)).toEqual([])
  expect(day.filter(({ kind }) => kind === 'session')).toHaveLength(21)
  expect(new Set(day.filter(({ startsAt }) => startsAt >= '16:00').map(({ noiseLimitDb }) => noiseLimitDb))).toEqual(new Set([92]))
})
