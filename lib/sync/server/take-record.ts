import 'server-only'
import type { Db } from '@/db/client'
import type { SyncPushRequest, SyncPushResponse } from '@/lib/contracts/sync-push'
import { isKnown } from '@/lib/inspection/record'
import { subjectKey } from '@/lib/inspection/subject'
import { sha256 } from '@/lib/platform/sha256'
import { chainNext, noteHash } from '../core/chain'
import { decideDisposition } from '../core/decide-disposition'
import { dispositionOf } from '../core/held-record'
import { readToken } from '../core/read-token'
import { dispositionContext } from './disposition-context'
import type { EventFrame } from './event-frame'
import { append, type EventLog } from './event-log'
import { logStatements, type LogStatements } from './log-statements'
import type { VerifiedRecord } from './verify-records'

type Answer = SyncPushResponse['answers'][number]

/** One transaction's work on an event's log. */
export interface LogWork {
  readonly database: Db
  readonly frame: EventFrame
  readonly log: EventLog
  readonly statements: LogStatements
  readonly noteSeq: Map<string, number>
  readonly now: number
}

/** Begins work on a log; inside the transaction that will commit it. */
export function beginLogWork(database: Db, frame: EventFrame, log: EventLog, now: number): LogWork {
  return { database, frame, log, statements: logStatements(database), noteSeq: new Map(), now }
}

/** Gives a verified record its number, its disposition and its place in the chain (rules S2, S3, T1). */
export function takeRecord(work: LogWork, verified: VerifiedRecord): Answer {
  const { database, frame, log, statements, now } = work
  const { jws, hash, record, device } = verified
  const { id } = record
  const held = statements.byId.get(id)
  if (held !== undefined) {
    // Same id, same bytes: what was answered then is answered again (rule S2).
    if (held.hash === hash && held.eventId === frame.event.id) return { id, hash, outcome: 'duplicate', code: held.code, seq: held.seq }
    return { id, hash, outcome: 'refused', code: 'id-reused', seq: null }
  }
  const code = decideDisposition(record, dispositionContext(database, frame, log, record, device))
  const told = { disposition: code === null ? 'accepted' : 'quarantined', code } as const
  const row = { seq: log.seq + 1, chain: chainNext(log.chain, jws, told, sha256) }
  const key = subjectKey(record.subject)
  statements.insert.run({
    ...row,
    ...told,
    eventId: frame.event.id,
    clubId: frame.event.clubId,
    id,
    jws,
    hash,
    kind: record.kind,
    subjectKey: key,
    deviceId: record.device,
    deviceSeq: record.deviceSeq,
    receivedAt: now,
  })
  append(log, { hash, record, disposition: dispositionOf(told) }, row)
  if (isKnown(record) && (record.kind === 'pass' || record.kind === 'band')) {
    const token = readToken(record.token)
    if (token !== null)
      statements.addPass.run({ eventId: frame.event.id, recordHash: hash, clubId: frame.event.clubId, subjectKey: key, passId: token.id })
  }
  if (isKnown(record) && 'notes' in record) for (const note of record.notes ?? []) work.noteSeq.set(note, row.seq)
  return { id, hash, outcome: code === null ? 'stored' : 'quarantined', code, seq: row.seq }
}

/** Keeps the texts that a record of this work names and that are what their hash says; any other is nobody's and is left. */
export function keepNotes({ statements, frame, log, noteSeq }: LogWork, notes: SyncPushRequest['notes']): void {
  for (const { hash, salt, text } of notes) {
    const seq = noteSeq.get(hash)
    if (noteHash(salt, text, sha256) !== hash) continue
    // A record that came before, its note after (the answer was lost between): the note is told with the next pull.
    statements.addNote.run({ hash, salt, text, eventId: frame.event.id, clubId: frame.event.clubId, seq: seq ?? log.seq })
  }
}
