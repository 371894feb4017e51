import { expect, test } from 'vitest'
import { type CarInOrder, type DayToOrder, orderOf } from '@/lib/order/order-of'

const at = (hours: number, minutes = 0) => Date.UTC(2026, 4, 9, hours, minutes)

function cars(group: string, count: number, given: Partial<CarInOrder> = {}): CarInOrder[] {
  return Array.from({ length: count }, (_, index) => ({
    entry: `${group}-${index + 1}`,
    number: String(index + 1),
    model: 'Tarn 2',
    group,
    doubt: null,
    ...given,
  }))
}

function aDay(given: Partial<DayToOrder> = {}): DayToOrder {
  return {
    day: '2026-05-09',
    days: ['2026-05-09', '2026-05-10'],
    timeZone: 'UTC',
    opensAt: at(7, 30),
    plan: { day: '2026-05-09', opensAt: '07:30', lanes: 4, windowMin: 15, carMin: 5, carSdMin: 2 },
    isPlanned: true,
    publishedAt: null,
    groups: [
      { id: 'a', name: 'A', firstSessionAt: at(9) },
      { id: 'b', name: 'B', firstSessionAt: at(9, 20) },
      { id: 'c', name: 'C', firstSessionAt: null },
    ],
    cars: [...cars('a', 40), ...cars('b', 20), ...cars('c', 2)],
    holes: [{ kind: 'briefing', from: at(8, 15), to: at(8, 30) }],
    told: new Map(),
    ...given,
  }
}

test('a group counts on all that are called before it, in working minutes without the briefing', () => {
  const { groups } = orderOf(aDay())
  expect(groups).toMatchObject([
    { id: 'a', cars: 40, carsBefore: 40, workingMin: 75, peopleAtLeast: 3, peopleNeeded: 4 },
    { id: 'b', cars: 20, carsBefore: 60, workingMin: 95, peopleAtLeast: 4, peopleNeeded: 4 },
    { id: 'c', cars: 2, carsBefore: 2, workingMin: null, peopleAtLeast: null, peopleNeeded: null },
  ])
})

test('a doubtful car says why and comes first of its group', () => {
  const doubtful = cars('a', 1, { entry: 'odd', number: '99', doubt: 'would not be passed' })
  const order = orderOf(aDay({ cars: [...cars('a', 3), ...doubtful] }))
  expect(order.windows[0]?.cars.map(({ number, doubt }) => [number, doubt])).toEqual([
    ['99', 'would not be passed'],
    ['1', null],
    ['2', null],
    ['3', null],
  ])
  expect(order.groups[0]).toMatchObject({ cars: 4, doubtful: 1 })
})

test('what was told and what would be told now are compared car by car', () => {
  const day = aDay({ cars: cars('a', 3) })
  const [window] = orderOf(day).windows
  const told = new Map((window?.cars ?? []).map(({ entry }) => [entry, { from: window?.from ?? 0, to: window?.to ?? 0 }]))
  expect(orderOf(day).toldOtherwise).toBe(3)
  expect(orderOf({ ...day, told }).toldOtherwise).toBe(0)
  expect(orderOf({ ...day, told: new Map([...told, ['a-1', { from: at(7), to: at(7, 15) }]]) }).toldOtherwise).toBe(1)
})

test('only the holes of the morning stand in the order', () => {
  const holes = [
    { kind: 'engine-curfew', from: at(6), to: at(7, 30) },
    { kind: 'briefing', from: at(8, 15), to: at(8, 30) },
    { kind: 'break', from: at(12), to: at(13) },
  ] as const
  expect(orderOf(aDay({ holes })).holes.map(({ kind }) => kind)).toEqual(['briefing'])
})

test('without windows too many cars never settle, and without a session nobody can say', () => {
  expect(orderOf(aDay({ cars: cars('a', 200) })).withoutWindows).toEqual({ settles: false, meanWaitMin: null, over10Min: 1 })
  expect(orderOf(aDay({ cars: cars('c', 5) })).withoutWindows).toBeNull()
  expect(orderOf(aDay()).withoutWindows).toMatchObject({ settles: true })
})
