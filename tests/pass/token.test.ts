import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { encodeBase32 } from '@/lib/pass/base32'
import type { PassPayload } from '@/lib/pass/pass-payload'
import { decodeToken, encodePayload, encodeToken, signedMessage } from '@/lib/pass/token'
import { aPayload } from './a-pit-exit'
import { anyPayload } from './arbitrary-payload'

const SIGNATURE = new Uint8Array(64).fill(7)

/** A token whose payload bytes were changed by hand. */
function tokenWith(change: (bytes: Uint8Array) => void, payload: Partial<PassPayload> = {}): string {
  const bytes = encodePayload(aPayload(payload))
  change(bytes)
  return encodeToken(bytes, SIGNATURE)
}

describe('the token', () => {
  test('is laid out as written down, byte for byte', () => {
    const bytes = encodePayload(
      aPayload({
        kid: 0xab,
        event: 0x0102,
        counter: 0x0304,
        entry: 0x0506,
        validFrom: '2020-01-02',
        days: 7,
        conditions: true,
        passengerSeatUsable: false,
        printedAhead: true,
        number: 'A',
        plateTail: '//////',
      }),
    )
    // 102,400,000 = 0x061A8000; 40⁶ − 1 = 0xF423FFFF.
    const hex = '11 ab 0102 0304 0506 0001 f4 061a8000 f423ffff'.replaceAll(' ', '')
    expect(Buffer.from(bytes).toString('hex')).toBe(hex)
  })

  test('is signed over "pass-v1", a zero byte and the payload', () => {
    const bytes = encodePayload(aPayload())
    expect(Buffer.from(signedMessage(bytes)).toString('latin1')).toBe(`pass-v1\0${Buffer.from(bytes).toString('latin1')}`)
  })

  test('is 133 characters, and decodes to what was encoded, whatever that was', () => {
    fc.assert(
      fc.property(anyPayload, fc.uint8Array({ minLength: 64, maxLength: 64 }), (payload, signature) => {
        const payloadBytes = encodePayload(payload)
        const text = encodeToken(payloadBytes, signature)
        expect(text).toMatch(/^[A-Z2-7]{133}$/)
        expect(decodeToken(text)).toEqual({ ok: true, token: { payload, payloadBytes, signature: new Uint8Array(signature) } })
      }),
    )
  })

  test('whatever bytes decode are the only bytes of their payload', () => {
    const plausible = fc
      .tuple(fc.constantFrom(0x11, 0x12, 0x21, 0x10), fc.uint8Array({ minLength: 82, maxLength: 82 }))
      .map(([head, rest]) => Uint8Array.of(head, ...rest))
    fc.assert(
      fc.property(plausible, (bytes) => {
        const decoded = decodeToken(encodeBase32(bytes))
        if (decoded.ok) expect(encodePayload(decoded.token.payload)).toEqual(bytes.slice(0, 19))
      }),
      { numRuns: 3_000 },
    )
  })

  test.each<[string, string, string]>([
    ['version 0', tokenWith((bytes) => (bytes[0] = 0x01)), 'unknown-version'],
    ['version 2', tokenWith((bytes) => (bytes[0] = 0x21)), 'unknown-version'],
    ['type 0', tokenWith((bytes) => (bytes[0] = 0x10)), 'unknown-type'],
    ['type 3', tokenWith((bytes) => (bytes[0] = 0x13)), 'unknown-type'],
    ['0 days', tokenWith((bytes) => (bytes[10] = 0b000_01000)), 'no-days'],
    ['the first reserved flag', tokenWith((bytes) => (bytes[10] = 0b001_00010)), 'reserved-flag'],
    ['the second reserved flag', tokenWith((bytes) => (bytes[10] = 0b001_00001)), 'reserved-flag'],
    ['a number of 40⁶', tokenWith((bytes) => bytes.set([0xf4, 0x24, 0, 0], 11)), 'impossible-number'],
    ['a number with a pad before a character', tokenWith((bytes) => bytes.set([0, 0, 0, 1], 11)), 'impossible-number'],
    ['a plate tail of 40⁶', tokenWith((bytes) => bytes.set([0xff, 0xff, 0xff, 0xff], 15)), 'impossible-plate'],
    ['a plate tail with a pad before a character', tokenWith((bytes) => bytes.set([0, 0, 0, 1], 15)), 'impossible-plate'],
    ['a band with an entry', tokenWith((bytes) => (bytes[7] = 1), { type: 'band', entry: 0, plateTail: '' }), 'impossible-band'],
    ['a band with a plate', tokenWith((bytes) => (bytes[15] = 0x10), { type: 'band', entry: 0, plateTail: '' }), 'impossible-band'],
    ['a band without a number', tokenWith((bytes) => bytes.fill(0, 11), { type: 'band', entry: 0, plateTail: '' }), 'impossible-band'],
    ['a character more', `${tokenWith(() => undefined)}A`, 'wrong-length'],
    ['a character less', tokenWith(() => undefined).slice(1), 'wrong-length'],
    ['nothing', '', 'wrong-length'],
    ['lower case', tokenWith(() => undefined).toLowerCase(), 'not-base32'],
    ['the spare bit set', withSpareBit(tokenWith(() => undefined)), 'not-base32'],
  ])('with %s is refused by name', (_, text, problem) => {
    expect(decodeToken(text)).toEqual({ ok: false, problem })
  })

  test.each<[string, Partial<PassPayload>]>([
    ['a counter that does not fit', { counter: 65_536 }],
    ['a device that does not fit', { kid: 256 }],
    ['a day before 2020', { validFrom: '2019-12-31' }],
    ['8 days', { days: 8 }],
    ['0 days', { days: 0 }],
    ['a band with an entry', { type: 'band', plateTail: '' }],
    ['a number that was not folded', { number: '47a' }],
  ])('%s cannot be encoded', (_, payload) => {
    expect(() => encodePayload(aPayload(payload))).toThrow()
  })

  test('any text is answered for and none throws', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 200 }), (text) => {
        expect(decodeToken(text).ok).toBe(false)
      }),
    )
  })
})

function withSpareBit(text: string): string {
  const alphabet = 'ABCDEFGHIJKLMNOPQRSTUVWXYZ234567'
  return text.slice(0, -1) + alphabet.charAt(alphabet.indexOf(text.slice(-1)) | 1)
}
