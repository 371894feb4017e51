import { describe, expect, test } from 'vitest'
import { decodeBase32, encodeBase32 } from '@/lib/pass/base32'

/** RFC 4648, section 10, "Test Vectors": BASE32, as printed there. */
const VECTORS = [
  ['', ''],
  ['f', 'MY======'],
  ['fo', 'MZXQ===='],
  ['foo', 'MZXW6==='],
  ['foob', 'MZXW6YQ='],
  ['fooba', 'MZXW6YTB'],
  ['foobar', 'MZXW6YTBOI======'],
] as const

describe.each(VECTORS)('RFC 4648, section 10: BASE32(%j) = %j', (text, published) => {
  // The token leaves the padding out, which section 3.2 allows where the length is known.
  const bare = published.replace(/=+$/, '')

  test('is what is encoded, but for the padding', () => {
    expect(encodeBase32(Buffer.from(text))).toBe(bare)
  })

  test('decodes, and with its padding does not', () => {
    expect(decodeBase32(bare)).toEqual(new Uint8Array(Buffer.from(text)))
    if (published !== bare) expect(decodeBase32(published)).toBeNull()
  })
})

/** RFC 4648, section 6, table 3: value to character. */
test('RFC 4648, section 6: the alphabet is A to Z and 2 to 7 in this order', () => {
  const alphabet = Array.from({ length: 32 }, (_, value) => encodeBase32(Uint8Array.of(value << 3))[0]).join('')
  expect(alphabet).toBe('ABCDEFGHIJKLMNOPQRSTUVWXYZ234567')
})

/** RFC 4648, section 3.5: a decoder may refuse pad bits that are not zero; a token must have one spelling, so ours does. */
test.each(['MZ', 'MZXR', 'MZXW7', 'MZXW6YR'])('RFC 4648, section 3.5: %j has pad bits that are not zero, and is refused', (text) => {
  expect(decodeBase32(text)).toBeNull()
})
