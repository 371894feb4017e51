export type PhotoFormat = 'jpeg' | 'png' | 'webp'

/** What a file is by its first bytes; null for anything we do not keep, whatever it is called or said to be. */
export function photoFormat(bytes: Uint8Array): PhotoFormat | null {
  if (begins(bytes, 0, [0xff, 0xd8, 0xff])) return 'jpeg'
  if (begins(bytes, 0, [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a])) return 'png'
  // RIFF, four bytes of length, WEBP.
  if (begins(bytes, 0, [0x52, 0x49, 0x46, 0x46]) && begins(bytes, 8, [0x57, 0x45, 0x42, 0x50])) return 'webp'
  return null
}

function begins(bytes: Uint8Array, at: number, signature: readonly number[]): boolean {
  return signature.every((byte, index) => bytes[at + index] === byte)
}
