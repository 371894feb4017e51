import { expect, test } from 'vitest'
import { peopleAtLeast, peopleNeeded } from '@/lib/planning/staffing'

test('no cars need nobody', () => {
  expect(peopleNeeded({ cars: 0, meanMin: 8, sdMin: 3, minutes: 0 })).toBe(0)
  expect(peopleAtLeast({ cars: 0, meanMin: 8, minutes: 0 })).toBe(0)
})

test('where one long car may outlast the time no number is enough', () => {
  expect(peopleNeeded({ cars: 2, meanMin: 8, sdMin: 3, minutes: 12 })).toBeNull()
  expect(peopleAtLeast({ cars: 2, meanMin: 8, minutes: 0 })).toBeNull()
})

test('the people found are enough by the formula, and one fewer is not', () => {
  for (let cars = 1; cars <= 150; cars += 7)
    for (const minutes of [45, 65, 90, 120]) {
      const people = peopleNeeded({ cars, meanMin: 8, sdMin: 3, minutes }) ?? 0
      const enough = (c: number) => c * minutes >= cars * 8 + 1.6449 * 3 * Math.sqrt(cars) + (c - 1) * (8 + 1.6449 * 3) - 1e-6
      expect(enough(people), `${cars} cars, ${minutes} min, ${people} people`).toBe(true)
      if (people > 1) expect(enough(people - 1), `${cars} cars, ${minutes} min, ${people} people`).toBe(false)
    }
})
