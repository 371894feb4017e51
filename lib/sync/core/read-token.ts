import { passId, type PassId } from '@/lib/pass/pass-payload'
import { decodeToken } from '@/lib/pass/token'
import { typedCode } from '@/lib/pass/typed-code'

/** By what names the pass in a record is asked for; null where its token is none, and the record no pass. */
export function readToken(token: string): { readonly id: PassId; readonly typedCode: string } | null {
  const read = decodeToken(token)
  return read.ok ? { id: passId(read.token.payload), typedCode: typedCode(token) } : null
}
