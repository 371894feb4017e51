import { expect, test } from 'vitest'
import { bayOrder, type Bay, type CarToCall } from '@/lib/planning/bay-order'

const at = (hours: number, minutes = 0) => Date.UTC(2026, 4, 9, hours, minutes)
const span = (from: number, to: number) => ({ from, to })
const BAY: Bay = { opensAt: at(7, 30), lanes: 2, holes: [], windowMin: 15 }

function cars(group: string, count: number, given: Partial<CarToCall> = {}): CarToCall[] {
  return Array.from({ length: count }, (_, index) => ({ entry: `${group}${index + 1}`, group, isDoubtful: false, minutes: 5, ...given }))
}

const A = { group: 'A', firstSessionAt: at(9) }
const B = { group: 'B', firstSessionAt: at(9, 20) }

test('the group that runs first is called first, whatever order the groups stand in', () => {
  const { windows } = bayOrder([...cars('B', 3), ...cars('A', 3)], [B, A], BAY)
  expect(windows.map(({ group }) => group)).toEqual(['A', 'B'])
})

test('doubtful cars of a group come first, so that they can still be mended', () => {
  const [first, second, third] = cars('A', 3)
  const { windows } = bayOrder([first, second, { ...third, isDoubtful: true }] as CarToCall[], [A], BAY)
  expect(windows[0]?.entries).toEqual(['A3', 'A1', 'A2'])
})

test('a window holds 85 % of what the lanes can do, the very first one two more', () => {
  const { windows } = bayOrder(cars('A', 14), [A], BAY)
  // 15 min × 2 lanes × 0.85 = 25.5 min: five cars of 5 min.
  expect(windows.map(({ entries }) => entries.length)).toEqual([7, 5, 2])
  expect(windows.map(({ from, to }) => [from, to])).toEqual([
    [at(7, 30), at(7, 45)],
    [at(7, 45), at(8)],
    [at(8), at(8, 15)],
  ])
})

test('nobody is called into the briefing: a window ends before it and the next begins after it', () => {
  const { windows } = bayOrder(cars('A', 12), [A], { ...BAY, holes: [span(at(7, 40), at(8, 10))] })
  expect(windows.map(({ from, to }) => [from, to])).toEqual([
    [at(7, 30), at(7, 40)],
    [at(8, 10), at(8, 25)],
    [at(8, 25), at(8, 40)],
  ])
})

test('a stretch too short to come for is left out', () => {
  const { windows } = bayOrder(cars('A', 1), [A], { ...BAY, holes: [span(at(7, 33), at(8))] })
  expect(windows.map(({ from }) => from)).toEqual([at(8)])
})

test('a bay that opens inside the curfew calls nobody before it ends', () => {
  const { windows } = bayOrder(cars('A', 1), [A], { ...BAY, holes: [span(at(7), at(7, 45)), span(at(7, 45), at(8))] })
  expect(windows[0]?.from).toBe(at(8))
})

test('cars that come after their own first session say so', () => {
  const { windows } = bayOrder(cars('A', 60), [A], BAY)
  expect(windows.filter(({ isLate }) => isLate).length).toBeGreaterThan(0)
  expect(windows.every(({ isLate, to }) => isLate === to > at(9))).toBe(true)
})

test('a car longer than a window has one all the same, and each car is called exactly once', () => {
  const all = [...cars('A', 3, { minutes: 40 }), ...cars('B', 9)]
  const { windows } = bayOrder(all, [A, B], BAY)
  expect(windows.flatMap(({ entries }) => entries).sort()).toEqual(all.map(({ entry }) => entry).sort())
  expect(windows.every(({ entries }) => entries.length > 0)).toBe(true)
})

test('late arrivals have a window too', () => {
  const { windows, lateWindow } = bayOrder(cars('A', 3), [A, B], BAY)
  expect(lateWindow).toEqual({ from: windows.at(-1)?.to, to: at(10, 20) })
  expect(bayOrder([], [A], BAY).lateWindow).toBeNull()
})
