import { eq } from 'drizzle-orm'
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest'
import * as z from 'zod/mini'
import { audit, crewMember, device as deviceTable, devicePerson, event as eventTable, person } from '@/db/schema'
import type { AnswerOf } from '@/lib/contracts/contract'
import { contract } from '@/lib/contracts/contract'
import { CERTIFICATE_TYPE, deviceCertificate } from '@/lib/contracts/device-certificate'
import { type DeviceView, enrolDevice, listDevices, retireDevice } from '@/lib/contracts/devices'
import { join } from '@/lib/contracts/join'
import { askToJoin } from '@/lib/crew/commands/ask-to-join'
import { giveJoinCode } from '@/lib/crew/commands/give-join-code'
import { enrol } from '@/lib/devices/commands/enrol'
import { takeOutOfUse } from '@/lib/devices/commands/take-out-of-use'
import { seeDevices } from '@/lib/devices/queries/see-devices'
import { resetAllowances } from '@/lib/http/rate'
import { handle } from '@/lib/http/server'
import { isRefusal } from '@/lib/platform/refusal'
import { verifyJws } from '@/lib/platform/jws'
import { startSession } from '@/lib/platform/session'
import { aClub, aJws, aPhone, aToken, noSuchId } from '../support/a-club'
import { ask } from '../support/ask'
import { freshDatabase } from '../support/fresh-database'

const enrolling = handle(enrolDevice, enrol)
const listing = handle(listDevices, seeDevices)
const retiring = handle(retireDevice, takeOutOfUse)
const joining = handle(join, askToJoin)

const asDevice = {
  auth: 'device',
  limitBytes: 1000,
  rate: { times: 1000, perSeconds: 60 },
  response: z.object({ device: z.string() }),
} as const
const anyBody = z.object({})
const handIn = contract({
  ...asDevice,
  name: 'hand-in',
  method: 'POST',
  path: '/api/in',
  action: 'day:load',
  evenRetired: true,
  query: anyBody,
  body: anyBody,
})
const load = contract({ ...asDevice, name: 'load', method: 'GET', path: '/api/load', action: 'day:load', query: z.object({}) })
const handingIn = handle(handIn, (_, actor) => ({ device: actor.deviceId }))
const loading = handle(load, (_, actor) => ({ device: actor.deviceId }))

type Enrolled = AnswerOf<typeof enrolDevice> & { readonly code: string }
const START = Date.parse('2026-05-09T06:00:00Z')
let fresh: ReturnType<typeof freshDatabase>
let club: Awaited<ReturnType<typeof aClub>>
let event: string
let organiserId: string
let organiser: string

beforeEach(async () => {
  fresh = freshDatabase()
  resetAllowances()
  vi.useFakeTimers({ now: START, toFake: ['Date'] })
  club = await aClub(fresh.database)
  event = club.addEvent()
  organiserId = club.addAccount('organiser', 'o@marram.example')
  organiser = await signedIn(organiserId)
})
afterEach(() => {
  vi.useRealTimers()
  fresh.close()
})

const signedIn = async (accountId: string) => (await startSession(fresh.database, accountId, '')).split(';')[0] ?? ''
const enrols = (phone: { publicKey: string }, by: { claim?: string; cookie?: string }, of = event) =>
  ask<Enrolled>(enrolling, {
    method: 'POST',
    body: { event: of, name: 'Bay phone', publicKey: phone.publicKey, ...(by.claim ? { claim: by.claim } : {}) },
    cookie: by.cookie ?? '',
  })

