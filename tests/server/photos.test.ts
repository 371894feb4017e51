import { eq } from 'drizzle-orm'
import { afterEach, beforeEach, expect, test } from 'vitest'
import { PUT, GET } from '@/app/api/photos/[hash]/route'
import { account, car, crewMember, declaration, device, entry, entryPerson, kit, person, photo, runGroup } from '@/db/schema'
import { PHOTO_LIMIT_BYTES, type PhotoView } from '@/lib/contracts/photos'
import { resetAllowances } from '@/lib/http/rate'
import { memoryPhotoStore } from '@/lib/photos/memory-photo-store'
import { usePhotoStore } from '@/lib/photos/served-photo-store'
import { newId } from '@/lib/platform/ids'
import { startSession } from '@/lib/platform/session'
import { sha256 } from '@/lib/platform/sha256'
import { enrol } from '@/lib/devices/commands/enrol'
import { handle } from '@/lib/http/server'
import { enrolDevice } from '@/lib/contracts/devices'
import { aClub, aPhone, aToken } from '../support/a-club'
import { ask, ORIGIN } from '../support/ask'
import { freshDatabase } from '../support/fresh-database'
import { colourAt, phonePhoto, picture } from '../support/pictures'

let fresh: ReturnType<typeof freshDatabase>
let club: Awaited<ReturnType<typeof aClub>>
let event: string
let faults: ('full' | 'failed')[]
let sent: Buffer
let hash: string

beforeEach(async () => {
  fresh = freshDatabase()
  resetAllowances()
  usePhotoStore(memoryPhotoStore((faults = [])))
  club = await aClub(fresh.database)
  event = club.addEvent()
  sent = await phonePhoto({ orientation: 6 })
  hash = sha256(sent)
})
afterEach(() => fresh.close())

type Who = { readonly cookie: string } | { readonly device: Device }
interface Device {
  readonly id: string
  readonly event: string
  readonly key: ReturnType<typeof aPhone>['privateKey']
}

const signedIn = async (accountId: string) => ({ cookie: (await startSession(fresh.database, accountId, '')).split(';')[0] ?? '' })
const anAccount = async (role: 'organiser' | 'entrant' | 'scrutineer' | 'marshal', email = `${role}@marram.example`) => {
  const id = club.addAccount(role, email)
  return { id, ...(await signedIn(id)) }
}

async function aCrewDevice(of = event, name = 'phone'): Promise<{ readonly device: Device }> {
  const { id, cookie } = await anAccount('scrutineer', `${name}@marram.example`)
  club.addCrew(of, id, 'scrutineer')
  const phone = aPhone()
  const body = { event: of, name, publicKey: phone.publicKey }
  const { json } = await ask<{ readonly device: string }>(handle(enrolDevice, enrol), {
    method: 'POST',
    path: '/api/devices',
    body,
    cookie,
  })
  return { device: { id: json.device, event: of, key: phone.privateKey } }
}

function headersOf(who: Who, method: string, path: string, body: Uint8Array): Record<string, string> {
  if ('cookie' in who) return { cookie: who.cookie, origin: ORIGIN }
  const { id, event: of, key } = who.device
  return { authorization: `Device ${aToken(key, { device: id, event: of, method, path, nowMs: Date.now(), body })}` }
}

async function puts(who: Who, bytes: Uint8Array = sent, name = sha256(bytes)) {
  const path = `/api/photos/${name}`
  const init = { method: 'PUT', headers: headersOf(who, 'PUT', path, bytes), body: new Uint8Array(bytes) }
  const response = await PUT(new Request(`${ORIGIN}${path}`, init), { params: Promise.resolve({ hash: name }) })
  return { status: response.status, headers: response.headers, json: (await response.json()) as PhotoView & { code: string; what: string } }
}

async function gets(who: Who, name = hash, more: Record<string, string> = {}) {
  const path = `/api/photos/${name}`
  const headers = { ...headersOf(who, 'GET', path, new Uint8Array()), ...more }
  const response = await GET(new Request(`${ORIGIN}${path}`, { headers }), { params: Promise.resolve({ hash: name }) })
  return { status: response.status, headers: response.headers, bytes: new Uint8Array(await response.arrayBuffer()) }
}

test('[S9] what a crew device sends is kept upright, re-encoded and without metadata, and served to it', async () => {
  const phone = await aCrewDevice()
  expect(await puts(phone)).toMatchObject({ status: 200, json: { hash, width: 300, height: 400 } })
  const { status, headers, bytes } = await gets(phone)

  expect(status).toBe(200)
  expect(headers.get('content-type')).toBe('image/jpeg')
  expect(headers.get('x-content-type-options')).toBe('nosniff')
  expect(headers.get('cache-control')).toMatch(/^private, /)
  expect(Buffer.from(bytes).includes('CANARY')).toBe(false)
  expect(sha256(bytes)).not.toBe(hash)
  expect(await colourAt(bytes, 0.5, 0.1)).toBe('red')
  expect(fresh.database.select().from(photo).get()).toMatchObject({ hash, eventId: event, deviceId: phone.device.id, accountId: null })
})

