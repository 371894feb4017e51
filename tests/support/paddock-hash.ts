import { sha256Hex } from '@/lib/checklist/hash'

/** A hash as long as a real one that a test can make from any words. */
export function fakeHash(words: string): string {
  return sha256Hex(`paddock ${words}`)
}

/** A UUIDv7-shaped id that a test can make from any words. */
export function fakeId(words: string): string {
  const hex = fakeHash(words)
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-7${hex.slice(13, 16)}-8${hex.slice(17, 20)}-${hex.slice(20, 32)}`
}
