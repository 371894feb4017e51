import 'server-only'
import type { Contract } from '@/lib/contracts/contract'
import { type Refusal, refuse } from '@/lib/platform/refusal'

/**
 * A request that changes something must come from a page of our own origin; null when it does. Only a device token may come without one:
 * it is signed for this very request, and no browser adds it by itself as it does a cookie.
 */
export function checkOrigin(request: Request, contract: Contract, origin: string): Refusal | null {
  if (contract.method === 'GET') return null
  const from = request.headers.get('origin')
  if (from === origin) return null
  if (from === null && contract.auth !== 'session' && contract.auth !== 'public' && deviceTokenOf(request) !== null) return null
  return refuse('foreign-origin')
}

/** The JWS of `Authorization: Device <jws>`; null without one. */
export function deviceTokenOf(request: Request): string | null {
  const header = request.headers.get('authorization')
  return header?.startsWith('Device ') ? header.slice('Device '.length).trim() : null
}
