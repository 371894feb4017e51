/** A person's six digits as kept on the device; not to be guessed at a glance, and no protection beyond that (rule M3). */
export interface StoredPin {
  readonly salt: Uint8Array<ArrayBuffer>
  readonly hash: Uint8Array<ArrayBuffer>
  readonly iterations: number
}

export const PIN_PATTERN = /^\d{6}$/
const ITERATIONS = 100_000

export async function hashPin(pin: string, salt: Uint8Array<ArrayBuffer>, iterations = ITERATIONS): Promise<StoredPin> {
  const key = await crypto.subtle.importKey('raw', new TextEncoder().encode(pin), 'PBKDF2', false, ['deriveBits'])
  const bits = await crypto.subtle.deriveBits({ name: 'PBKDF2', hash: 'SHA-256', salt, iterations }, key, 256)
  return { salt, hash: new Uint8Array(bits), iterations }
}

export async function isPin(pin: string, stored: StoredPin): Promise<boolean> {
  const { hash } = await hashPin(pin, stored.salt, stored.iterations)
  return hash.every((byte, index) => byte === stored.hash[index])
}
