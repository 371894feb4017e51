import type { PassPayload } from './pass-payload'
import { readQrText } from './qr-text'
import { decodeToken, type TokenProblem } from './token'
import { verifyToken, type VerifySignature } from './verify-token'
import type { PassList } from './pass-list'

/** What stood in the picture, read as far as it could be. */
export type ScannedCode =
  | { readonly kind: 'foreign'; readonly shownAs: string }
  | { readonly kind: 'damaged'; readonly problem: TokenProblem }
  | { readonly kind: 'token'; readonly token: string; readonly payload: PassPayload; readonly signatureGood: boolean }

/** How the marshal asks. A typed code and a number only look up what is on the list already (rule P7). */
export type PitAsk =
  | { readonly how: 'camera'; readonly scan: ScannedCode }
  | { readonly how: 'number'; readonly number: string }
  | { readonly how: 'typed'; readonly code: string }

/**
 * Reads a scanned text down to its signature, with the keys of the list: no network (rule P1). Never throws and opens nothing.
 * A key that is not on the list leaves the signature unproven, which is not good.
 */
export async function readScan(text: string, list: PassList | null, verify: VerifySignature): Promise<ScannedCode> {
  const read = readQrText(text)
  if (read.kind === 'foreign') return read
  const decoded = decodeToken(read.token)
  if (!decoded.ok) return { kind: 'damaged', problem: decoded.problem }
  const { payload } = decoded.token
  const key = list?.keys.find(({ kid }) => kid === payload.kid)
  const publicKey = key ? fromBase64Url(key.publicKey) : null
  const signatureGood = publicKey !== null && (await verifyToken(decoded.token, publicKey, verify))
  return { kind: 'token', token: read.token, payload, signatureGood }
}

function fromBase64Url(text: string): Uint8Array<ArrayBuffer> | null {
  try {
    return Uint8Array.from(atob(text.replace(/-/g, '+').replace(/_/g, '/')), (character) => character.charCodeAt(0))
  } catch {
    return null
  }
}
