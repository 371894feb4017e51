import type { Disposition, LogEntry, QuarantineCode } from '@/lib/inspection/log-entry'
import type { AnyRecord } from '@/lib/inspection/record'
import { parseJws } from './jws-parse'
import { readRecordOrEnvelope } from './read-record'

/** A record as a device keeps it on its disk, one key each. */
export interface StoredRecord {
  readonly hash: string
  readonly id: string
  readonly jws: string
  /** The server's number for it; null until a pull brought it. */
  readonly seq: number | null
  /** The number it had on a server that has since been restored; only for sending it back in its old order. */
  readonly lastSeq: number | null
  readonly deviceSeq: number
  readonly mine: boolean
  readonly disposition: 'provisional' | 'accepted' | 'quarantined'
  readonly code: string | null
  /** `unsent` is the outbox; `attention` the server would not take; `kept` is another device's that it would not take from us and that one sends itself. */
  readonly out: 'unsent' | 'sent' | 'attention' | 'kept'
}

/** The key it is kept under. */
export function recordKey(hash: string): string {
  return `r:${hash}`
}

/** As the fold reads it; null when the text is no record at all. */
export function logEntryOf(stored: StoredRecord): LogEntry | null {
  const record = recordOfJws(stored.jws)
  return record === null ? null : { hash: stored.hash, record, disposition: dispositionOf(stored) }
}

export function dispositionOf({ disposition, code }: Pick<StoredRecord, 'disposition' | 'code'>): Disposition {
  return disposition === 'quarantined' ? { state: 'quarantined', code: code as QuarantineCode } : { state: disposition }
}

/**
 * Reads the record in a JWS that was verified by whoever took it in. A record of a kind we know whose fields we do not (a newer build made it) is read by
 * its envelope, so that its stop still stops (rule T3).
 */
export function recordOfJws(jws: string): AnyRecord | null {
  const payload = parseJws(jws)?.payload
  return payload === undefined ? null : readRecordOrEnvelope(payload)
}

/** The order in which held records are sent: as the server once had them, then this device's own as they were made. */
export function sendingOrder(a: StoredRecord, b: StoredRecord): number {
  const [left, right] = [a.seq ?? a.lastSeq ?? Number.MAX_SAFE_INTEGER, b.seq ?? b.lastSeq ?? Number.MAX_SAFE_INTEGER]
  return left - right || a.deviceSeq - b.deviceSeq
}
