import { expect, test } from 'vitest'
import { photoTries } from '@/lib/photos/photo-tries'

test.each([
  [4032, 3024, 1600, 1200],
  [3024, 4032, 1200, 1600],
  [1600, 900, 1600, 900],
  [300, 200, 300, 200],
  [20_000, 10, 1600, 1],
])('%i × %i is tried first as %i × %i', (width, height, firstWidth, firstHeight) => {
  expect(photoTries(width, height)[0]).toEqual({ width: firstWidth, height: firstHeight, quality: 0.82 })
})

test('every further try asks for less: coarser, or smaller', () => {
  const tries = photoTries(4032, 3024)
  for (const [index, next] of tries.entries()) {
    const before = tries[index - 1]
    if (before) expect(next.width < before.width || (next.width === before.width && next.quality < before.quality)).toBe(true)
  }
  expect(tries.at(-1)?.width).toBe(640)
})

test('a small picture is never made larger, only coarser', () => {
  expect(new Set(photoTries(500, 400).map(({ width, height }) => `${width} ${height}`))).toEqual(new Set(['500 400']))
})
