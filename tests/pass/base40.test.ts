import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { foldToBase40, packBase40, unpackBase40 } from '@/lib/pass/base40'

const SIGNS = 'ABCDEFGHIJKLMNOPQRSTUVWXYZ0123456789-./'
const text = fc.string({ unit: fc.constantFrom(...Array.from(SIGNS)), maxLength: 6 })

describe('base 40', () => {
  test('whatever is packed unpacks to itself and fits four bytes', () => {
    fc.assert(
      fc.property(text, (given) => {
        const packed = packBase40(given)
        expect(packed).toBeLessThan(40 ** 6)
        expect(unpackBase40(packed)).toBe(given)
      }),
    )
  })

  test('whatever unpacks has one packed value only', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 0xffff_ffff }), (packed) => {
        const read = unpackBase40(packed)
        if (read !== null) expect(packBase40(read)).toBe(packed)
      }),
      { numRuns: 2_000 },
    )
  })

  test.each([
    ['', 0],
    // A is 1 and 0 is 27, the first character the most significant: 1 · 40⁵, 27 · 40⁵.
    ['A', 102_400_000],
    ['0', 2_764_800_000],
    ['//////', 40 ** 6 - 1],
  ])('%j is %d', (given, packed) => {
    expect(packBase40(given)).toBe(packed)
  })

  test('007, 07 and 7 are three numbers', () => {
    expect(new Set(['007', '07', '7'].map(packBase40)).size).toBe(3)
  })

  test.each([
    ['40⁶', 40 ** 6],
    ['all bits set', 0xffff_ffff],
    ['a pad before a character', 1],
    ['a pad between characters', 40 ** 5 + 1],
    ['a fraction', 1.5],
    ['less than nothing', -1],
    ['no number', Number.NaN],
  ])('refuses %s', (_, packed) => {
    expect(unpackBase40(packed)).toBeNull()
  })

  test.each([
    ['é', 'E'],
    ['gf 90-vgn', 'GF90-V'],
    ['Öl', 'OL'],
    ['ß', 'SS'],
    ['ø7', 'O7'],
    ['Łódź', 'LODZ'],
    ['Ж7', '7'],
    ['🏁12', '12'],
    ['47a', '47A'],
  ])('%j folds to %j', (given, folded) => {
    expect(foldToBase40(given)).toBe(folded)
  })

  test('any text at all folds to what can be packed, and folding again changes nothing', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 12 }), (given) => {
        const folded = foldToBase40(given)
        expect(unpackBase40(packBase40(folded))).toBe(folded)
        expect(foldToBase40(folded)).toBe(folded)
      }),
    )
  })

  test('what was not folded is refused at once', () => {
    expect(() => packBase40('abc')).toThrow()
    expect(() => packBase40('ABCDEFG')).toThrow()
    expect(() => packBase40('A\u0000')).toThrow()
  })
})
