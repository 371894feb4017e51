import { generateKeyPairSync } from 'node:crypto'
import { eq } from 'drizzle-orm'
import { openDatabase } from '@/db/client'
import { crewMember, device, devicePerson, entry, event, person } from '@/db/schema'
import { openPinnedBook } from '@/lib/sync/core/open-pinned-book'
import { checklistText, limitsText } from '@/db/schema'
import type { Book } from '@/lib/checklist/book'
import { CERTIFICATE_TYPE, type DeviceCertificate } from '@/lib/contracts/device-certificate'
import { DEVICE_TOKEN_TYPE } from '@/lib/contracts/device-token'
import { signJws } from '@/lib/platform/jws'
import { newId } from '@/lib/platform/ids'
import { serverKey } from '@/lib/platform/server-key'
import { sha256 } from '@/lib/platform/sha256'

/** A scrutineer's tablet, enrolled straight into a seeded database, and what it needs to know of the event. */
export interface BenchTablet {
  readonly event: typeof event.$inferSelect
  readonly entries: readonly (typeof entry.$inferSelect)[]
  readonly book: Book
  readonly id: string
  readonly actor: string
  readonly publicKey: string
  readonly certificate: string
  readonly sign: (payload: object, type: string) => string
  /** The `Authorization` header of one request. */
  readonly authorize: (method: 'POST', path: string, body: string) => string
}

export function enrolBenchTablet(file: string): BenchTablet {
  const database = openDatabase(file)
  const home = database.select().from(event).get()
  if (!home) throw new Error('the seed made no event')
  const keys = generateKeyPairSync('ed25519')
  const publicKey = keys.publicKey.export({ format: 'jwk' }).x ?? ''
  const [id, actor, at] = [newId(), newId(), Date.now()]
  const owner = { clubId: home.clubId, eventId: home.id }
  const claims: DeviceCertificate = {
    v: 1, device: id, event: home.id, kid: home.nextKid, publicKey, deviceName: 'Bench tablet', issuedAt: at,
    people: [{ id: actor, name: 'Bench Scrutineer', roles: ['scrutineer'] }],
  } // prettier-ignore
  const certificate = signJws(claims, CERTIFICATE_TYPE, serverKey(database, home.clubId).privateKey)
  database
    .insert(person)
    .values({ ...owner, id: actor, name: 'Bench Scrutineer' })
    .run()
  database
    .insert(crewMember)
    .values({ ...owner, id: newId(), personId: actor, role: 'scrutineer', state: 'accepted', askedAt: at, decidedAt: at })
    .run()
  database
    .insert(device)
    .values({ ...owner, id, kid: home.nextKid, name: 'Bench tablet', publicKey, certificate, state: 'active', enrolledAt: at })
    .run()
  database
    .insert(devicePerson)
    .values({ clubId: home.clubId, deviceId: id, personId: actor, roles: ['scrutineer'] })
    .run()
  database
    .update(event)
    .set({ nextKid: home.nextKid + 1 })
    .where(eq(event.id, home.id))
    .run()
  const entries = database.select().from(entry).where(eq(entry.eventId, home.id)).all()
  const texts = {
    checklists: textsOf(database.select().from(checklistText).all()),
    limits: textsOf(database.select().from(limitsText).all()),
  }
  const book = openPinnedBook(texts, home.checklistHash, home.limitsHash)
  if (!book) throw new Error('the seeded checklist does not open')
  database.$client.pragma('wal_checkpoint(TRUNCATE)')
  database.$client.close()
  const sign = (payload: object, type: string) => signJws(payload, type, keys.privateKey)
  const authorize = (method: 'POST', path: string, body: string) => {
    const iat = Math.floor(Date.now() / 1000)
    const token = { device: id, event: home.id, method, path, iat, exp: iat + 60, body: sha256(Buffer.from(body)) }
    return `Device ${sign(token, DEVICE_TOKEN_TYPE)}`
  }
  return { event: home, entries, book, id, actor, publicKey, certificate, sign, authorize }
}

function textsOf(rows: readonly { readonly hash: string; readonly body: string }[]): Readonly<Record<string, unknown>> {
  return Object.fromEntries(rows.map(({ hash, body }) => [hash, JSON.parse(body) as unknown]))
}
