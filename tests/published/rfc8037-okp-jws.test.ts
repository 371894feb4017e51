import { calculateJwkThumbprint, CompactSign, compactVerify, importJWK } from 'jose'
import { verify } from 'node:crypto'
import { expect, test } from 'vitest'
import { ed25519Key } from '@/lib/platform/jws'

/** RFC 8037, appendix A.1: the example private key; A.2 its public half. */
const PUBLIC = { kty: 'OKP', crv: 'Ed25519', x: '11qYAYKxCrfVS_7TyWQHOg7hcvPapiMlrwIaaPcHURo' } as const
const PRIVATE = { ...PUBLIC, d: 'nWGxne_9WmC6hEr0kuwsxERJxWl7MmkZcDusAxyuf2A' } as const
/** A.3: its thumbprint. */
const THUMBPRINT = 'kPrK_qmxVWaYVA9wwBF6Iuo3vVzz7TxHCTwXBygrS4k'
/** A.4: payload, JWS signing input, signature. */
const PAYLOAD = 'Example of Ed25519 signing'
const SIGNING_INPUT = 'eyJhbGciOiJFZERTQSJ9.RXhhbXBsZSBvZiBFZDI1NTE5IHNpZ25pbmc'
const SIGNATURE = 'hgyY0il_MGCjP0JzlnLWG1PPOt7-09PGcvMg3AIbQR6dWbhijcNR4ki4iylGjg5BhVsPt9g7sVvpAr_MuM0KAg'
/** A.5: the whole JWS. */
const JWS = `${SIGNING_INPUT}.${SIGNATURE}`

test('RFC 8037, A.3: the public key has the published thumbprint', async () => {
  expect(await calculateJwkThumbprint(PUBLIC)).toBe(THUMBPRINT)
})

test('RFC 8037, A.4: signing the payload gives the published JWS, character for character', async () => {
  const made = await new CompactSign(new TextEncoder().encode(PAYLOAD))
    .setProtectedHeader({ alg: 'EdDSA' })
    .sign(await importJWK(PRIVATE, 'EdDSA'))
  expect(made).toBe(JWS)
})

test('RFC 8037, A.5: the published JWS verifies with its key', async () => {
  const { payload, protectedHeader } = await compactVerify(JWS, await importJWK(PUBLIC, 'EdDSA'), { algorithms: ['EdDSA'] })
  expect(new TextDecoder().decode(payload)).toBe(PAYLOAD)
  expect(protectedHeader).toEqual({ alg: 'EdDSA' })
})

test('RFC 8037, A.5: the server’s key reads the same x and verifies the same signing input', () => {
  const key = ed25519Key(PUBLIC.x)
  const signature = Buffer.from(SIGNATURE, 'base64url')
  expect(key !== null && verify(null, Buffer.from(SIGNING_INPUT), key, signature)).toBe(true)
  expect(key !== null && verify(null, Buffer.from(`${SIGNING_INPUT}A`), key, signature)).toBe(false)
})

test('RFC 8037, A.5: with any character of the payload changed it does not verify', async () => {
  const key = await importJWK(PUBLIC, 'EdDSA')
  for (let at = SIGNING_INPUT.indexOf('.') + 1; at < SIGNING_INPUT.length; at += 1) {
    const other = JWS[at] === 'A' ? 'B' : 'A'
    await expect(compactVerify(JWS.slice(0, at) + other + JWS.slice(at + 1), key), `at ${at}`).rejects.toThrow()
  }
})
