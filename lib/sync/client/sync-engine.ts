import { PROTOCOL_VERSION } from '@/lib/contracts/protocol-version'
import { isKnown } from '@/lib/inspection/record'
import { recordKey, recordOfJws, sendingOrder, type StoredRecord } from '../core/held-record'
import { afterAnswers, afterRestore, forgotten, pulledRecord } from '../core/merge-held'
import { mergePull } from '../core/pull-merge'
import { afterPush, nextBatch, PUSH_LIMIT, type OutboxItem, type PushReply } from '../core/push-batch'
import type { DayProblemCode } from './day-problem'
import type { DayTools } from './day-tools'
import type { DeviceStore } from './device-store'
import { KEYS, type Enrolment, type PullState } from './enrolment'
import type { StoredNote } from './make-records'
import type { NoAnswer, SyncTransport, TransportReply } from './sync-transport'
import type { SyncPullResponse } from '@/lib/contracts/sync-pull'

/** What the engine reads and changes; the day client owns it. */
export interface SyncSide {
  readonly store: DeviceStore
  readonly tools: DayTools
  readonly transport: SyncTransport
  readonly enrolment: Enrolment
  readonly held: () => ReadonlyMap<string, StoredRecord>
  readonly notes: () => ReadonlyMap<string, StoredNote>
  readonly pull: () => PullState
  readonly snapshotVersion: () => string
  readonly certificates: () => readonly string[]
  /** Takes in what was just committed. */
  readonly took: (taken: Taken) => void
}

export interface Taken {
  readonly records: readonly StoredRecord[]
  readonly pull: PullState
  readonly notes?: readonly StoredNote[]
  readonly page?: Pick<SyncPullResponse, 'snapshot' | 'list'>
}

export interface Stretch {
  readonly moved: number
  readonly problem: DayProblemCode | null
}

/** One device's traffic with the server; one tab at a time holds the lock around it. */
export interface SyncEngine {
  readonly pushAll: () => Promise<Stretch>
  readonly pullAll: (progress?: (records: number, of: number) => void) => Promise<Stretch & { readonly again: boolean }>
}

export function syncEngine(side: SyncSide): SyncEngine {
  let limit = PUSH_LIMIT

  async function pushAll(): Promise<Stretch> {
    let moved = 0
    for (;;) {
      const items = outboxOf(side.held())
      const batch = nextBatch({ items, limit })
      if (batch.length === 0) return { moved, problem: null }
      const { reply, pull } = await timed(side, () => side.transport.push(pushRequest(side, batch, items.length)))
      const outcome = afterPush({ items, limit }, batch, pushReplyOf(reply))
      limit = outcome.outbox.limit
      const records = afterAnswers(side.held(), outcome)
      const lastPushAt = reply.state === 'answered' ? side.tools.now() : pull.lastPushAt
      if (records.length > 0) await take(side, { records, pull: { ...pull, lastPushAt } })
      moved += outcome.answered.length
      if (outcome.next === 'back-off') return { moved, problem: reply.state === 'unanswered' ? problemOf(reply.why) : 'refused-by-server' }
    }
  }

  async function pullAll(progress?: (records: number, of: number) => void): Promise<Stretch & { readonly again: boolean }> {
    let moved = 0
    for (;;) {
      const cursor = { seq: side.pull().seq, chain: side.pull().chain }
      const query = { event: side.enrolment.says.event, since: cursor.seq, at: cursor.chain, snapshot: side.snapshotVersion() }
      const { reply, pull } = await timed(side, () => side.transport.pull(query))
      if (reply.state !== 'answered') return { moved, problem: problemOf(reply.state === 'unanswered' ? reply.why : 'fault'), again: false }
      const page = reply.value
      const merged = mergePull(cursor, page)
      if (merged.state === 'broken') return { moved, problem: 'refused-by-server', again: false }
      if (merged.state === 'restored') {
        await take(side, { records: afterRestore(side.held().values()), pull: { ...pull, seq: 0, chain: '' } })
        return { moved, problem: null, again: true }
      }
      const records = merged.records.map((record) =>
        pulledRecord(record, recordOfJws(record.jws), side.enrolment.says.device, side.held().get(record.hash)),
      )
      const at = side.tools.now()
      const next: PullState = { ...pull, ...merged.cursor, ...(merged.more ? {} : { loaded: true, lastPullAt: at }) }
      await take(side, { records, pull: next, notes: page.notes, page })
      moved += records.length
      progress?.(merged.cursor.seq, page.head)
      if (merged.more) continue
      const lost = forgotten(side.held().values())
      if (lost.length > 0) await take(side, { records: lost, pull: side.pull() })
      return { moved, problem: null, again: lost.length > 0 }
    }
  }

  return { pushAll, pullAll }
}

