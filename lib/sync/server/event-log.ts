import 'server-only'
import type { Db } from '@/db/client'
import type { LogEntry } from '@/lib/inspection/log-entry'
import { isKnown, type AnyRecord, type RecordOf } from '@/lib/inspection/record'
import { subjectKey, type SubjectKey } from '@/lib/inspection/subject'
import { dispositionOf, recordOfJws } from '../core/held-record'
import { logStatements, type LogRow } from './log-statements'

/** An event's log opened in memory: parsed once, shared by push, pull and projections of this process. */
export interface EventLog {
  seq: number
  chain: string
  readonly bySubject: Map<SubjectKey, LogEntry[]>
  readonly byHash: Map<string, LogEntry>
  /** Of each subject, what a record's disposition depends on: accepted `presented` records, and what changed about an entry. */
  readonly presented: Map<SubjectKey, { readonly hash: string; readonly record: RecordOf<'presented'> }[]>
  readonly changes: Map<SubjectKey, { readonly record: AnyRecord; readonly quarantined: boolean }[]>
  /** Moves on whenever a record about the event itself came. */
  eventVersion: number
}

// Next bundles routes apart; push and pull must share one copy, or each would parse the log again.
const holder = globalThis as typeof globalThis & { lockwireEventLogs?: WeakMap<object, Map<string, EventLog>> }
const PAGE = 1_000

/**
 * The event's log as the database has it at this moment; to be called inside a transaction. What is in memory is trusted only as far as its chain hash is the
 * database's own: after a rollback, a restore or another process's write it is read on, or again from the start.
 */
export function eventLog(database: Db, eventId: string): EventLog {
  const statements = logStatements(database)
  const logs = logsOf(database)
  const head = statements.head.get(eventId) ?? { seq: 0, chain: '' }
  let log = logs.get(eventId)
  if (log !== undefined && log.seq === head.seq && log.chain === head.chain) return log
  const fits = log !== undefined && log.seq < head.seq && (log.seq === 0 || statements.at.get(eventId, log.seq)?.chain === log.chain)
  if (log === undefined || !fits) log = emptyLog()
  while (log.seq < head.seq) for (const row of statements.after.all(eventId, log.seq, PAGE)) appendRow(log, row)
  logs.set(eventId, log)
  return log
}

/** Adds a row that stands in the database, or will when this transaction commits. */
export function append(log: EventLog, entry: LogEntry, row: Pick<LogRow, 'seq' | 'chain'>): void {
  log.seq = row.seq
  log.chain = row.chain
  const key = subjectKey(entry.record.subject)
  const { hash, record, disposition } = entry
  addTo(log.bySubject, key, entry)
  log.byHash.set(hash, entry)
  if (isKnown(record) && record.kind === 'presented' && disposition.state === 'accepted') addTo(log.presented, key, { hash, record })
  if (isKnown(record) && record.kind === 'entry-changed')
    addTo(log.changes, key, { record, quarantined: disposition.state === 'quarantined' })
  if ('event' in entry.record.subject) log.eventVersion += 1
}

function emptyLog(): EventLog {
  return { seq: 0, chain: '', bySubject: new Map(), byHash: new Map(), presented: new Map(), changes: new Map(), eventVersion: 0 }
}

function addTo<T>(map: Map<SubjectKey, T[]>, key: SubjectKey, value: T): void {
  const own = map.get(key)
  if (own === undefined) map.set(key, [value])
  else own.push(value)
}

/** Forgets what is in memory: after a transaction that was rolled back. */
export function dropEventLog(database: Db, eventId: string): void {
  logsOf(database).delete(eventId)
}

function appendRow(log: EventLog, row: LogRow): void {
  const record = recordOfJws(row.jws)
  if (record === null) throw new Error(`impossible: record ${row.seq} of the log cannot be read`)
  append(log, { hash: row.hash, record, disposition: dispositionOf(row) }, row)
}

function logsOf(database: Db): Map<string, EventLog> {
  holder.lockwireEventLogs ??= new WeakMap()
  const logs = holder.lockwireEventLogs.get(database.$client) ?? new Map<string, EventLog>()
  holder.lockwireEventLogs.set(database.$client, logs)
  return logs
}
