import { isKnown, type AnyRecord } from '@/lib/inspection/record'

/** What `entry-changed` records may change about a car at an event. Whether it is withdrawn is the fold's to say. */
export interface ChangeableEntry {
  readonly number: string
  readonly plateTail: string
  readonly group: string
}

/**
 * An entry as the records about it leave it, in the order given: the last change of each thing holds, and one that was quarantined changes nothing.
 * Gives the same object back where nothing changed.
 */
export function entryNow<E extends ChangeableEntry>(
  entry: E,
  records: readonly { readonly record: AnyRecord; readonly quarantined: boolean }[],
): E {
  let now = entry
  for (const { record, quarantined } of records) {
    if (quarantined || !isKnown(record) || record.kind !== 'entry-changed') continue
    const { change } = record
    if (change.what === 'number') now = { ...now, number: change.number }
    if (change.what === 'plate') now = { ...now, plateTail: change.plateTail }
    if (change.what === 'group') now = { ...now, group: change.group }
  }
  return now
}
