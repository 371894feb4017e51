/** SHA-256 of a text's UTF-8, lower-case hex. Handed in: the server has a native one, the browser's own cannot be called without waiting. */
export type Sha256Hex = (text: string) => string

/** The chain before the first record of an event. */
export const CHAIN_START = ''

/** What the server said of a record, as the chain and the wire write it. */
export interface StoredDisposition {
  readonly disposition: 'accepted' | 'quarantined'
  readonly code: string | null
}

/** `SHA-256(prev ‖ jws ‖ disposition)` (rule S3). A JWS has no line end, so the parts cannot run into each other. */
export function chainNext(previous: string, jws: string, stored: StoredDisposition, sha256: Sha256Hex): string {
  return sha256(`${previous}\n${jws}\n${stored.disposition}${stored.code === null ? '' : `:${stored.code}`}`)
}

/** The hash by which records name a salted text; the length in front keeps salt and text apart. */
export function noteHash(salt: string, text: string, sha256: Sha256Hex): string {
  return sha256(`note-v1\n${salt.length}\n${salt}${text}`)
}
