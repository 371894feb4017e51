import fc from 'fast-check'
import { createHash } from 'node:crypto'
import { describe, expect, test } from 'vitest'
import { parseTypedCode, readTypedCode, showTypedCode, typedCode } from '@/lib/pass/typed-code'
import { aToken } from './a-pit-exit'

const ALPHABET = '0123456789ABCDEFGHJKMNPQRSTVWXYZ'
const codes = Array.from({ length: 40 }, (_, counter) => typedCode(aToken({ counter })))
const code = fc.constantFrom(...codes)

describe('[P7] the typed code', () => {
  test('begins with the first 35 bits of the token’s SHA-256', () => {
    const token = aToken()
    const bits = [...createHash('sha256').update(token).digest()].map((byte) => byte.toString(2).padStart(8, '0')).join('')
    const signs = Array.from({ length: 7 }, (_, at) => ALPHABET.charAt(parseInt(bits.slice(5 * at, 5 * at + 5), 2)))
    expect(typedCode(token).slice(0, 7)).toBe(signs.join(''))
  })

  test('has eight signs, none of I, L, O and U, and is shown in two halves', () => {
    for (const one of codes) expect(showTypedCode(one)).toMatch(/^[0-9A-HJKMNP-TV-Z]{4}-[0-9A-HJKMNP-TV-Z]{4}$/)
  })

  test('shows every single wrong sign, wherever it stands and whatever it is', () => {
    for (const one of codes)
      for (let at = 0; at < 8; at += 1)
        for (const sign of ALPHABET.replace(one.charAt(at), ''))
          expect(readTypedCode(one.slice(0, at) + sign + one.slice(at + 1))).toEqual({ ok: false, problem: 'check-sign' })
  })

  test('shows every swap of neighbours, and of any other two signs', () => {
    for (const one of codes)
      for (let left = 0; left < 7; left += 1)
        for (let right = left + 1; right < 8; right += 1) {
          if (one[left] === one[right]) continue
          const signs = Array.from(one)
          ;[signs[left], signs[right]] = [one.charAt(right), one.charAt(left)]
          expect(parseTypedCode(signs.join(''))).toBeNull()
        }
  })

  test('is read in any case, with spaces and hyphens, with O for 0 and I or L for 1', () => {
    const ways = (one: string) => [
      one.toLowerCase(),
      showTypedCode(one),
      Array.from(one).join(' '),
      `${one.slice(0, 4)}–${one.slice(4)}`,
      one.replaceAll('0', 'O').replaceAll('1', 'l'),
      one.replaceAll('0', 'o').replaceAll('1', 'I'),
    ]
    fc.assert(
      fc.property(code, (one) => {
        expect(ways(one).map(readTypedCode)).toEqual(ways(one).map(() => ({ ok: true, code: one })))
      }),
    )
  })

  test.each([
    ['', 'too-short'],
    ['1234-567', 'too-short'],
    ['1234-56789', 'too-long'],
    ['U234-5678', 'not-a-sign'],
    ['1234-567?', 'not-a-sign'],
    ['😀', 'not-a-sign'],
    ['A'.repeat(1_000_000), 'too-long'],
  ])('%.20j is refused by name: %s', (text, problem) => {
    expect(readTypedCode(text)).toEqual({ ok: false, problem })
  })

  test('any text is answered for and none throws', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 200 }), (text) => {
        expect(typeof readTypedCode(text).ok).toBe('boolean')
      }),
    )
  })
})
