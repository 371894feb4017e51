import fc from 'fast-check'
import { generateKeyPairSync, sign } from 'node:crypto'
import { describe, expect, test } from 'vitest'
import { encodeBase32 } from '@/lib/pass/base32'
import { decodeToken, encodePayload, encodeToken, signedMessage, type DecodedToken } from '@/lib/pass/token'
import { verifyToken, type VerifySignature } from '@/lib/pass/verify-token'
import { aPayload, aToken, BAY, publicKeyOf, verify } from './a-pit-exit'
import { anyPayload } from './arbitrary-payload'

const key = rawKey(BAY.publicKey)
const native: VerifySignature = async (publicKey, message, signature) => {
  const imported = await crypto.subtle.importKey('raw', publicKey, 'Ed25519', false, ['verify'])
  return crypto.subtle.verify('Ed25519', imported, signature, message)
}

describe('a token’s signature', () => {
  test.each([
    ['the browser’s own', native],
    ['the software one', verify],
  ])('is good by %s verifier for its own key, and for no other', async (_, by) => {
    const token = read(aToken())
    expect(await verifyToken(token, key, by)).toBe(true)
    expect(await verifyToken(token, rawKey(generateKeyPairSync('ed25519').publicKey), by)).toBe(false)
  })

  test('over the payload alone, without what it is for, is not good', async () => {
    const payload = encodePayload(aPayload())
    const bare = new Uint8Array(sign(null, payload, BAY.privateKey))
    expect(await verifyToken(read(encodeToken(payload, bare)), key, native)).toBe(false)
  })

  test.each([
    ['throws', () => Promise.reject(new Error('no Ed25519 here'))],
    [
      'throws at once',
      () => {
        throw new Error('no such key')
      },
    ],
  ])('is not good where the verifier %s', async (_, by: VerifySignature) => {
    expect(await verifyToken(read(aToken()), key, by)).toBe(false)
  })

  test('no token with any one bit turned over decodes and verifies', async () => {
    const { payloadBytes, signature } = read(aToken({ conditions: true, number: '007' }))
    const good = Uint8Array.of(...payloadBytes, ...signature)
    for (let bit = 0; bit < good.length * 8; bit += 1) {
      const bad = good.slice()
      bad[bit >> 3] = (bad[bit >> 3] ?? 0) ^ (1 << (bit & 7))
      const decoded = decodeToken(encodeBase32(bad))
      expect(decoded.ok && (await verifyToken(decoded.token, key, native)), `bit ${bit}`).toBe(false)
    }
  })

  test('no token of any payload with any one character changed decodes and verifies', async () => {
    const sign32 = fc.constantFrom(...Array.from('ABCDEFGHIJKLMNOPQRSTUVWXYZ234567'))
    await fc.assert(
      fc.asyncProperty(anyPayload, fc.nat(132), sign32, async (payload, at, other) => {
        const bytes = encodePayload(payload)
        const text = encodeToken(bytes, new Uint8Array(sign(null, signedMessage(bytes), BAY.privateKey)))
        const bad = text.slice(0, at) + other + text.slice(at + 1)
        const decoded = decodeToken(bad)
        expect(decoded.ok && (await verifyToken(decoded.token, key, native))).toBe(bad === text)
      }),
      { numRuns: 300 },
    )
  })
})

function read(text: string): DecodedToken {
  const decoded = decodeToken(text)
  if (!decoded.ok) throw new Error(decoded.problem)
  return decoded.token
}

function rawKey(publicKey: Parameters<typeof publicKeyOf>[0]): Uint8Array<ArrayBuffer> {
  return new Uint8Array(Buffer.from(publicKeyOf(publicKey), 'base64url'))
}
