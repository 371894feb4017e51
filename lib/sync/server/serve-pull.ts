import 'server-only'
import type { Db } from '@/db/client'
import type { SyncPullRequest, syncPull, SyncPullResponse } from '@/lib/contracts/sync-pull'
import type { Command } from '@/lib/platform/command'
import { refuse } from '@/lib/platform/refusal'
import { CHAIN_START } from '../core/chain'
import { daySnapshotOf } from './day-snapshot-of'
import { eventFrame, type EventFrame } from './event-frame'
import { eventLog } from './event-log'
import { eventPassList } from './event-pass-list'
import { logStatements } from './log-statements'

/** Records a page carries at most. */
export const PULL_PAGE = 500

/** Answers `GET /api/sync/pull` from one read transaction (rule S4). */
export const servePull: Command<typeof syncPull> = ({ query }, actor, { database, now, origin }) => {
  if (query.event !== actor.eventId) return refuse('missing')
  return database.$client.transaction(() => {
    const frame = eventFrame(database, query.event)
    return frame === null ? refuse('missing') : pullFrom(database, frame, query, origin, now)
  })()
}

function pullFrom(database: Db, frame: EventFrame, query: SyncPullRequest, origin: string, now: number): SyncPullResponse {
  const statements = logStatements(database)
  const head = statements.head.get(query.event)?.seq ?? 0
  const known = query.since === 0 ? CHAIN_START : statements.at.get(query.event, query.since)?.chain
  if (known !== query.at) {
    return {
      restored: true,
      records: [],
      notes: [],
      more: false,
      head,
      snapshot: null,
      list: null,
      serverTime: now,
      seq: 0,
      chain: CHAIN_START,
    }
  }
  const records = statements.after.all(query.event, query.since, PULL_PAGE)
  const last = records.at(-1)
  const seq = last?.seq ?? query.since
  const more = seq < head
  const notes = statements.notes.all(query.event, query.since, seq)
  const page = { restored: false, records, notes, more, head, serverTime: now, seq, chain: last?.chain ?? query.at }
  // What is made of the whole log goes with its end only: a list beside half a log would let a car out that the other half holds.
  if (more) return { ...page, snapshot: null, list: null }
  const log = eventLog(database, query.event)
  const snapshot = daySnapshotOf(database, frame, log, origin)
  const list = eventPassList(database, frame, log, snapshot, now)
  return { ...page, snapshot: snapshot.version === query.snapshot ? null : snapshot, list }
}
