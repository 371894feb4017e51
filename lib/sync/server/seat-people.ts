import 'server-only'
import { and, eq, sql } from 'drizzle-orm'
import { entry, entryPerson, event, note, person } from '@/db/schema'
import type { SyncPushRequest } from '@/lib/contracts/sync-push'
import { isKnown, type AnyRecord, type Seated } from '@/lib/inspection/record'
import { sha256 } from '@/lib/platform/sha256'
import { noteHash } from '../core/chain'
import type { LogWork } from './take-record'

/** A name as rows keep it: no control or direction signs, at most so long. */
const LONGEST_NAME = 120
const NAMELESS = 'Name not sent'

/**
 * Gives whoever was seated at the desk their rows, in the transaction of the push: pages, mails and reports read people from rows. Only what was accepted seats
 * anybody; a person or car of another event is left alone. `records` are those this push stored and believed.
 */
export function seatPeople(work: LogWork, records: readonly AnyRecord[], notes: SyncPushRequest['notes']): void {
  const seats = records.flatMap((record) => {
    if (!isKnown(record) || record.kind !== 'entry-changed' || record.change.what !== 'people' || !('car' in record.subject)) return []
    const { seated } = record.change
    return seated === undefined ? [] : [{ seated, car: record.subject.car, name: nameOf(work, record.notes?.[0], notes) }]
  })
  const seatedAny = seats.filter((seat) => seatOne(work, seat)).length > 0
  if (!seatedAny) return
  const { database, frame } = work
  database
    .update(event)
    .set({ snapshotVersion: sql`${event.snapshotVersion} + 1` })
    .where(eq(event.id, frame.event.id))
    .run()
}

interface SeatToTake {
  readonly seated: Seated
  readonly car: string
  readonly name: string | null
}

function seatOne({ database, frame }: LogWork, { seated, car, name }: SeatToTake): boolean {
  const { id: eventId, clubId } = frame.event
  if (!frame.entries.has(car)) return false
  const known = database.select({ eventId: person.eventId }).from(person).where(eq(person.id, seated.person)).get()
  if (known !== undefined && known.eventId !== eventId) return false
  if (known === undefined)
    database
      .insert(person)
      .values({ id: seated.person, clubId, eventId, accountId: null, name: name ?? NAMELESS, minor: seated.minor ?? true })
      .run()
  const inCar = and(eq(entryPerson.entryId, car), eq(entryPerson.personId, seated.person))
  const sits = database.select({ role: entryPerson.role }).from(entryPerson).where(inCar).get()
  if (sits === undefined) database.insert(entryPerson).values({ clubId, entryId: car, personId: seated.person, role: seated.role }).run()
  // Whoever edits the entry in the office at this moment must see it: their list of people is older than this one.
  database
    .update(entry)
    .set({ version: sql`${entry.version} + 1` })
    .where(eq(entry.id, car))
    .run()
  return true
}

function nameOf({ database }: LogWork, hash: string | undefined, notes: SyncPushRequest['notes']): string | null {
  if (hash === undefined) return null
  const sent = notes.find((one) => one.hash === hash && noteHash(one.salt, one.text, sha256) === hash)
  const text = sent?.text ?? database.select({ text: note.text }).from(note).where(eq(note.hash, hash)).get()?.text ?? ''
  const name = text
    .replace(/[\p{Cc}\p{Cf}]/gu, ' ')
    .replace(/\s+/g, ' ')
    .trim()
    .slice(0, LONGEST_NAME)
  return name === '' ? null : name
}