test('[S9] sent again, by five at once, it is one photograph', async () => {
  const phone = await aCrewDevice()
  const answers = await Promise.all([1, 2, 3, 4, 5].map(() => puts(phone)))

  expect(new Set(answers.map(({ status, json }) => `${status} ${json.hash}`))).toEqual(new Set([`200 ${hash}`]))
  expect(fresh.database.select().from(photo).all()).toHaveLength(1)
})

test('what arrives under another hash than its own was changed on the way, and is not kept', async () => {
  const phone = await aCrewDevice()
  expect(await puts(phone, sent, 'a'.repeat(64))).toMatchObject({ status: 422, json: { code: 'photo-other-hash' } })
  expect(await puts(phone, sent.subarray(0, sent.byteLength - 9), hash)).toMatchObject({ status: 422, json: { code: 'photo-other-hash' } })
  expect(fresh.database.select().from(photo).all()).toEqual([])
})

test.each([
  ['nothing', 415, 'photo-not-one', async () => Buffer.alloc(0)],
  ['text', 415, 'photo-not-one', async () => Buffer.from('{"a":"photo that is no photo"}')],
  ['an SVG', 415, 'photo-not-one', async () => Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"/>')],
  ['half a JPEG', 422, 'photo-unreadable', async () => (await phonePhoto()).subarray(0, 1500)],
  ['60 MP', 422, 'photo-too-many-pixels', () => picture(10_000, 6_000).png().toBuffer()],
])('%s is refused with %i and words', async (_, status, code, make) => {
  const answer = await puts(await aCrewDevice(), await make())

  expect([answer.status, answer.json.code]).toEqual([status, code])
  expect(answer.json.what).toMatch(/[a-z].*\.$/)
  expect(answer.headers.get('content-type')).toBe('application/problem+json')
})

test('ten megabytes are the limit, one byte more is refused, and neither is read further', async () => {
  const phone = await aCrewDevice()

  expect(await puts(phone, new Uint8Array(PHOTO_LIMIT_BYTES))).toMatchObject({ status: 415 })
  expect(await puts(phone, new Uint8Array(PHOTO_LIMIT_BYTES + 1))).toMatchObject({ status: 413, json: { code: 'too-large' } })
  expect(await puts(phone, new Uint8Array(11_000_000))).toMatchObject({ status: 413 })
})

test('forty at once: each is kept or told to come again, and coming again all are kept', async () => {
  const phone = await aCrewDevice()
  const forty = await Promise.all(
    Array.from({ length: 40 }, (_, index) =>
      picture(300 + index, 200)
        .jpeg()
        .toBuffer(),
    ),
  )
  let left = forty
  for (let rounds = 0; left.length > 0 && rounds < 40; rounds += 1) {
    const answers = await Promise.all(left.map((bytes) => puts(phone, bytes)))
    expect(answers.map(({ status }) => status).filter((status) => status !== 200 && status !== 503)).toEqual([])
    left = left.filter((_, index) => answers[index]?.status === 503)
  }

  expect(fresh.database.select().from(photo).all()).toHaveLength(40)
})

test('a full disk is told as such, nothing is written, and the next try may succeed', async () => {
  const phone = await aCrewDevice()
  faults.push('full')
  expect(await puts(phone)).toMatchObject({ status: 507, json: { code: 'no-room' } })
  expect(fresh.database.select().from(photo).all()).toEqual([])

  expect((await puts(phone)).status).toBe(200)
})

test('a photograph whose bytes were lost is mended by sending it again', async () => {
  const phone = await aCrewDevice()
  await puts(phone)
  usePhotoStore(memoryPhotoStore())
  expect((await gets(phone)).status).toBe(404)
  expect((await puts(phone)).status).toBe(200)

  expect((await gets(phone)).status).toBe(200)
})

test('a retired tablet still hands in what its fails show, and is shown nothing any more', async () => {
  const phone = await aCrewDevice()
  fresh.database.update(device).set({ state: 'retired' }).where(eq(device.id, phone.device.id)).run()

  expect((await puts(phone)).status).toBe(200)
  expect((await gets(phone)).status).toBe(403)
})

test('a photograph of an event is seen by its crew and the club’s organisers, and is not there for anybody else', async () => {
  await puts(await aCrewDevice())
  const other = await aCrewDevice(club.addEvent(2), 'other')
  const organiser = await anAccount('organiser')
  const entrant = await anAccount('entrant')
  const marshal = await anAccount('marshal')
  club.addCrew(event, marshal.id, 'marshal')
  const foreign = await (async () => {
    club = await aClub(fresh.database, 'Another club')
    return anAccount('organiser', 'else@where.example')
  })()
  const seenBy = await Promise.all([organiser, marshal, other, entrant, foreign, { cookie: '' }].map((who) => gets(who)))

  expect(seenBy.map(({ status }) => status)).toEqual([200, 200, 404, 404, 404, 401])
  expect((await gets(organiser, 'b'.repeat(64))).status).toBe(404)
})

test('somebody whose crew role ended, sees no more', async () => {
  await puts(await aCrewDevice())
  const marshal = await anAccount('marshal')
  club.addCrew(event, marshal.id, 'marshal')
  expect((await gets(marshal)).status).toBe(200)
  fresh.database.update(crewMember).set({ state: 'ended' }).where(eq(crewMember.role, 'marshal')).run()

  expect((await gets(marshal)).status).toBe(404)
})

test('an entrant’s photograph is their own, until a declaration names it before the crew of that event', async () => {
  const entrant = await anAccount('entrant')
  const another = await anAccount('entrant', 'another@marram.example')
  const phone = await aCrewDevice()
  const elsewhere = await aCrewDevice(club.addEvent(2), 'other')
  expect((await puts(entrant)).status).toBe(200)
  expect(fresh.database.select().from(photo).get()).toMatchObject({ eventId: null, accountId: entrant.id, deviceId: null })
  const seen = async () => (await Promise.all([entrant, another, phone, elsewhere].map((who) => gets(who)))).map(({ status }) => status)
  expect(await seen()).toEqual([200, 404, 404, 404])

  declares(anEntry(event, entrant.id), { harness: { photo: hash } })
  expect(await seen()).toEqual([200, 404, 200, 404])
})

test('two entrants who keep the same picture in their kit both see it, whoever sent it first', async () => {
  const [one, two] = [await anAccount('entrant'), await anAccount('entrant', 'two@marram.example')]
  await puts(one)
  await puts(two)
  expect((await gets(two)).status).toBe(404)
  const values = { standard: 'fia-8859-2015' }
  fresh.database
    .insert(kit)
    .values({ id: newId(), clubId: club.clubId, accountId: two.id, kind: 'helmet', name: 'white', values, photoHash: hash, updatedAt: 0 })
    .run()

  expect((await gets(two)).status).toBe(200)
})

test('what was seen of a car at an earlier event is shown to the crew of a later one it is entered for', async () => {
  await puts(await aCrewDevice())
  const later = club.addEvent(2)
  const phone = await aCrewDevice(later, 'later')
  const carId = anEntry(event, null).carId
  expect((await gets(phone)).status).toBe(404)
  anEntry(later, null, carId)

  expect((await gets(phone)).status).toBe(200)
})

test('an account without a role in the club keeps no photographs', async () => {
  const nobody = await anAccount('marshal')
  expect(fresh.database.select().from(account).where(eq(account.id, nobody.id)).get()?.roles).toEqual([])

  expect((await puts(nobody)).status).toBe(403)
})

test('an unchanged photograph does not travel twice, and the right to see it is asked all the same', async () => {
  await puts(await aCrewDevice())
  const organiser = await anAccount('organiser')
  const entrant = await anAccount('entrant')
  const etag = (await gets(organiser)).headers.get('etag') ?? ''
  const again = await gets(organiser, hash, { 'if-none-match': etag })

  expect([again.status, again.bytes.byteLength]).toEqual([304, 0])
  expect((await gets(entrant, hash, { 'if-none-match': etag })).status).toBe(404)
})

function anEntry(of: string, driver: string | null, ofCar: string | null = null): { readonly entryId: string; readonly carId: string } {
  const [entryId, carId, groupId, personId] = [newId(), ofCar ?? newId(), newId(), newId()]
  const { clubId } = club
  const { database } = fresh
  if (ofCar === null) database.insert(car).values({ id: carId, clubId, model: 'Oriel', colour: 'orange', plate: 'AH99DSX' }).run()
  database.insert(runGroup).values({ id: groupId, clubId, eventId: of, name: groupId, order: 1 }).run()
  const own = { id: entryId, clubId, eventId: of, carId, groupId, code: 1, number: '47', plate: 'AH99 DSX' }
  database
    .insert(entry)
    .values({ ...own, facts: {}, note: '', passengerSeats: 0, withdrawn: false })
    .run()
  database.insert(person).values({ id: personId, clubId, eventId: of, accountId: driver, name: 'A driver' }).run()
  database.insert(entryPerson).values({ clubId, entryId, personId, role: 'driver' }).run()
  return { entryId, carId }
}

function declares({ entryId }: { readonly entryId: string }, body: Readonly<Record<string, unknown>>): void {
  fresh.database.insert(declaration).values({ id: newId(), clubId: club.clubId, entryId, version: 1, body, signedAt: 1 }).run()
}
