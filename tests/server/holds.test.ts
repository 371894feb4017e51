import { expect, test } from 'vitest'
import * as tables from '@/db/schema'
import { holds, type Holds } from '@/lib/contracts/holds'
import { voidPass } from '@/lib/holds/commands/void-pass'
import { seeHolds } from '@/lib/holds/queries/see-holds'
import type { AccountActor } from '@/lib/platform/actor'
import { newId } from '@/lib/platform/ids'
import { isRefusal } from '@/lib/platform/refusal'
import { appendServerRecords } from '@/lib/sync/server/append-server-records'
import { dayReading } from '@/lib/sync/server/day-reading'
import { aSyncPaddock, type SyncPaddock } from '../support/sync-paddock'
import { finds, one, presents, seesAll } from '../support/sync-walk'

function anOrganiser(paddock: SyncPaddock): AccountActor {
  const database = paddock.database()
  const clubId = database.select().from(tables.event).get()?.clubId ?? ''
  const known = database.select().from(tables.account).get()
  const accountId = known?.id ?? newId()
  if (!known)
    database
      .insert(tables.account)
      .values({
        id: accountId,
        clubId,
        email: 'dorian@marram.example',
        name: 'Dorian Marsh',
        passwordHash: 'x',
        roles: ['organiser'],
        createdAt: 0,
      })
      .run()
  return { kind: 'account', accountId, clubId, name: 'Dorian Marsh', clubRoles: ['organiser'], signInHash: '' }
}

async function listOf(paddock: SyncPaddock, actor = anOrganiser(paddock)): Promise<Holds> {
  const deps = { database: paddock.database(), now: paddock.time.now } as never
  const answer = await seeHolds(dayReading)({ params: { event: paddock.event }, query: {}, body: {} }, actor, deps)
  if (isRefusal(answer)) throw new Error(`the list was refused: ${answer.code}`)
  return holds.response.parse(answer)
}

function declareVoid(paddock: SyncPaddock, entry: string, pass: string, actor = anOrganiser(paddock)) {
  const deps = { database: paddock.database(), now: paddock.time.now } as never
  const body = { entry, pass, reason: 'the sticker is not on the car' }
  return voidPass(appendServerRecords, dayReading)({ params: { event: paddock.event }, query: {}, body }, actor, deps)
}

async function aPaddockWithCrew() {
  const paddock = await aSyncPaddock()
  const chief = await paddock.phone(['chief'])
  const marshal = await paddock.phone(['marshal'])
  await chief.day.loadDay()
  await marshal.day.loadDay()
  const [car, driver] = [paddock.cars[0] as string, paddock.drivers[0] as string]
  await presents(chief.day, car)
  await seesAll(chief.day, car)
  return { paddock, chief, marshal, car, driver }
}

const CONTACT = { kind: 'hold', reason: 'light-contact', stations: ['body'], checks: [], stickerRemoved: false } as const

test('a hold stands in the list with its car, since when, by whom, and what to see again; seen again it has ended, by whom', async () => {
  const { paddock, chief, marshal, car } = await aPaddockWithCrew()
  await one(marshal.day, { ...CONTACT, subject: { car } })
  await marshal.day.drain()
  await chief.day.drain()

  expect((await listOf(paddock)).lines).toMatchObject([
    {
      number: '47',
      plate: 'OT11 KLM',
      person: '',
      state: 'standing',
      what: 'Light contact, one corner',
      by: 'Crew 2.1',
      seeAgain: ['Body'],
      stickerRemoved: false,
    },
  ])

  for (const check of ['body.mirror', 'body.undertray']) await finds(chief.day, car, check, 'ok')
  await chief.day.drain()
  expect((await listOf(paddock)).lines).toMatchObject([{ state: 'ended', ending: { how: 'seen', by: 'Crew 1.1' } }])
})

test('a person’s hold names the person and no car is held by it; lifted, the list says why', async () => {
  const { paddock, chief, marshal, car, driver } = await aPaddockWithCrew()
  const { hash } = await one(marshal.day, {
    ...CONTACT,
    reason: 'driving-standard',
    stations: [],
    stickerRemoved: null,
    subject: { person: driver },
  })
  await marshal.day.drain()
  await chief.day.drain()
  expect((await listOf(paddock)).lines).toMatchObject([{ entry: car, person: 'Driver 1', what: 'Driving standard', onlyChiefLifts: true }])
  expect(chief.day.state(`car:${car}`).verdict).toBe('passed')

  await one(chief.day, { kind: 'lifted', subject: { person: driver }, holds: [hash], why: 'spoken to, understood' })
  await chief.day.drain()
  expect((await listOf(paddock)).lines).toMatchObject([
    { state: 'ended', ending: { how: 'lifted', why: 'spoken to, understood', by: 'Crew 1.1' } },
  ])
})

