/** RFC 4648 §6 alphabet. */
const ALPHABET = 'ABCDEFGHIJKLMNOPQRSTUVWXYZ234567'

/** RFC 4648 base32 without padding, upper case. */
export function encodeBase32(bytes: Uint8Array): string {
  let text = ''
  let buffer = 0
  let bits = 0
  for (const byte of bytes) {
    buffer = (buffer << 8) | byte
    bits += 8
    while (bits >= 5) {
      bits -= 5
      text += ALPHABET.charAt((buffer >>> bits) & 31)
    }
    buffer &= (1 << bits) - 1
  }
  return bits > 0 ? text + ALPHABET.charAt((buffer << (5 - bits)) & 31) : text
}

/**
 * Reads base32 without padding; null where it is none. Strict: upper case only, no length that cannot be, and the spare bits of the last
 * character are zero, so that two different texts are never one token.
 */
export function decodeBase32(text: string): Uint8Array<ArrayBuffer> | null {
  const bytes = new Uint8Array(Math.floor((text.length * 5) / 8))
  let buffer = 0
  let bits = 0
  let at = 0
  for (const character of text) {
    const value = ALPHABET.indexOf(character)
    if (value < 0) return null
    buffer = (buffer << 5) | value
    bits += 5
    if (bits < 8) continue
    bits -= 8
    bytes[at++] = buffer >>> bits
    buffer &= (1 << bits) - 1
  }
  // 5 or more bits left over: a character more than the bytes need.
  return bits >= 5 || buffer !== 0 ? null : bytes
}
