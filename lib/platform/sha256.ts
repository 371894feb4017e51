import 'server-only'
import { createHash } from 'node:crypto'

/** SHA-256 in lower-case hex. Tokens and ids that open something are stored as this only. */
export function sha256(data: string | Uint8Array): string {
  return createHash('sha256').update(data).digest('hex')
}
