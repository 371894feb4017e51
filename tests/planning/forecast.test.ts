import { expect, test } from 'vitest'
import { forecast, paceOf } from '@/lib/planning/forecast'
import { afterWorking, nextWorking, workingMinutes, workingSpans } from '@/lib/planning/working-time'

const at = (hours: number, minutes = 0) => Date.UTC(2026, 4, 9, hours, minutes)
const OPENS = at(7, 30)
/** Every so many minutes from the opening on. */
const every = (minutes: number, count: number) => Array.from({ length: count }, (_, index) => OPENS + (index + 1) * minutes * 60_000)
const BRIEFING = [{ from: at(8, 15), to: at(8, 30) }]

test('two cars are no pace', () => {
  expect(paceOf(every(2, 2), OPENS, at(8), [])).toBeNull()
})

test('a car every two minutes is thirty an hour', () => {
  expect(paceOf(every(2, 15), OPENS, at(8), [])).toBeCloseTo(30)
})

test('the briefing does not slow the pace', () => {
  const done = [...every(2, 22), at(8, 31), at(8, 33)]
  expect(paceOf(done, OPENS, at(8, 34), BRIEFING)).toBeGreaterThan(25)
})

test('a bay that stands still gets slower with each minute', () => {
  const soon = paceOf(every(2, 15), OPENS, at(8, 5), []) ?? 0
  const later = paceOf(every(2, 15), OPENS, at(8, 30), []) ?? 0
  expect(later).toBeLessThan(soon)
})

test('each group is through when those before it are: at its pace, against its own first session', () => {
  const groups = [
    { group: 'B', doneAt: [], toGo: 30, firstSessionAt: at(9, 20) },
    { group: 'A', doneAt: every(2, 15), toGo: 15, firstSessionAt: at(9) },
  ]
  const said = forecast(groups, OPENS, at(8), [])
  expect(said).toMatchObject([
    { group: 'B', done: 0, toGo: 30, lastAt: at(9, 30), is: 'late' },
    { group: 'A', done: 15, toGo: 15, lastAt: at(8, 30), is: 'in time' },
  ])
})

test('what is left after the briefing is through after the briefing', () => {
  const [group] = forecast([{ group: 'A', doneAt: every(2, 15), toGo: 15, firstSessionAt: at(9) }], OPENS, at(8), BRIEFING)
  expect(group?.lastAt).toBe(at(8, 45))
})

test('nothing is foretold from too little, nothing of what is through, and without a session nothing is late', () => {
  const groups = [
    { group: 'A', doneAt: [at(7, 40)], toGo: 3, firstSessionAt: at(9) },
    { group: 'B', doneAt: [at(7, 50)], toGo: 0, firstSessionAt: at(9) },
    { group: 'C', doneAt: [], toGo: 400, firstSessionAt: null },
  ]
  expect(forecast(groups, OPENS, at(8), []).map(({ is }) => is)).toEqual(['too early to say', 'all through', 'too early to say'])
  const running = [{ ...groups[0], doneAt: every(2, 10) }, groups[1], groups[2]] as typeof groups
  expect(forecast(running, OPENS, at(8), []).map(({ is }) => is)).toEqual(['in time', 'all through', 'in time'])
})

test.each([
  ['no hole', [], 60],
  ['one in the middle', [{ from: at(8), to: at(8, 10) }], 50],
  [
    'two that overlap',
    [
      { from: at(8), to: at(8, 10) },
      { from: at(8, 5), to: at(8, 20) },
    ],
    40,
  ],
  ['one that sticks out', [{ from: at(7), to: at(7, 45) }], 45],
  ['one that is the whole', [{ from: at(7), to: at(9) }], 0],
  ['one turned round', [{ from: at(8, 10), to: at(8) }], 60],
])('working minutes of an hour with %s', (_, holes, minutes) => {
  expect(workingMinutes({ from: OPENS, to: at(8, 30) }, holes)).toBe(minutes)
  expect(workingSpans({ from: OPENS, to: at(8, 30) }, holes).every(({ from, to }) => to > from)).toBe(true)
})

test('working time goes on after a hole, and begins after one', () => {
  expect(afterWorking(at(8), 20, BRIEFING)).toBe(at(8, 35))
  expect(afterWorking(at(8, 20), 5, BRIEFING)).toBe(at(8, 35))
  expect(afterWorking(at(8), 15, BRIEFING)).toBe(at(8, 15))
  expect(nextWorking(at(8, 20), BRIEFING)).toBe(at(8, 30))
  expect(nextWorking(at(8), BRIEFING)).toBe(at(8))
})
