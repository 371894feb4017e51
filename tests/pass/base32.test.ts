import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { decodeBase32, encodeBase32 } from '@/lib/pass/base32'

const bytes = fc.uint8Array({ maxLength: 100 })

describe('base32', () => {
  test('whatever is encoded decodes to itself', () => {
    fc.assert(
      fc.property(bytes, (given) => {
        expect(decodeBase32(encodeBase32(given))).toEqual(new Uint8Array(given))
      }),
    )
  })

  test('whatever decodes has one spelling only', () => {
    const text = fc.string({ unit: fc.constantFrom(...Array.from('ABCDEFGHIJKLMNOPQRSTUVWXYZ234567')), maxLength: 40 })
    fc.assert(
      fc.property(text, (given) => {
        const read = decodeBase32(given)
        if (read !== null) expect(encodeBase32(read)).toBe(given)
      }),
      { numRuns: 2_000 },
    )
  })

  test('83 bytes are 133 characters with one spare bit, and a token with that bit set is none', () => {
    const text = encodeBase32(new Uint8Array(83))
    expect(text).toHaveLength(133)
    expect(decodeBase32(`${text.slice(0, -1)}B`)).toBeNull()
    expect(decodeBase32(`${text.slice(0, -1)}C`)).not.toBeNull()
  })

  test.each([
    ['a spare bit set', 'MZ'],
    ['padding', 'MY======'],
    ['lower case', 'my'],
    ['a digit that is none of it', 'M1'],
    ['a space', 'M Y'],
    ['one character', 'M'],
    ['three characters', 'MZX'],
    ['six characters', 'MZXW6A'],
    ['a sign outside the basic plane', 'M😀'],
  ])('refuses %s', (_, text) => {
    expect(decodeBase32(text)).toBeNull()
  })
})
