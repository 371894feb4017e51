import fc from 'fast-check'
import { expect, test } from 'vitest'
import { frayPath, hexagonPoints, ringHatchPath, ropePath } from '@/app/_ui/wire-geometry'

test('a bolt is a regular hexagon: six corners, all as far from its centre as from each other', () => {
  const corners = hexagonPoints(10, -5, 20)
    .split(' ')
    .map((pair) => pair.split(',').map(Number))

  expect(corners).toHaveLength(6)
  corners.forEach(([x = 0, y = 0], index) => {
    const [nextX = 0, nextY = 0] = corners[(index + 1) % 6] ?? []
    expect(Math.hypot(x - 10, y + 5)).toBeCloseTo(20, 1)
    expect(Math.hypot(nextX - x, nextY - y)).toBeCloseTo(20, 1)
  })
})

test('two ropes that meet show no seam: the second goes on at the spacing of the first', () => {
  const lay = { y: 0, amplitude: 3, pitch: 12 }
  const starts = (d: string) => [...d.matchAll(/M(-?[\d.]+) /g)].map(([, x]) => Number(x))
  const [left, right] = [starts(ropePath({ ...lay, fromX: 0, toX: 24 })), starts(ropePath({ ...lay, fromX: 24, toX: 48 }))]

  expect(left.length).toBeGreaterThan(1)
  expect((right[0] ?? 0) - (left.at(-1) ?? 0)).toBeCloseTo((left[1] ?? 0) - (left[0] ?? 0), 5)
})

test('there is no rope where there is no room for one', () => {
  expect(ropePath({ fromX: 10, toX: 10, y: 0, amplitude: 3, pitch: 12 })).toBe('')
})

test('a cut end has two strands, and points where it is told', () => {
  const right = frayPath({ x: 0, y: 0, amplitude: 3, direction: 1, length: 10 })
  const left = frayPath({ x: 0, y: 0, amplitude: 3, direction: -1, length: 10 })

  expect(right.match(/M/g)).toHaveLength(2)
  expect(right).toMatch(/c4 /)
  expect(left).toMatch(/c-4 /)
})

test('the hatch of a hold stays inside its ring', () => {
  fc.assert(
    fc.property(fc.integer({ min: 2, max: 8 }), fc.integer({ min: 1, max: 6 }), (inner, thickness) => {
      const outer = inner + thickness
      for (const [, x, y] of ringHatchPath(inner, outer, 1.5).matchAll(/[ML](-?[\d.]+) (-?[\d.]+)/g)) {
        const distance = Math.hypot(Number(x), Number(y))
        expect(distance).toBeLessThanOrEqual(outer + 0.02)
        expect(distance).toBeGreaterThanOrEqual(inner - 0.02)
      }
    }),
  )
})
