import type { AnyRecord } from '@/lib/inspection/record'
import type { PushOutcome } from './push-batch'
import type { PulledRecord } from './pull-merge'
import type { StoredRecord } from './held-record'

/** Records as the server's answer leaves them; those it did not answer for are not among them. */
export function afterAnswers(
  held: ReadonlyMap<string, StoredRecord>,
  outcome: Pick<PushOutcome, 'answered' | 'setAside'>,
): readonly StoredRecord[] {
  const answered = outcome.answered.flatMap(({ hash, disposition, code }): StoredRecord[] => {
    const record = held.get(hash)
    return record === undefined ? [] : [{ ...record, out: 'sent', disposition, code }]
  })
  const aside = outcome.setAside.flatMap(({ hash, code }): StoredRecord[] => {
    const record = held.get(hash)
    if (record === undefined) return []
    return [record.mine ? { ...record, out: 'attention', code } : { ...record, out: 'kept' }]
  })
  return [...answered, ...aside]
}

/** A pulled record as the device keeps it: with the server's number and word, whatever was thought of it before. */
export function pulledRecord(
  pulled: PulledRecord,
  record: AnyRecord | null,
  device: string,
  before: StoredRecord | undefined,
): StoredRecord {
  const { hash, jws, seq, disposition, code } = pulled
  const told = { seq, lastSeq: null, disposition, code, out: 'sent' } as const
  if (before !== undefined) return { ...before, ...told }
  return { hash, jws, id: record?.id ?? hash, deviceSeq: record?.deviceSeq ?? 0, mine: record?.device === device, ...told }
}

/** Everything held, to be sent again to a server that was restored from an older copy (rule S4): nobody knows what it still has. */
export function afterRestore(held: Iterable<StoredRecord>): readonly StoredRecord[] {
  return [...held].map((record) => {
    const out = record.out === 'attention' ? 'attention' : 'unsent'
    return { ...record, out, seq: null, lastSeq: record.seq ?? record.lastSeq }
  })
}

/**
 * Records the server once answered for and which a complete pull did not bring: it was restored from a copy that ends before them, at a place where the chain
 * still fits. They are unsent again, or an acknowledged record would be lost (rule S4).
 */
export function forgotten(held: Iterable<StoredRecord>): readonly StoredRecord[] {
  return [...held].filter((record) => record.out === 'sent' && record.seq === null).map((record) => ({ ...record, out: 'unsent' }))
}
