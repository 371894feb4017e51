import { uuidv7 } from 'uuidv7'

/** A new id: UUIDv7 (RFC 9562), so that ids sort by when they were made. */
export function newId(): string {
  return uuidv7()
}
