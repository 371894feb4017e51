import 'server-only'
import type { Statement } from 'better-sqlite3'
import type { Db } from '@/db/client'

/** A row of the log as these statements give it. */
export interface LogRow {
  readonly seq: number
  readonly id: string
  readonly jws: string
  readonly hash: string
  readonly chain: string
  readonly disposition: 'accepted' | 'quarantined'
  readonly code: string | null
}

export interface NewRow extends LogRow {
  readonly eventId: string
  readonly clubId: string
  readonly kind: string
  readonly subjectKey: string
  readonly deviceId: string
  readonly deviceSeq: number
  readonly receivedAt: number
}

export interface LogStatements {
  readonly snapshotVersion: Statement<[string], { readonly snapshotVersion: number }>
  readonly head: Statement<[string], { readonly seq: number; readonly chain: string }>
  readonly at: Statement<[string, number], { readonly chain: string }>
  readonly after: Statement<[string, number, number], LogRow>
  readonly byId: Statement<[string], LogRow & { readonly eventId: string }>
  readonly insert: Statement<[NewRow]>
  readonly notes: Statement<[string, number, number], { readonly hash: string; readonly salt: string; readonly text: string }>
  readonly addNote: Statement<[{ hash: string; clubId: string; eventId: string; salt: string; text: string; seq: number }]>
  readonly addPass: Statement<[{ eventId: string; recordHash: string; clubId: string; subjectKey: string; passId: string }]>
  readonly contact: Statement<[{ at: number; unsent: number | null; deviceId: string }]>
}

const made = new WeakMap<object, LogStatements>()
const ROW = 'seq, id, jws, hash, chain, disposition, code'

/** The statements of the hot path, prepared once per open database: building them anew costs as much as running them. */
export function logStatements(database: Db): LogStatements {
  const client = database.$client
  const known = made.get(client)
  if (known !== undefined) return known
  const statements: LogStatements = {
    snapshotVersion: client.prepare('SELECT snapshot_version AS snapshotVersion FROM event WHERE id = ?'),
    head: client.prepare('SELECT seq, chain FROM record WHERE event_id = ? ORDER BY seq DESC LIMIT 1'),
    at: client.prepare('SELECT chain FROM record WHERE event_id = ? AND seq = ?'),
    after: client.prepare(`SELECT ${ROW} FROM record WHERE event_id = ? AND seq > ? ORDER BY seq LIMIT ?`),
    byId: client.prepare(`SELECT ${ROW}, event_id AS eventId FROM record WHERE id = ?`),
    insert: client.prepare(
      `INSERT INTO record (event_id, seq, club_id, id, jws, hash, chain, disposition, code, kind, subject_key, device_id, device_seq, received_at)
       VALUES (@eventId, @seq, @clubId, @id, @jws, @hash, @chain, @disposition, @code, @kind, @subjectKey, @deviceId, @deviceSeq, @receivedAt)`,
    ),
    notes: client.prepare('SELECT hash, salt, text FROM note WHERE event_id = ? AND seq > ? AND seq <= ? ORDER BY seq, hash'),
    addNote: client.prepare(
      `INSERT INTO note (hash, club_id, event_id, salt, text, seq) VALUES (@hash, @clubId, @eventId, @salt, @text, @seq) ON CONFLICT (hash) DO NOTHING`,
    ),
    addPass: client.prepare(
      `INSERT INTO issued_pass (event_id, record_hash, club_id, subject_key, pass_id) VALUES (@eventId, @recordHash, @clubId, @subjectKey, @passId)`,
    ),
    contact: client.prepare('UPDATE device SET last_contact_at = @at, unsent = coalesce(@unsent, unsent) WHERE id = @deviceId'),
  }
  made.set(client, statements)
  return statements
}
