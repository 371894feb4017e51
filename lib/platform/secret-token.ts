import 'server-only'
import { randomBytes } from 'node:crypto'

/** A secret to hand out once: 160 random bits, base64url (27 characters). Store its `sha256` only. */
export function secretToken(): string {
  return randomBytes(20).toString('base64url')
}