async function aJoiner(role: 'marshal' | 'scrutineer' = 'marshal', state: 'waiting' | 'accepted' | 'refused' | 'ended' = 'accepted') {
  const deps = { database: fresh.database, now: Date.now(), origin: '' }
  const actor = {
    kind: 'account',
    accountId: organiserId,
    clubId: club.clubId,
    name: '',
    clubRoles: ['organiser'],
    signInHash: '',
  } as const
  const code = giveJoinCode({ params: { event }, query: {}, body: { role } }, actor, deps)
  if (isRefusal(code)) throw new Error(code.code)
  const { json } = await ask<AnswerOf<typeof join>>(joining, {
    method: 'POST',
    params: { token: code.token },
    body: { name: 'Wynn Harrow' },
  })
  fresh.database.update(crewMember).set({ state }).where(eq(crewMember.id, json.member)).run()
  return json
}

async function anEnrolledPhone() {
  const joiner = await aJoiner()
  const phone = aPhone()
  const { json } = await enrols(phone, { claim: joiner.claim })
  return { ...phone, ...json, joiner }
}

describe('[M2] enrolling', () => {
  test('gives an accepted joiner a number and a certificate signed by the server', async () => {
    const joiner = await aJoiner('scrutineer')
    const phone = aPhone()
    const { status, json } = await enrols(phone, { claim: joiner.claim })
    expect(status).toBe(200)
    expect(json).toMatchObject({ kid: 1, serverTime: START, people: [{ id: joiner.person, name: 'Wynn Harrow', roles: ['scrutineer'] }] })
    const says = deviceCertificate.parse(verifyJws(json.certificate, CERTIFICATE_TYPE, json.serverPublicKey))
    expect(says).toEqual({
      v: 1,
      device: json.device,
      event,
      kid: 1,
      publicKey: phone.publicKey,
      deviceName: 'Bay phone',
      people: json.people,
      issuedAt: START,
    })
  })

  test.each(['waiting', 'refused', 'ended'] as const)('who is %s is not enrolled', async (state) => {
    const joiner = await aJoiner('marshal', state)
    expect((await enrols(aPhone(), { claim: joiner.claim })).json.code).toBe('claim-not-accepted')
    expect(fresh.database.select().from(deviceTable).all()).toEqual([])
  })

  test('a claim enrols one key only; asked again by that key, the answer is the same', async () => {
    const joiner = await aJoiner()
    const phone = aPhone()
    const first = await enrols(phone, { claim: joiner.claim })
    vi.setSystemTime(START + 1000)
    const again = await enrols(phone, { claim: joiner.claim })
    expect({ ...again.json, serverTime: START }).toEqual(first.json)
    expect((await enrols(aPhone(), { claim: joiner.claim })).json.code).toBe('claim-used')
    expect(fresh.database.select().from(deviceTable).all()).toHaveLength(1)
  })

  test('a claim of one event enrols at no other', async () => {
    const joiner = await aJoiner()
    expect((await enrols(aPhone(), { claim: joiner.claim }, club.addEvent(2))).json.code).toBe('claim-unknown')
  })

  test('somebody signed in enrols in the crew roles they hold, an organiser too', async () => {
    const chief = club.addAccount('chief', 'c@marram.example')
    club.addCrew(event, chief, 'chief')
    expect((await enrols(aPhone(), { cookie: await signedIn(chief) })).json).toMatchObject({ kid: 1, people: [{ roles: ['chief'] }] })
    expect((await enrols(aPhone(), { cookie: organiser })).json).toMatchObject({ kid: 2, people: [{ roles: ['organiser'] }] })
    expect((await enrols(aPhone(), { cookie: organiser })).json.kid).toBe(3)
    expect(fresh.database.select().from(person).where(eq(person.accountId, organiserId)).all()).toHaveLength(1)
  })

  test('nobody, an entrant and an admin do not', async () => {
    expect((await enrols(aPhone(), {})).json.code).toBe('not-signed-in')
    for (const role of ['entrant', 'admin'] as const) {
      const cookie = await signedIn(club.addAccount(role, `${role}@marram.example`))
      expect((await enrols(aPhone(), { cookie })).json.code).toBe('not-crew')
    }
  })

  test('two people on one tablet: one number, a certificate that names both', async () => {
    const tablet = aPhone()
    const [first, second] = [await aJoiner(), await aJoiner('scrutineer')]
    const one = await enrols(tablet, { claim: first.claim })
    const two = await enrols(tablet, { claim: second.claim })
    expect([two.json.device, two.json.kid]).toEqual([one.json.device, one.json.kid])
    const says = deviceCertificate.parse(verifyJws(two.json.certificate, CERTIFICATE_TYPE, two.json.serverPublicKey))
    expect(says.people.map(({ id }) => id).sort()).toEqual([first.person, second.person].sort())
  })

  test('numbers are never given twice and end at 255', async () => {
    fresh.database.update(eventTable).set({ nextKid: 255 }).run()
    expect((await enrols(aPhone(), { cookie: organiser })).json.kid).toBe(255)
    expect((await enrols(aPhone(), { cookie: organiser })).json.code).toBe('keys-used-up')
  })

  test('what is no key is refused', async () => {
    expect((await enrols({ publicKey: 'A'.repeat(42) }, { cookie: organiser })).json.code).toBe('invalid')
    expect((await enrols({ publicKey: '_'.repeat(43) }, { cookie: organiser })).json.code).toBe('invalid')
  })

  test("another club's event is missing", async () => {
    const foreign = (await aClub(fresh.database, 'Another club')).addEvent()
    for (const of of [foreign, noSuchId()]) expect((await enrols(aPhone(), { cookie: organiser }, of)).json.code).toBe('missing')
  })
})

