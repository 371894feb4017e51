import type { LogEntry } from './log-entry'
import { isKnown, type AnyRecord, type RecordKind, type RecordOf, type UnknownRecord } from './record'
import { subjectKey, type SubjectKey } from './subject'

/** A record of the log that has any effect at all, with how much (rule T1). */
export interface ReadEntry<R extends AnyRecord = AnyRecord> {
  readonly hash: string
  readonly record: R
  /** Not quarantined, or adopted by the chief: it may permit. Otherwise it can only stop. */
  readonly isFull: boolean
  /** Adoptions that gave it its effect back; empty where it never lost it. */
  readonly adoptedBy: readonly string[]
}

/** The records of one subject by kind, each list in the order of the hashes, so that nothing depends on arrival. */
export interface SubjectLog {
  readonly key: SubjectKey
  readonly of: <K extends RecordKind>(kind: K) => readonly ReadEntry<RecordOf<K>>[]
  /** Records of kinds this build does not know that say *stops* (rule T3). */
  readonly unknownStops: readonly ReadEntry<UnknownRecord>[]
}

/**
 * Reads the records of one subject (others are left out). Each counts once, however often it arrived; one whose key nobody
 * vouches for does not count at all.
 */
export function readLog(entries: readonly LogEntry[], key: SubjectKey): SubjectLog {
  return readOwn(
    entries.filter((entry) => subjectKey(entry.record.subject) === key),
    key,
  )
}

/** As `readLog`, for entries already known to be this subject's. */
export function readOwn(entries: readonly LogEntry[], key: SubjectKey): SubjectLog {
  const own = settled(entries)
  const adoptions = adoptionsOf(own)
  const byKind = new Map<string, ReadEntry[]>()
  const unknownStops: ReadEntry<UnknownRecord>[] = []
  for (const { hash, record, disposition } of own) {
    const quarantined = disposition.state === 'quarantined'
    const adoptedBy = quarantined ? (adoptions.get(hash) ?? []) : []
    const read = { hash, record, isFull: !quarantined || adoptedBy.length > 0, adoptedBy }
    if (isKnown(record)) push(byKind, record.kind, read)
    else if (record.effect === 'stops') unknownStops.push({ ...read, record })
  }
  return {
    key,
    of: <K extends RecordKind>(kind: K) => (byKind.get(kind) ?? []) as unknown as readonly ReadEntry<RecordOf<K>>[],
    unknownStops,
  }
}

/** One entry per hash, sorted by hash; where a record came both unsent and back from the server, the server's word holds. */
function settled(entries: readonly LogEntry[]): readonly LogEntry[] {
  const byHash = new Map<string, LogEntry>()
  for (const entry of entries) {
    const known = byHash.get(entry.hash)
    if (!known || authority(entry) > authority(known)) byHash.set(entry.hash, entry)
  }
  return [...byHash.values()].filter((entry) => !isInert(entry)).sort((a, b) => (a.hash < b.hash ? -1 : 1))
}

function authority({ disposition }: LogEntry): number {
  if (disposition.state === 'provisional') return 0
  if (disposition.state === 'accepted') return 1
  return disposition.code === 'unknown-enrolment' ? 2 : 3
}

function isInert({ disposition }: LogEntry): boolean {
  return disposition.state === 'quarantined' && disposition.code === 'unknown-enrolment'
}

function adoptionsOf(entries: readonly LogEntry[]): ReadonlyMap<string, string[]> {
  const adoptions = new Map<string, string[]>()
  for (const { hash, record, disposition } of entries) {
    if (!isKnown(record) || record.kind !== 'adopted' || disposition.state === 'quarantined') continue
    push(adoptions, record.adopts, hash)
  }
  return adoptions
}

function push<T>(map: Map<string, T[]>, key: string, value: T): void {
  const list = map.get(key)
  if (list) list.push(value)
  else map.set(key, [value])
}
