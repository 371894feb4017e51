import 'server-only'
import { asc, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { record as recordTable } from '@/db/schema'
import type { AnyRecord } from '@/lib/inspection/record'
import { assert } from '@/lib/platform/assert'
import { parseJws } from '../core/jws-parse'
import { readRecordOrEnvelope } from '../core/read-record'

/** One record as it lies in the log, and as it reads. */
export interface LoggedRecord {
  readonly seq: number
  readonly jws: string
  readonly hash: string
  readonly chain: string
  readonly disposition: 'accepted' | 'quarantined'
  readonly code: string | null
  readonly receivedAt: number
  readonly record: AnyRecord
}

/** An event's log from its first record to its last, read from the file. */
export function wholeLog(database: Db, eventId: string): readonly LoggedRecord[] {
  const { seq, jws, hash, chain, disposition, code, receivedAt } = recordTable
  return database
    .select({ seq, jws, hash, chain, disposition, code, receivedAt })
    .from(recordTable)
    .where(eq(recordTable.eventId, eventId))
    .orderBy(asc(recordTable.seq))
    .all()
    .map((row) => {
      const parsed = parseJws(row.jws)
      const record = parsed === null ? null : readRecordOrEnvelope(parsed.payload)
      assert(record !== null, `record ${String(row.seq)} of event ${eventId} was taken in and cannot be read`)
      return { ...row, record }
    })
}