describe('[S5] a request signed by the device', () => {
  const path = '/api/in?x=1'
  const sends = (token: string, asked: Parameters<typeof ask>[1] = {}) =>
    ask<{ device: string; code: string; serverTime: number }>(handingIn, {
      method: 'POST',
      path,
      origin: null,
      raw: '{}',
      ...asked,
      headers: { authorization: `Device ${token}`, ...asked.headers },
    })

  test('is believed without cookie and without origin', async () => {
    const phone = await anEnrolledPhone()
    const token = aToken(phone.privateKey, { device: phone.device, event, method: 'POST', path, nowMs: START, body: '{}' })
    expect((await sends(token)).json).toEqual({ device: phone.device })
  })

  test('is bound to its body, path and method', async () => {
    const phone = await anEnrolledPhone()
    const of = { device: phone.device, event, method: 'POST', path, nowMs: START, body: '{}' }
    for (const other of [{ body: '{"a":1}' }, { path: '/api/in' }, { method: 'PUT' }]) {
      expect((await sends(aToken(phone.privateKey, { ...of, ...other }))).json.code).toBe('device-token-wrong')
    }
  })

  test('by another key, for another device or event, unsigned, or of another type is not believed', async () => {
    const [phone, other] = [await anEnrolledPhone(), await anEnrolledPhone()]
    const of = { device: phone.device, event, method: 'POST', path, nowMs: START, body: '{}' }
    expect((await sends(aToken(other.privateKey, of))).json.code).toBe('device-token-wrong')
    expect((await sends(aToken(phone.privateKey, { ...of, device: other.device }))).json.code).toBe('device-token-wrong')
    expect((await sends(aToken(phone.privateKey, { ...of, device: noSuchId() }))).json.code).toBe('device-not-known')
    expect((await sends(aToken(phone.privateKey, { ...of, event: club.addEvent(2) }))).json.code).toBe('device-not-known')
    const [, payload] = aToken(phone.privateKey, of).split('.')
    const claims = JSON.parse(Buffer.from(payload ?? '', 'base64url').toString()) as object
    const none = Buffer.from('{"alg":"none","typ":"lockwire-request"}').toString('base64url')
    for (const token of [
      `${none}.${payload ?? ''}.`,
      aJws(phone.privateKey, { alg: 'EdDSA', typ: 'JWT' }, claims),
      aJws(phone.privateKey, { alg: 'EdDSA', typ: 'lockwire-request', crit: ['b64'] }, claims),
      'x',
      '..',
    ]) {
      expect((await sends(token)).json.code).toBe('device-token-wrong')
    }
  })

  test('lives a minute; a clock too far out is told the server time', async () => {
    const phone = await anEnrolledPhone()
    const of = { device: phone.device, event, method: 'POST', path, body: '{}' }
    for (const [outMs, code] of [
      [-119_000, undefined],
      [-122_000, 'device-token-late'],
      [60_000, undefined],
      [62_000, 'device-token-late'],
    ] as const) {
      expect((await sends(aToken(phone.privateKey, { ...of, nowMs: START + outMs }))).json.code).toBe(code)
    }
    expect((await sends(aToken(phone.privateKey, { ...of, nowMs: START - 86_400_000 }))).json.serverTime).toBe(START)
    expect((await sends(aToken(phone.privateKey, { ...of, nowMs: START, lifeSeconds: 61 }))).json.code).toBe('device-token-wrong')
  })

  test('from a foreign page is refused although it is signed', async () => {
    const phone = await anEnrolledPhone()
    const token = aToken(phone.privateKey, { device: phone.device, event, method: 'POST', path, nowMs: START, body: '{}' })
    expect((await sends(token, { origin: 'https://elsewhere.example' })).json.code).toBe('foreign-origin')
  })
})

