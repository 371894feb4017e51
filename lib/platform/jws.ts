import 'server-only'
import { createPublicKey, type KeyObject, sign, verify } from 'node:crypto'

/** Signs a payload as a compact JWS (RFC 7515) with Ed25519 (`EdDSA`, RFC 8037). Synchronous, so that it may stand inside a transaction. */
export function signJws(payload: object, type: string, privateKey: KeyObject, keyId?: string): string {
  const header = { alg: 'EdDSA', typ: type, ...(keyId === undefined ? {} : { kid: keyId }) }
  const signed = `${encode(JSON.stringify(header))}.${encode(JSON.stringify(payload))}`
  return `${signed}.${sign(null, Buffer.from(signed), privateKey).toString('base64url')}`
}

/** The payload if the JWS is of this type and signed by this key (raw Ed25519, base64url); null otherwise. Never throws. */
export function verifyJws(jws: string, type: string, publicKey: string): unknown {
  const parts = jws.split('.')
  const [header, payload, signature] = parts
  if (parts.length !== 3 || !header || !payload || !signature) return null
  const head = parseObject(header)
  // The algorithm is ours, never the sender's choice; a `crit` we do not know must be refused.
  if (!head || head.alg !== 'EdDSA' || head.typ !== type || 'crit' in head) return null
  const key = ed25519Key(publicKey)
  const bytes = decode(signature)
  if (!key || bytes?.length !== 64) return null
  if (!verify(null, Buffer.from(`${header}.${payload}`), key, bytes)) return null
  return parseObject(payload)
}

/** Reads a JWS's payload without believing it, to learn whose key must be asked. */
export function unverifiedPayload(jws: string): Readonly<Record<string, unknown>> | null {
  return parseObject(jws.split('.')[1] ?? '')
}

/** A raw Ed25519 public key (32 bytes, base64url) as a key; null when it is none. */
export function ed25519Key(publicKey: string): KeyObject | null {
  if (decode(publicKey)?.length !== 32) return null
  try {
    return createPublicKey({ key: { kty: 'OKP', crv: 'Ed25519', x: publicKey }, format: 'jwk' })
  } catch {
    // Thirty-two bytes that are no point of the curve: as good as no key.
    return null
  }
}

function encode(text: string): string {
  return Buffer.from(text).toString('base64url')
}

/** Strict base64url: what does not encode back to itself is refused, so that one signed text has one spelling. */
function decode(text: string): Buffer | null {
  const bytes = Buffer.from(text, 'base64url')
  return bytes.toString('base64url') === text ? bytes : null
}

function parseObject(part: string): Record<string, unknown> | null {
  const bytes = decode(part)
  if (!bytes) return null
  try {
    const value: unknown = JSON.parse(bytes.toString('utf8'))
    return typeof value === 'object' && value !== null && !Array.isArray(value) ? (value as Record<string, unknown>) : null
  } catch {
    // Not JSON: not a token.
    return null
  }
}