test('[F13] a recall waits with what makes it due, then stands', async () => {
  const { paddock, chief, car } = await aPaddockWithCrew()
  const group = chief.day.snapshot()?.groups[0]?.id ?? ''
  const trigger = { when: 'session-over', group, session: 1 } as const
  await one(chief.day, { kind: 'recall', subject: { car }, stations: ['brakes'], checks: [], trigger })
  await chief.day.drain()
  expect((await listOf(paddock)).lines).toMatchObject([
    { state: 'waiting', what: 'Recall: to be shown after session 1 of A', seeAgain: ['Brakes'] },
  ])

  await one(chief.day, { kind: 'day', subject: { event: paddock.event }, says: { what: 'session-over', group, session: 1 } })
  await chief.day.drain()
  expect((await listOf(paddock)).lines).toMatchObject([{ state: 'standing' }])
})

test('a dispensation stands there with its conditions and its reason', async () => {
  const { paddock, chief, car } = await aPaddockWithCrew()
  await finds(chief.day, car, 'seat.mounts', 'fail', { reason: 'other' })
  await one(chief.day, {
    kind: 'dispensation',
    subject: { car },
    check: 'seat.mounts',
    reason: 'mended at noon',
    conditions: 'three laps',
    until: null,
  })
  await chief.day.drain()
  expect((await listOf(paddock)).lines).toMatchObject([
    { kind: 'dispensation', state: 'standing', what: expect.stringContaining('Only with: three laps. Because: mended at noon') },
  ])
})

test('[F7] of two passes that do not know each other the organiser voids one; the other lives, the voided one is dead for good', async () => {
  const { paddock, chief, car } = await aPaddockWithCrew()
  await chief.day.drain()
  const bay = await paddock.phone(['scrutineer'])
  await bay.day.loadDay()
  const first = await chief.day.issuePass({ entry: car, passengerSeatUsable: false })
  paddock.time.now += 60_000
  await bay.day.issuePass({ entry: car, passengerSeatUsable: false })
  await chief.day.drain()
  await bay.day.drain()
  expect((await listOf(paddock)).twoPasses).toMatchObject([{ number: '47', passes: [{ by: 'Crew 1.1' }, { by: 'Crew 3.1' }] }])

  expect(await declareVoid(paddock, car, first.saved.hash)).toEqual({ voided: true })

  expect((await listOf(paddock)).twoPasses).toEqual([])
  await chief.day.drain()
  const states = chief.day.state(`car:${car}`).passes.map(({ hash, state }) => [hash === first.saved.hash, state])
  expect(states).toEqual([
    [true, 'dead'],
    [false, 'live'],
  ])
  const again = await declareVoid(paddock, car, first.saved.hash)
  expect(isRefusal(again) && again.code).toBe('missing')
})

test('nobody voids by naming another car, and another club sees and voids nothing', async () => {
  const { paddock, chief, car } = await aPaddockWithCrew()
  const { saved } = await chief.day.issuePass({ entry: car, passengerSeatUsable: false })
  await chief.day.drain()
  const before = paddock.rows().length
  const stranger = { ...anOrganiser(paddock), clubId: newId() }
  for (const answer of [
    await declareVoid(paddock, paddock.cars[1] as string, saved.hash),
    await declareVoid(paddock, car, saved.hash, stranger),
  ])
    expect(isRefusal(answer) && answer.code).toBe('missing')
  expect(paddock.rows()).toHaveLength(before)
  await expect(listOf(paddock, stranger)).rejects.toThrow('missing')
})

test('the list tells no address and no telephone of anybody', async () => {
  const { paddock, chief, driver } = await aPaddockWithCrew()
  await one(chief.day, { ...CONTACT, subject: { person: driver } })
  await chief.day.drain()
  expect(JSON.stringify(await listOf(paddock))).not.toContain('canary')
})