describe('[T2] out of use', () => {
  const retire = (device: string, as: string, cookie = organiser, of = event) =>
    ask<DeviceView & { code: string }>(retiring, { method: 'POST', params: { event: of }, body: { device, as }, cookie })
  const tokenFor = (phone: Awaited<ReturnType<typeof anEnrolledPhone>>, method: string, path: string, body = '') =>
    aToken(phone.privateKey, { device: phone.device, event, method, path, nowMs: Date.now(), body })
  const handsIn = (phone: Awaited<ReturnType<typeof anEnrolledPhone>>) =>
    ask(handingIn, {
      method: 'POST',
      path: '/api/in',
      origin: null,
      raw: '{}',
      headers: { authorization: `Device ${tokenFor(phone, 'POST', '/api/in', '{}')}` },
    })
  const loads = (phone: Awaited<ReturnType<typeof anEnrolledPhone>>) =>
    ask(loading, { path: '/api/load', headers: { authorization: `Device ${tokenFor(phone, 'GET', '/api/load')}` } })

  test.each(['retired', 'lost'])('a %s device still hands in what it holds, and loads nothing more', async (as) => {
    const phone = await anEnrolledPhone()
    expect((await loads(phone)).status).toBe(200)
    expect((await retire(phone.device, as)).json.state).toBe(as)
    expect((await handsIn(phone)).status).toBe(200)
    expect((await loads(phone)).json.code).toBe('device-retired')
    expect((await enrols(phone, { cookie: organiser })).json.code).toBe('device-retired')
  })

  test('a device whose person is crew no longer hands in what it holds, and loads nothing more', async () => {
    const phone = await anEnrolledPhone()
    fresh.database.update(crewMember).set({ state: 'ended' }).where(eq(crewMember.id, phone.joiner.member)).run()
    expect((await handsIn(phone)).status).toBe(200)
    expect((await loads(phone)).json.code).toBe('forbidden')
  })

  test('nothing makes it active again; a retired one may still be reported lost', async () => {
    const phone = await anEnrolledPhone()
    await retire(phone.device, 'retired')
    expect((await retire(phone.device, 'lost')).json.state).toBe('lost')
    expect((await retire(phone.device, 'retired')).json.code).toBe('device-decided')
    const { json } = await ask<AnswerOf<typeof listDevices>>(listing, { params: { event }, cookie: organiser })
    expect(json.devices).toMatchObject([{ id: phone.device, kid: 1, state: 'lost', people: [{ name: 'Wynn Harrow', roles: ['marshal'] }] }])
  })

  test('devices of another event or club are missing', async () => {
    const phone = await anEnrolledPhone()
    const stranger = await aClub(fresh.database, 'Another club')
    const cookie = await signedIn(stranger.addAccount('organiser', 'o@other.example'))
    expect((await retire(phone.device, 'lost', cookie)).json.code).toBe('missing')
    expect((await retire(phone.device, 'lost', organiser, club.addEvent(2))).json.code).toBe('missing')
    expect((await retire(noSuchId(), 'lost')).json.code).toBe('missing')
    expect((await ask(listing, { params: { event }, cookie })).json.code).toBe('missing')
  })
})

