import 'server-only'
import { hash, verify } from '@node-rs/argon2'
import { BLOCKED_PASSWORDS } from './blocked-passwords'

export const PASSWORD_MIN_LENGTH = 12
export const PASSWORD_MAX_LENGTH = 200

// argon2id, 19 MiB, two passes, one lane (OWASP password storage, 2024). The package's enum for the algorithm is const and cannot be imported with
// isolated modules; 2 is argon2id, and the test reads it back from the hash.
const SETTINGS = { algorithm: 2, memoryCost: 19_456, timeCost: 2, parallelism: 1 }

/** Why a new password is refused; null when it may be used. Length over composition. */
export function passwordFault(password: string): 'too-short' | 'too-long' | 'too-common' | null {
  // Code points, so that a letter outside the basic plane is not two.
  const length = Array.from(password).length
  if (length < PASSWORD_MIN_LENGTH) return 'too-short'
  if (length > PASSWORD_MAX_LENGTH) return 'too-long'
  const plain = password.toLowerCase().replaceAll(/[\s._-]/g, '')
  if (BLOCKED_PASSWORDS.has(plain) || new Set(plain).size < 4) return 'too-common'
  return null
}

/** The PHC string to store. Throws for a password that `passwordFault` refuses. */
export async function hashPassword(password: string): Promise<string> {
  const fault = passwordFault(password)
  if (fault) throw new Error(`a password was not checked before it was hashed: ${fault}`)
  return hash(password.normalize('NFC'), SETTINGS)
}

let nobodysHash: Promise<string> | null = null

/** Whether the password is right. `null` for an unknown account does the same work and is never right, so that the time tells nothing. */
export async function isRightPassword(stored: string | null, password: string): Promise<boolean> {
  nobodysHash ??= hash('there is no such account here', SETTINGS)
  const against = stored ?? (await nobodysHash)
  const matches = await verify(against, password.normalize('NFC'))
  return matches && stored !== null
}
