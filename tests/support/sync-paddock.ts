import { randomBytes } from 'node:crypto'
import Database from 'better-sqlite3'
import { eq } from 'drizzle-orm'
import { drizzle } from 'drizzle-orm/better-sqlite3'
import { type Db, openDatabase } from '@/db/client'
import { migrateDatabase } from '@/db/migrate'
import * as tables from '@/db/schema'
import { hashJson, sha256Hex } from '@/lib/checklist/hash'
import { keepDevice } from '@/lib/devices/commands/keep-device'
import { deviceCertificate } from '@/lib/contracts/device-certificate'
import type { SyncPullRequest } from '@/lib/contracts/sync-pull'
import type { SyncPushRequest } from '@/lib/contracts/sync-push'
import type { Role } from '@/lib/permissions/policy'
import { deviceActor } from '@/lib/platform/device-actor'
import { adoptDevice } from '@/lib/platform/adopt-device'
import { newId } from '@/lib/platform/ids'
import { isRefusal } from '@/lib/platform/refusal'
import type { DayClient } from '@/lib/sync/client/day-client'
import { makeDeviceKey } from '@/lib/sync/client/device-key'
import { KEYS, type Enrolment } from '@/lib/sync/client/enrolment'
import { hashPin } from '@/lib/sync/client/pin'
import { openDay } from '@/lib/sync/client/open-day'
import { memoryDeviceStore, memoryDisk, type MemoryDisk } from '@/lib/sync/client/store-memory'
import type { TransportReply } from '@/lib/sync/client/sync-transport'
import { parseJws } from '@/lib/sync/core/jws-parse'
import { acceptPush } from '@/lib/sync/server/accept-push'
import { servePull } from '@/lib/sync/server/serve-pull'
import { fakeNetwork, type FakeNetwork, type Reachable } from './fake-network'
import { fakeTime, type FakeTime } from './fake-time'
import { paddockChecklist } from './paddock-book'

/** Sat 9 May 2026, 07:30 at the venue (UTC here). */
export const MORNING = Date.UTC(2026, 4, 9, 7, 30)
const LIMITS = { id: 'track-day', version: 1, title: 'Track day', rules: {} }
export const CHECKLIST_HASH = hashJson(paddockChecklist)
export const LIMITS_HASH = hashJson(LIMITS)
const [CLUB, EVENT] = [newId(), newId()]
export const PIN = '246813'

/** A phone of the crew: its disk outlives its pages. */
export interface Phone {
  readonly day: DayClient
  readonly disk: MemoryDisk
  readonly network: FakeNetwork
  readonly deviceId: string
  readonly people: readonly string[]
  /** Opens another page of the same phone. */
  readonly tab: () => Promise<DayClient>
  /** As if the page were killed: the next one knows what is on the disk. */
  readonly reload: () => Promise<DayClient>
}

export interface SyncPaddock {
  readonly time: FakeTime
  readonly event: string
  readonly database: () => Db
  readonly cars: readonly string[]
  readonly drivers: readonly string[]
  readonly phone: (...roles: (readonly Role[])[]) => Promise<Phone>
  readonly server: Reachable
  readonly backUp: () => Buffer
  readonly restore: (copy: Buffer) => void
  /** Changes rows as a command would. */
  readonly change: (work: (database: Db) => void) => void
  readonly rows: () => readonly (typeof tables.record.$inferSelect)[]
}

let migrated: Buffer | null = null

function migratedCopy(): Buffer {
  const database = openDatabase(':memory:')
  migrateDatabase(database)
  return database.$client.serialize()
}

/** A database that begins as this copy and lies in memory. */
function inMemory(copy: Buffer): Db {
  const client = new Database(copy)
  client.pragma('foreign_keys = ON')
  client.pragma('recursive_triggers = ON')
  return drizzle({ client, schema: tables })
}

