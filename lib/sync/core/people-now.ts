import { isKnown, type AnyRecord, type Seated } from '@/lib/inspection/record'

/** Somebody in a car, and as what. */
export type Seat = Pick<Seated, 'person' | 'role'>

/**
 * Who sits in a car as the records about it leave it, in the order given: the rows, and whoever the desk has seated since. Removing is the office's, which changes
 * the rows in the same step; so a row is never taken away here, and who was seated and removed again does not come back. Gives the same list where nobody came.
 */
export function peopleNow<S extends Seat>(
  rows: readonly S[],
  records: readonly { readonly record: AnyRecord; readonly quarantined: boolean }[],
): readonly (S | Seat)[] {
  const seated = new Map<string, Seat>()
  for (const { record, quarantined } of records) {
    if (quarantined || !isKnown(record) || record.kind !== 'entry-changed' || record.change.what !== 'people') continue
    const { removed, seated: seat } = record.change
    for (const person of removed) seated.delete(person)
    if (seat !== undefined) seated.set(seat.person, { person: seat.person, role: seat.role })
  }
  for (const { person } of rows) seated.delete(person)
  return seated.size === 0 ? rows : [...rows, ...seated.values()]
}
