import type { AnyRecord } from '@/lib/inspection/record'
import { parseRecord } from '@/lib/inspection/validate-record'
import { readToken } from './read-token'

/** A version no build ever writes: a record read under it is of no known kind, whatever its kind. */
const UNREAD_VERSION = 1_000_000

/** Reads a payload as a record, as the server takes it in; null when it is none, contradicts itself, or is a pass whose token is none. */
export function readRecord(payload: Readonly<Record<string, unknown>>): AnyRecord | null {
  const parsed = parseRecord(payload)
  if (!parsed.ok) return null
  const { record } = parsed
  return 'token' in record && readToken(record.token) === null ? null : record
}

/** As `readRecord`; of a known kind whose fields this build cannot read (a newer one made it) the envelope and effect are read, so that a stop stops (rule T3). */
export function readRecordOrEnvelope(payload: Readonly<Record<string, unknown>>): AnyRecord | null {
  return readRecord(payload) ?? readRecord({ ...payload, v: UNREAD_VERSION })
}