/** One transaction for what was learned and how far it was learned: a cursor never stands past a record that is not on the disk. */
async function take(side: SyncSide, taken: Taken): Promise<void> {
  const { records, pull, notes = [], page } = taken
  await side.store.commit({
    put: [
      ...records.map((record) => [recordKey(record.hash), record] as const),
      ...notes.map((note) => [`n:${note.hash}`, note] as const),
      ...(page?.snapshot ? [[KEYS.snapshot, page.snapshot] as const] : []),
      ...(page?.list ? [[KEYS.list, page.list] as const] : []),
      [KEYS.pull, pull],
    ],
  })
  side.took(taken)
}

/** Asks, and learns the server's time from the answer; where only the clock was wrong, asks once more. */
async function timed<T extends { readonly serverTime: number }>(
  side: SyncSide,
  ask: () => Promise<TransportReply<T>>,
): Promise<{ readonly reply: TransportReply<T>; readonly pull: PullState }> {
  const first = await askOnce(side, ask)
  const wasLate =
    first.reply.state === 'unanswered' && first.reply.serverTime !== null && Math.abs(first.pull.offset - side.pull().offset) > 30_000
  if (!wasLate) return first
  side.transport.setOffset(first.pull.offset)
  return askOnce(side, ask)
}

async function askOnce<T extends { readonly serverTime: number }>(
  side: SyncSide,
  ask: () => Promise<TransportReply<T>>,
): Promise<{ readonly reply: TransportReply<T>; readonly pull: PullState }> {
  const sentAt = side.tools.now()
  const reply = await ask()
  const heardAt = side.tools.now()
  const serverTime = reply.state === 'answered' ? reply.value.serverTime : reply.state === 'unanswered' ? reply.serverTime : null
  const before = side.pull()
  if (serverTime === null || serverTime === 0) return { reply, pull: before }
  const offset = Math.round(serverTime - (sentAt + heardAt) / 2)
  side.transport.setOffset(offset)
  return { reply, pull: { ...before, offset, latestWall: heardAt } }
}

function outboxOf(held: ReadonlyMap<string, StoredRecord>): readonly OutboxItem[] {
  return [...held.values()].filter(({ out }) => out === 'unsent').sort(sendingOrder)
}

function pushRequest(side: SyncSide, batch: readonly OutboxItem[], unsent: number) {
  const hashes = new Set(batch.flatMap(({ jws }) => notesIn(jws)))
  return {
    protocol: PROTOCOL_VERSION,
    event: side.enrolment.says.event,
    certificates: [...certificatesFor(side, batch)],
    records: batch.map(({ jws }) => jws),
    notes: [...hashes].flatMap((hash) => side.notes().get(hash) ?? []),
    unsent,
  }
}

/** This device's own; those of others only while their records are sent too, which is after a restore. */
function certificatesFor(side: SyncSide, batch: readonly OutboxItem[]): ReadonlySet<string> {
  const held = side.held()
  const others = batch.some(({ hash }) => held.get(hash)?.mine === false)
  return new Set([side.enrolment.certificate, ...(others ? side.certificates() : [])])
}

function notesIn(jws: string): readonly string[] {
  const record = recordOfJws(jws)
  if (record === null || !isKnown(record) || !('notes' in record)) return []
  return record.notes ?? []
}

function pushReplyOf(reply: TransportReply<import('@/lib/contracts/sync-push').SyncPushResponse>): PushReply {
  if (reply.state === 'answered') return { state: 'answered', response: reply.value }
  return reply.state === 'too-much' ? reply : { state: 'unanswered' }
}

function problemOf(why: NoAnswer): DayProblemCode {
  if (why === 'refused') return 'refused-by-server'
  return why === 'too-old' ? 'too-old' : 'offline'
}