/** A real server over a real database, and phones that reach it through a fake network under a fake clock. */
export async function aSyncPaddock({ cars = 2 } = {}): Promise<SyncPaddock> {
  const time = fakeTime(MORNING)
  let database = inMemory((migrated ??= migratedCopy()))
  const seeded = seedEvent(database, cars)
  let count = 0
  // Whoever asks is the device its own server row says; a forgotten one comes back by its certificate, as at the door of HTTP.
  function asDevice(device: string, certificate: string): Reachable {
    async function ask<T>(work: (actor: never, deps: never) => unknown): Promise<TransportReply<T>> {
      let actor = deviceActor(database, device)
      if (actor === null) {
        adoptDevice(database, deviceCertificate.parse(parseJws(certificate)?.payload), certificate, time.now)
        actor = deviceActor(database, device)
      }
      const deps = { database, now: time.now, origin: 'https://marram.example', userAgent: '', cookie: '', replyHeaders: new Headers() }
      const result = await work(actor as never, deps as never)
      if (isRefusal(result))
        return { state: 'unanswered', why: result.code === 'protocol-too-old' ? 'too-old' : 'refused', serverTime: time.now }
      return { state: 'answered', value: result as T }
    }
    return {
      push: (body: SyncPushRequest) => ask((actor, deps) => acceptPush({ body, params: {}, query: {} }, actor, deps)),
      pull: (query: SyncPullRequest) => ask((actor, deps) => servePull({ query, params: {}, body: {} }, actor, deps)),
    }
  }

  async function phone(...roles: (readonly Role[])[]): Promise<Phone> {
    count += 1
    const people = (roles.length === 0 ? [['scrutineer'] as const] : roles).map((held, index) =>
      aCrewMember(database, `Crew ${count}.${index + 1}`, held),
    )
    const key = await makeDeviceKey()
    let kept: ReturnType<typeof keepDevice> | null = null
    for (const person of people) kept = enrol(database, person, key.publicKey, `phone ${count}`)
    if (kept === null || isRefusal(kept)) throw new Error('the phone was not enrolled')
    const { certificate, device } = kept
    const enrolment: Enrolment = { certificate, says: deviceCertificate.parse(parseJws(certificate)?.payload), key }
    const disk = memoryDisk(`phone ${count}`)
    disk.values.set(KEYS.enrolment, enrolment)
    // Hashed lightly: a hundred thousand rounds for every phone of every test would be all they do.
    for (const { personId } of people) disk.values.set(`p:${personId}`, await hashPin(PIN, new Uint8Array(16), 10))
    const network = fakeNetwork(() => asDevice(device, certificate))
    const tab = async () =>
      openDay(memoryDeviceStore(disk), {
        transport: () => network.transport,
        network: null,
        tools: {
          now: () => time.now,
          newId,
          sha256: sha256Hex,
          randomBytes: (bytes) => new Uint8Array(randomBytes(bytes)),
          random: () => 0.5,
          setTimer: time.setTimer,
          clearTimer: time.clearTimer,
        },
      })
    const made = { day: await tab() }
    const first = people[0] as { readonly personId: string }
    await made.day.unlock(first.personId, PIN)
    return {
      get day() {
        return made.day
      },
      disk,
      network,
      deviceId: device,
      people: people.map(({ personId }) => personId),
      tab,
      reload: async () => {
        made.day.close()
        made.day = await tab()
        return made.day
      },
    }
  }

  return {
    time,
    event: EVENT,
    database: () => database,
    ...seeded,
    phone,
    server: asDevice('', ''),
    backUp: () => database.$client.serialize(),
    restore: (copy) => {
      database = inMemory(copy)
    },
    change: (work) => {
      work(database)
      const { snapshotVersion } = database.select().from(tables.event).where(eq(tables.event.id, EVENT)).get() ?? { snapshotVersion: 0 }
      database
        .update(tables.event)
        .set({ snapshotVersion: snapshotVersion + 1 })
        .where(eq(tables.event.id, EVENT))
        .run()
    },
    rows: () => database.select().from(tables.record).where(eq(tables.record.eventId, EVENT)).orderBy(tables.record.seq).all(),
  }
}

function seedEvent(database: Db, count: number): { readonly cars: readonly string[]; readonly drivers: readonly string[] } {
  const group = newId()
  database.insert(tables.club).values({ id: CLUB, name: 'Marram Track Days' }).run()
  database
    .insert(tables.checklistText)
    .values({ hash: CHECKLIST_HASH, body: JSON.stringify(paddockChecklist) })
    .run()
  database
    .insert(tables.limitsText)
    .values({ hash: LIMITS_HASH, body: JSON.stringify(LIMITS) })
    .run()
  database
    .insert(tables.event)
    .values({
      id: EVENT,
      clubId: CLUB,
      code: 7,
      name: 'Ottermere in May',
      venue: 'Ottermere Ring',
      timeZone: 'UTC',
      firstDay: '2026-05-09',
      lastDay: '2026-05-10',
      checklistHash: CHECKLIST_HASH,
      limitsHash: LIMITS_HASH,
      defaultDepth: 'standard',
      depthPolicy: 'all',
      listStaleMinutes: 30,
      nextKid: 1,
      nextEntryCode: count + 1,
      snapshotVersion: 1,
      createdAt: MORNING,
    })
    .run()
  database.insert(tables.runGroup).values({ id: group, clubId: CLUB, eventId: EVENT, name: 'A', order: 1, firstSessionAt: null }).run()
  const made = Array.from({ length: count }, (_, index) => aCar(database, group, index + 1))
  return { cars: made.map(({ entry }) => entry), drivers: made.map(({ driver }) => driver) }
}

function aCar(database: Db, groupId: string, code: number): { readonly entry: string; readonly driver: string } {
  const [car, entry, driver] = [newId(), newId(), newId()]
  const owner = { clubId: CLUB, eventId: EVENT }
  const plate = `OT${code + 10} KLM`
  database.insert(tables.car).values({ id: car, clubId: CLUB, model: 'Tarn 2', colour: 'blue', plate }).run()
  database
    .insert(tables.entry)
    .values({
      ...owner,
      id: entry,
      carId: car,
      code,
      number: String(46 + code),
      plate,
      groupId,
      facts: { cage: false, slicks: false },
      note: '',
      passengerSeats: 1,
      withdrawn: false,
    })
    .run()
  database
    .insert(tables.person)
    .values({ ...owner, id: driver, name: `Driver ${code}`, email: 'canary-mail@example.org', mobile: '+00 canary' })
    .run()
  database.insert(tables.entryPerson).values({ clubId: CLUB, entryId: entry, personId: driver, role: 'driver' }).run()
  return { entry, driver }
}

interface Member {
  readonly personId: string
  readonly roles: readonly Role[]
}

function aCrewMember(database: Db, name: string, roles: readonly Role[]): Member {
  const personId = newId()
  const owner = { clubId: CLUB, eventId: EVENT }
  database
    .insert(tables.person)
    .values({ ...owner, id: personId, name })
    .run()
  for (const role of roles) {
    database
      .insert(tables.crewMember)
      .values({ ...owner, id: newId(), personId, role: role as 'chief', state: 'accepted', askedAt: MORNING, decidedAt: MORNING })
      .run()
  }
  return { personId, roles }
}

function enrol(database: Db, { personId, roles }: Member, publicKey: string, name: string): ReturnType<typeof keepDevice> {
  const event = database.select().from(tables.event).where(eq(tables.event.id, EVENT)).get()
  return keepDevice(database, { event, personId, roles, accountId: null } as never, { name, publicKey }, MORNING)
}