describe('[M2] a restored server', () => {
  const forget = (deviceId: string) => {
    fresh.database.delete(devicePerson).where(eq(devicePerson.deviceId, deviceId)).run()
    fresh.database.delete(deviceTable).where(eq(deviceTable.id, deviceId)).run()
  }
  const loads = (phone: Awaited<ReturnType<typeof anEnrolledPhone>>, certificate = phone.certificate) => {
    const token = aToken(phone.privateKey, { device: phone.device, event, method: 'GET', path: '/api/load', nowMs: START })
    return ask<{ device: string; code: string }>(loading, {
      path: '/api/load',
      headers: { authorization: `Device ${token}`, 'x-device-certificate': certificate },
    })
  }

  test('takes a device it has forgotten back by its certificate, with its number, person and role', async () => {
    const phone = await anEnrolledPhone()
    forget(phone.device)
    fresh.database.delete(crewMember).run()
    fresh.database.delete(person).run()
    fresh.database.update(eventTable).set({ nextKid: 1 }).run()
    expect((await loads(phone)).json).toEqual({ device: phone.device })
    expect(fresh.database.select().from(deviceTable).get()).toMatchObject({ id: phone.device, kid: 1, publicKey: phone.publicKey })
    expect(fresh.database.select().from(eventTable).get()?.nextKid).toBe(2)
    expect(fresh.database.select({ action: audit.action }).from(audit).all()).toContainEqual({ action: 'device-adopted' })
  })

  test('does not give a role back that it knows to be ended', async () => {
    const phone = await anEnrolledPhone()
    forget(phone.device)
    fresh.database.update(crewMember).set({ state: 'ended' }).run()
    expect((await loads(phone)).json.code).toBe('forbidden')
    expect(fresh.database.select().from(crewMember).all()).toMatchObject([{ state: 'ended' }])
  })

  test('gives a new number where the old one was given away meanwhile', async () => {
    const phone = await anEnrolledPhone()
    forget(phone.device)
    fresh.database.update(eventTable).set({ nextKid: 1 }).run()
    const other = await anEnrolledPhone()
    expect(other.kid).toBe(1)
    expect((await loads(phone)).status).toBe(200)
    expect(fresh.database.select().from(deviceTable).where(eq(deviceTable.id, phone.device)).get()?.kid).toBe(2)
  })

  test('believes no certificate but its own, for this device and event', async () => {
    const [phone, other] = [await anEnrolledPhone(), await anEnrolledPhone()]
    forget(phone.device)
    const forged = aJws(
      phone.privateKey,
      { alg: 'EdDSA', typ: CERTIFICATE_TYPE },
      verifyJws(phone.certificate, CERTIFICATE_TYPE, phone.serverPublicKey) as object,
    )
    for (const certificate of ['', 'x', forged, other.certificate]) {
      expect((await loads(phone, certificate)).json.code).toBe('device-not-known')
    }
    expect(fresh.database.select().from(deviceTable).all()).toHaveLength(1)
  })

  test('a certificate without the key that it names brings nothing back', async () => {
    const [phone, thief] = [await anEnrolledPhone(), aPhone()]
    forget(phone.device)
    expect((await loads({ ...phone, privateKey: thief.privateKey })).json.code).toBe('device-token-wrong')
    expect(fresh.database.select().from(deviceTable).all()).toEqual([])
  })
})
