import { createHash } from 'node:crypto'
import { readFileSync } from 'node:fs'
import { eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import * as tables from '@/db/schema'
import { newId } from '@/lib/platform/ids'
import { aClub } from './a-club'

/** Everything of one event that somebody might see who should not; each word names club, event and what it is. */
export interface CanaryEvent {
  readonly event: string
  readonly entry: string
  readonly car: string
  readonly driver: string
  readonly photo: string
  /** The words of this event that nobody outside it may ever be sent. */
  readonly words: readonly string[]
  /** Address and telephone: only for whoever may see contacts. */
  readonly contacts: readonly string[]
}

const read = (file: string) => readFileSync(new URL(`../../checklists/${file}`, import.meta.url), 'utf8')
const CHECKLIST = read('closed-circuit/v2.json')
const LIMITS = read('limits/track-day.json')
const sha256 = (text: string) => createHash('sha256').update(text).digest('hex')

/** A club with accounts to be made, and events whose every row carries a canary. */
export async function aClubWithCanaries(database: Db, name: string) {
  const club = await aClub(database, name)
  let code = 0
  const addCanaryEvent = (): CanaryEvent => {
    code += 1
    const event = club.addEvent(code)
    const tag = `${name.replaceAll(' ', '')}${String(code)}`
    const word = (what: string) => `canary-${tag}-${what}`
    useShippedBook(database, event)
    return { event, ...addRows(database, club.clubId, event, word) }
  }
  return { ...club, addCanaryEvent }
}

function useShippedBook(database: Db, event: string): void {
  const [checklistHash, limitsHash] = [sha256(CHECKLIST), sha256(LIMITS)]
  database.insert(tables.checklistText).values({ hash: checklistHash, body: CHECKLIST }).onConflictDoNothing().run()
  database.insert(tables.limitsText).values({ hash: limitsHash, body: LIMITS }).onConflictDoNothing().run()
  database.update(tables.event).set({ checklistHash, limitsHash }).where(eq(tables.event.id, event)).run()
}

function addRows(database: Db, clubId: string, eventId: string, word: (what: string) => string): Omit<CanaryEvent, 'event'> {
  const [group, car, entry, driver] = [newId(), newId(), newId(), newId()]
  const owner = { clubId, eventId }
  const contacts = [`${word('mail')}@example.org`.toLowerCase(), word('mobile')]
  const plate = word('plate').toUpperCase()
  const photo = sha256(word('photo'))
  database
    .insert(tables.runGroup)
    .values({ ...owner, id: group, name: word('group'), order: 1, firstSessionAt: null })
    .run()
  database
    .insert(tables.car)
    .values({ id: car, clubId, model: word('model'), colour: word('colour'), plate })
    .run()
  const numbered = { code: 1, number: '47', plate, groupId: group, facts: {}, note: word('note'), passengerSeats: 1, withdrawn: false }
  database
    .insert(tables.entry)
    .values({ ...owner, ...numbered, id: entry, carId: car })
    .run()
  database
    .insert(tables.person)
    .values({ ...owner, id: driver, name: word('driver'), email: contacts[0] ?? '', mobile: contacts[1] ?? '' })
    .run()
  database.insert(tables.entryPerson).values({ clubId, entryId: entry, personId: driver, role: 'driver' }).run()
  database
    .insert(tables.device)
    .values({
      ...owner,
      id: newId(),
      kid: 1,
      name: word('device'),
      publicKey: word('key'),
      certificate: '',
      state: 'active',
      enrolledAt: 0,
    })
    .run()
  database
    .insert(tables.mailOutbox)
    .values({
      ...owner,
      id: newId(),
      entryId: entry,
      kind: 'invitation',
      to: contacts[0] ?? '',
      subject: word('subject'),
      text: word('text'),
      sameAs: word('same'),
      createdAt: 0,
      nextTryAt: 0,
    })
    .run()
  database
    .insert(tables.photo)
    .values({ ...owner, hash: photo, storedHash: photo, accountId: null, deviceId: null, width: 1, height: 1, bytes: 1, receivedAt: 0 })
    .run()
  const words = ['group', 'model', 'colour', 'note', 'driver', 'device', 'key', 'subject', 'text'].map(word)
  return { entry, car, driver, photo, words: [...words, plate], contacts }
}
