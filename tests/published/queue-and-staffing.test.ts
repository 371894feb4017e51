import jstat from 'jstat'
import { expect, test } from 'vitest'
import { erlangB, erlangC, queueInSteadyFlow } from '@/lib/planning/erlang'
import { peopleAtLeast, peopleNeeded } from '@/lib/planning/staffing'

// M/M/c. First two rows: textbook example “emergency room”, λ = 2/h, μ = 3/h (from memory of the book, reproduced with the queueing package of GNU Octave,
// function qsmmm); the others reproduced with the same package. λ/h, μ/h, c → ρ, C, Lq, Wq in minutes, P(Wq > 10 min).
test.each([
  [2, 3, 1, 0.6667, 0.666667, 1.333333, 40, null],
  [2, 3, 2, 0.3333, 0.166667, 0.083333, 2.5, 0.08557],
  [20, 6, 4, 0.8333, 0.657722, 3.288608, 9.866, 0.33769],
  [20, 6, 5, 0.6667, 0.326669, 0.653339, 1.96, 0.0617],
  [30, 6, 6, 0.8333, 0.587516, 2.937582, 5.875, 0.21614],
  [30, 6, 7, 0.7143, 0.32415, 0.810375, 1.621, 0.04387],
  [30, 7.5, 5, 0.8, 0.554113, 2.21645, 4.433, 0.15876],
  [30, 7.5, 6, 0.6667, 0.284761, 0.569522, 1.139, 0.02337],
  [40, 7.5, 7, 0.7619, 0.409532, 1.310504, 1.966, 0.05099],
  [30, 10, 4, 0.75, 0.509434, 1.528302, 3.057, 0.09622],
] as const)('Erlang C: %d cars an hour, %d an hour each, %d people', (arrivals, each, people, load, waits, waiting, wait, over10) => {
  const queue = queueInSteadyFlow(arrivals, each, people)
  expect(queue.load).toBeCloseTo(load, 4)
  expect(queue.waitProbability).toBeCloseTo(waits, 6)
  expect(queue.meanWaiting).toBeCloseTo(waiting, 6)
  expect(queue.meanWaitMin).toBeCloseTo(wait, 3)
  if (over10 !== null) expect(queue.longerThan(10)).toBeCloseTo(over10, 5)
})

// Same source.
test.each([
  [5, 6, 0.191847],
  [4, 6, 0.117162],
])('Erlang B: %d erlangs on %d people are lost with %d', (offered, people, lost) => {
  expect(erlangB(offered, people)).toBeCloseTo(lost, 6)
})

// An independent way to the same number: Erlang B is a Poisson distribution cut off at c (jstat).
test.each([
  [0.5, 1],
  [3.3, 4],
  [5, 6],
  [12, 10],
  [40, 45],
])('Erlang B of %d erlangs on %d people is the truncated Poisson of an independent package', (offered, people) => {
  expect(erlangB(offered, people)).toBeCloseTo(jstat.poisson.pdf(people, offered) / jstat.poisson.cdf(people, offered), 10)
})

test('a flow beyond what people can do never settles', () => {
  const queue = queueInSteadyFlow(40, 7.5, 5)
  expect(queue.meanWaitMin).toBe(Number.POSITIVE_INFINITY)
  expect(queue.meanWaiting).toBe(Number.POSITIVE_INFINITY)
  expect(erlangC(40 / 7.5, 5)).toBe(1)
})

// Closed form checked against Monte Carlo (20 000 runs of gamma service): N, mean, deviation, T → people at least, people for 95 %.
test.each([
  [40, 8, 3, 90, 4, 5],
  [60, 8, 3, 90, 6, 7],
  [60, 8, 3, 120, 4, 5],
  [30, 6, 2, 60, 3, 4],
  [80, 8, 3, 90, 8, 9],
  [24, 10, 4, 60, 4, 6],
  [100, 5, 2, 90, 6, 7],
])('%d cars of %d ± %d minutes in %d minutes', (cars, meanMin, sdMin, minutes, atLeast, needed) => {
  expect(peopleAtLeast({ cars, meanMin, minutes })).toBe(atLeast)
  expect(peopleNeeded({ cars, meanMin, sdMin, minutes })).toBe(needed)
})

test('the 95 % of the staffing formula is the normal quantile of an independent package', () => {
  const z = jstat.normal.inv(0.95, 0, 1)
  const { cars, meanMin, sdMin, minutes } = { cars: 60, meanMin: 8, sdMin: 3, minutes: 90 }
  const people = peopleNeeded({ cars, meanMin, sdMin, minutes }) ?? 0
  const enough = (c: number) => c * minutes >= cars * meanMin + z * sdMin * Math.sqrt(cars) + (c - 1) * (meanMin + z * sdMin)
  expect([enough(people), enough(people - 1)]).toEqual([true, false])
})
