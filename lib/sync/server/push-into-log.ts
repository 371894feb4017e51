import 'server-only'
import type { Db } from '@/db/client'
import { transaction } from '@/db/transaction'
import type { SyncPushRequest, SyncPushResponse } from '@/lib/contracts/sync-push'
import { isKnown } from '@/lib/inspection/record'
import { subjectKey } from '@/lib/inspection/subject'
import { assert } from '@/lib/platform/assert'
import { sha256 } from '@/lib/platform/sha256'
import { chainNext, noteHash } from '../core/chain'
import { decideDisposition } from '../core/decide-disposition'
import { dispositionOf } from '../core/held-record'
import { readToken } from '../core/read-token'
import { dispositionContext } from './disposition-context'
import { eventFrame, type EventFrame } from './event-frame'
import { append, dropEventLog, eventLog, type EventLog } from './event-log'
import { logStatements, type LogStatements } from './log-statements'
import type { RefusedRecord, VerifiedRecord } from './verify-records'

type Answer = SyncPushResponse['answers'][number]

/** Who pushed, and what they said of themselves. */
export interface Pusher {
  readonly deviceId: string
  readonly unsent: number
}

interface Work {
  readonly database: Db
  readonly frame: EventFrame
  readonly log: EventLog
  readonly statements: LogStatements
  readonly noteSeq: Map<string, number>
  readonly now: number
}

/**
 * Takes verified records into the event's log in one transaction (rules S1, S2, S3, T1): each gets its number, its disposition and its place in the chain.
 * Nothing is folded here: who reads folds. All is committed, synchronously to the disk, before anything is answered.
 */
export function pushIntoLog(
  database: Db,
  eventId: string,
  records: readonly (VerifiedRecord | RefusedRecord)[],
  notes: SyncPushRequest['notes'],
  pusher: Pusher,
  now: number,
): { readonly answers: readonly Answer[]; readonly stored: number } {
  try {
    return transaction(database, () => {
      const frame = eventFrame(database, eventId)
      assert(frame !== null, `a push to event ${eventId}, which is not there`)
      const log = eventLog(database, eventId)
      const statements = logStatements(database)
      const work: Work = { database, frame, log, statements, noteSeq: new Map(), now }
      const before = log.seq
      const answers = records.map((record) => (record.state === 'refused' ? refusal(record) : take(work, record)))
      keepNotes(work, notes)
      const answered = answers.filter(({ outcome }) => outcome !== 'refused').length
      statements.contact.run({ at: now, unsent: Math.max(0, pusher.unsent - answered), deviceId: pusher.deviceId })
      return { answers, stored: log.seq - before }
    })
  } catch (error) {
    // What was appended in memory is not in the database.
    dropEventLog(database, eventId)
    throw error
  }
}

function refusal({ id, hash, code }: RefusedRecord): Answer {
  return { id, hash, outcome: 'refused', code, seq: null }
}

function take(work: Work, verified: VerifiedRecord): Answer {
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

/** Keeps the texts that a record of this push names and that are what their hash says; any other is nobody's and is left. */
function keepNotes({ statements, frame, log, noteSeq }: Work, notes: SyncPushRequest['notes']): void {
  for (const { hash, salt, text } of notes) {
    const seq = noteSeq.get(hash)
    if (noteHash(salt, text, sha256) !== hash) continue
    // A record that came before, its note after (the answer was lost between): the note is told with the next pull.
    statements.addNote.run({ hash, salt, text, eventId: frame.event.id, clubId: frame.event.clubId, seq: seq ?? log.seq })
  }
}
