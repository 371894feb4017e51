/** RFC 4648 base64url without padding. */
export function base64url(bytes: Uint8Array): string {
  let binary = ''
  for (const byte of bytes) binary += String.fromCharCode(byte)
  return btoa(binary).replaceAll('+', '-').replaceAll('/', '_').replaceAll('=', '')
}

// Spare bits of the last character must be zero, or one signature would have several spellings and one record several hashes.
const CANONICAL = /^(?:[A-Za-z0-9_-]{4})*(?:[A-Za-z0-9_-][AQgw]|[A-Za-z0-9_-]{2}[AEIMQUYcgkosw048])?$/

/** Bytes of a base64url text without padding, in its only spelling; null when it is none. */
export function fromBase64url(text: string): Uint8Array<ArrayBuffer> | null {
  if (!CANONICAL.test(text)) return null
  const binary = atob(text.replaceAll('-', '+').replaceAll('_', '/'))
  const bytes = new Uint8Array(binary.length)
  for (let index = 0; index < binary.length; index += 1) bytes[index] = binary.charCodeAt(index)
  return bytes
}
