import { eq } from 'drizzle-orm'
import { describe, expect, test } from 'vitest'
import * as tables from '@/db/schema'
import { chainNext, noteHash } from '@/lib/sync/core/chain'
import { dayReading } from '@/lib/sync/server/day-reading'
import { dropEventLog, eventLog } from '@/lib/sync/server/event-log'
import { sha256 } from '@/lib/platform/sha256'
import { aSyncPaddock, CHECKLIST_HASH, LIMITS_HASH, type Phone, type SyncPaddock } from '../support/sync-paddock'
import { payload, pushRaw, signed } from '../support/sync-raw'
import { finds, one, presents, seesAll } from '../support/sync-walk'

async function aServer(...roles: Parameters<SyncPaddock['phone']>) {
  const paddock = await aSyncPaddock()
  const phone = await paddock.phone(...roles)
  const car = paddock.cars[0] as string
  const say = (said: object, by: Phone = phone) => payload(by, paddock.event, said)
  const push = async (...payloads: readonly object[]) =>
    pushRaw(phone, paddock.event, await Promise.all(payloads.map((each) => signed(phone, each))))
  return { paddock, phone, car, say, push }
}

const presented = (car: string, more: object = {}) => ({
  kind: 'presented',
  effect: 'none',
  subject: { car },
  checklist: CHECKLIST_HASH,
  limits: LIMITS_HASH,
  declaration: null,
  facts: { cage: false, slicks: false },
  depth: 'standard',
  ...more,
})
const finding = (car: string, outcome: string, more: object = {}) => ({
  kind: 'finding',
  effect: outcome === 'ok' || outcome === 'advisory' ? 'permits' : 'stops',
  subject: { car },
  check: 'seat.mounts',
  outcome,
  ...more,
})
const hold = (car: string) => ({
  kind: 'hold',
  effect: 'stops',
  subject: { car },
  reason: 'contact',
  stations: [],
  checks: [],
  stickerRemoved: null,
})

/** How a car stands by the server's own reading of its log. */
function onServer(paddock: SyncPaddock, car: string, at = paddock.time.now) {
  const day = dayReading(paddock.database(), paddock.event, at)
  if (day === null) throw new Error('the event is not there')
  return day.stateOf(`car:${car}`)
}

describe('taking in', () => {
  test('[S1] one bad record in fifty is refused and the other forty-nine are stored', async () => {
    const { paddock, phone, car, say } = await aServer()
    const records = await Promise.all(Array.from({ length: 50 }, () => signed(phone, say(finding(car, 'ok')))))
    const [head, , signature] = (records[20] ?? '').split('.') as [string, string, string]
    records[20] = [head, Buffer.from(JSON.stringify(say(finding(car, 'ok')))).toString('base64url'), signature].join('.')
    const answers = await pushRaw(phone, paddock.event, records)
    expect(answers.map(({ outcome }) => outcome)).toEqual(Array.from({ length: 50 }, (_, index) => (index === 20 ? 'refused' : 'stored')))
    expect(answers[20]).toMatchObject({ code: 'bad-signature', seq: null })
    expect(paddock.rows().map(({ seq }) => seq)).toEqual(Array.from({ length: 49 }, (_, index) => index + 1))
  })

  test('[S1] what cannot be read is refused by name, each by itself', async () => {
    const { paddock, phone, car, say } = await aServer()
    const foreign = await paddock.phone()
    const good = await signed(phone, say(finding(car, 'ok')))
    const none = JSON.stringify({ alg: 'none', typ: 'lockwire-record' })
    const answers = await pushRaw(phone, paddock.event, [
      'no jws at all',
      await signed(phone, say(finding(car, 'ok', { check: 'UPPER' }))),
      await signed(phone, say(finding(car, 'ok', { effect: 'stops' }))),
      await signed(phone, say({ ...finding(car, 'ok'), event: foreign.people[0] })),
      await signed(phone, say({ ...finding(car, 'ok'), device: foreign.people[0] })),
      await signed(phone, say({ ...finding(car, 'ok'), device: foreign.deviceId })),
      await signed(phone, say(finding(car, 'ok')), 'lockwire-request'),
      `${Buffer.from(none).toString('base64url')}.${good.split('.')[1] ?? ''}.`,
      await signed(phone, say({ ...finding(car, 'ok'), reason: 'a'.repeat(40_000) })),
      // The same signature spelt otherwise, in the spare bits of its last character.
      good.replace(/.$/, (last) => String.fromCharCode(last.charCodeAt(0) + 1)),
    ])
    expect(answers.map(({ code }) => code)).toEqual([
      'unreadable',
      'unreadable',
      'unreadable',
      'wrong-event',
      'unknown-device',
      'bad-signature',
      'unreadable',
      'unreadable',
      'too-large',
      'unreadable',
    ])
    expect(paddock.rows()).toEqual([])
  })

  test('[S2] a record sent twice is stored once, in one push and in two', async () => {
    const { paddock, phone, car, say } = await aServer()
    const record = await signed(phone, say(finding(car, 'ok')))
    const first = await pushRaw(phone, paddock.event, [record, record])
    expect(first.map(({ outcome, seq }) => [outcome, seq])).toEqual([
      ['stored', 1],
      ['duplicate', 1],
    ])
    const again = await pushRaw(phone, paddock.event, [record])
    expect(again).toEqual([{ ...first[0], outcome: 'duplicate' }])
    expect(paddock.rows()).toHaveLength(1)
  })

  test('[S2] the same id over other bytes is refused', async () => {
    const { paddock, car, say, push } = await aServer()
    const body = say(finding(car, 'fail'))
    await push(body)
    expect(await push({ ...body, ...finding(car, 'ok') })).toMatchObject([{ outcome: 'refused', code: 'id-reused' }])
    expect(paddock.rows()).toMatchObject([{ seq: 1 }])
  })

  test('[S3] the chain is that of every record and its disposition, and the database refuses to change either', async () => {
    const { paddock, car, say, push } = await aServer(['helper'])
    await push(say(finding(car, 'fail')), say(finding(car, 'ok')), say(hold(car)))
    let chain = ''
    for (const row of paddock.rows()) {
      chain = chainNext(chain, row.jws, row, sha256)
      expect(row.chain).toBe(chain)
    }
    expect(paddock.rows().map(({ code }) => code)).toEqual([null, 'wrong-role', null])
    const { $client } = paddock.database()
    expect(() => $client.prepare("UPDATE record SET disposition = 'accepted'").run()).toThrow('append-only')
    expect(() => $client.prepare('DELETE FROM record').run()).toThrow('append-only')
  })

  test('[S1] a transaction that fails answers for nothing, and the next push goes on from what is there', async () => {
    const { paddock, phone, car, say } = await aServer()
    await pushRaw(phone, paddock.event, [await signed(phone, say(finding(car, 'ok')))])
    const { $client } = paddock.database()
    $client.exec("CREATE TRIGGER full BEFORE INSERT ON record WHEN NEW.seq = 3 BEGIN SELECT RAISE(ABORT, 'no room'); END")
    const two = [await signed(phone, say(finding(car, 'fail'))), await signed(phone, say(finding(car, 'fail')))]
    await expect(pushRaw(phone, paddock.event, two)).rejects.toThrow('no room')
    expect(paddock.rows()).toHaveLength(1)
    $client.exec('DROP TRIGGER full')
    expect(await pushRaw(phone, paddock.event, [await signed(phone, say(finding(car, 'fail')))])).toMatchObject([{ seq: 2 }])
  })

  test('a note is kept only where its hash is right', async () => {
    const { paddock, phone, car, say } = await aServer()
    const hash = noteHash('salt', 'said', sha256)
    const record = await signed(phone, say({ kind: 'comment', effect: 'none', subject: { car }, notes: [hash] }))
    const notes = [
      { hash, salt: 'salt', text: 'said' },
      { hash: 'f'.repeat(64), salt: 'salt', text: 'something else' },
    ]
    await pushRaw(phone, paddock.event, [record], { notes })
    expect(paddock.database().select().from(tables.note).all()).toMatchObject([{ hash, text: 'said', seq: 1 }])
  })

  test('what a device says of its outbox is kept for the organiser', async () => {
    const { paddock, car, say, push, phone } = await aServer()
    await push(say(finding(car, 'ok')))
    const row = paddock.database().select().from(tables.device).where(eq(tables.device.id, phone.deviceId)).get()
    expect(row).toMatchObject({ unsent: 0, lastContactAt: paddock.time.now })
  })
})

describe('dispositions', () => {
  test.each([
    ['helper', finding, 'ok', 'wrong-role'],
    ['helper', finding, 'fail', null],
    ['helper', finding, 'advisory', null],
    ['marshal', finding, 'fail', 'wrong-role'],
    ['sign-on', finding, 'ok', 'wrong-role'],
    ['scrutineer', finding, 'ok', null],
  ] as const)('[T1] a %s’s %o %s on a car is %s', async (role, make, outcome, code) => {
    const { car, say, push } = await aServer([role])
    expect(await push(say(make(car, outcome)))).toMatchObject([{ code, outcome: code === null ? 'stored' : 'quarantined' }])
  })

  test('[T1] a quarantined fail stands in the chain, travels in the pull and still stops', async () => {
    const { paddock, car, say, push } = await aServer(['marshal'])
    const bay = await paddock.phone(['scrutineer'])
    await bay.day.loadDay()
    await presents(bay.day, car)
    await seesAll(bay.day, car)
    await bay.day.drain()
    await push(say(finding(car, 'fail')))
    await bay.day.drain()
    expect(bay.day.log(`car:${car}`).at(-1)?.disposition).toEqual({ state: 'quarantined', code: 'wrong-role' })
    expect(bay.day.state(`car:${car}`).verdict).toBe('not passed')
  })

  test('[T1] an ok for values that the rule itself fails is quarantined, and so is a milder judgement', async () => {
    const { car, say, push } = await aServer()
    const tread = (depthMm: number, outcome: string, judged?: string) =>
      say(
        finding(car, outcome, {
          check: 'wheels.tread',
          measured: { depthMm },
          ...(judged === undefined ? {} : { judgement: { outcome: judged, code: 'tyre-tread.ok', facts: {} } }),
        }),
      )
    const answers = await push(
      say(presented(car)),
      tread(1.2, 'ok'),
      tread(1.2, 'advisory'),
      tread(1.8, 'ok', 'ok'),
      tread(1.8, 'advisory', 'advisory'),
      tread(1.2, 'fail', 'fail'),
      tread(6, 'fail'),
      tread(6, 'ok', 'ok'),
    )
    expect(answers.map(({ code }) => code)).toEqual([
      null,
      'milder-than-rule',
      'milder-than-rule',
      'milder-than-rule',
      null,
      null,
      null,
      null,
    ])
  })

  test('[T1] an unseen that names another’s finding is quarantined; one’s own is not', async () => {
    const { paddock, phone, car, say, push } = await aServer(['scrutineer'], ['scrutineer'])
    const record = await signed(phone, say(finding(car, 'fail')))
    const [stored] = await pushRaw(phone, paddock.event, [record])
    const undo = { ...finding(car, 'unseen'), basis: [stored?.hash] }
    expect(await push({ ...say(undo), actor: phone.people[1] })).toMatchObject([{ code: 'unseen-of-another' }])
    expect(await push(say(undo))).toMatchObject([{ code: null }])
    expect(await push(say({ ...undo, basis: ['a'.repeat(64)] }))).toMatchObject([{ code: 'unseen-of-another' }])
  })

  test('[T1] a screen that showed another number is noticed, by the entry as the records before it leave it', async () => {
    const { paddock, car, say, push } = await aServer(['scrutineer'])
    const office = await paddock.phone(['chief'])
    expect(await push(say({ ...finding(car, 'ok'), shown: { number: '74', plateTail: '11KLM' } }))).toMatchObject([
      { code: 'shown-differs' },
    ])
    expect(await push(say({ ...finding(car, 'ok'), shown: { number: '47', plateTail: '' } }))).toMatchObject([{ code: 'shown-differs' }])
    const change = { kind: 'entry-changed', effect: 'none', subject: { car }, change: { what: 'number', number: '74' } }
    await pushRaw(office, paddock.event, [await signed(office, payload(office, paddock.event, change))])
    expect(await push(say(finding(car, 'ok')))).toMatchObject([{ code: 'shown-differs' }])
    expect(await push(say({ ...finding(car, 'ok'), shown: { number: '74', plateTail: '11KLM' } }))).toMatchObject([{ code: null }])
    // A stop is flagged all the same, and goes on stopping.
    expect(await push(say(finding(car, 'fail')))).toMatchObject([{ code: 'shown-differs' }])
  })

  test('[T1] lowering a depth or removing a fact is a scrutineer’s act', async () => {
    const { paddock, car, say, push } = await aServer(['helper'])
    const bay = await paddock.phone(['scrutineer'])
    const byBay = async (said: object) =>
      (await pushRaw(bay, paddock.event, [await signed(bay, payload(bay, paddock.event, said))]))[0]?.code
    expect(await push(say(presented(car, { depth: 'full' })))).toMatchObject([{ code: null }])
    expect(await push(say(presented(car, { depth: 'look-over' })))).toMatchObject([{ code: 'wrong-role' }])
    expect(await push(say(presented(car, { depth: 'full', facts: { cage: false } })))).toMatchObject([{ code: 'wrong-role' }])
    expect(await byBay(presented(car, { depth: 'look-over' }))).toBeNull()
  })

  test('[T1] the acts of the chief hold from a device enrolled for the chief alone', async () => {
    const { paddock, car, say, push } = await aServer(['chief'], ['scrutineer'])
    const own = await paddock.phone(['chief'])
    const ruling = { kind: 'ruling', effect: 'permits', subject: { car }, check: 'seat.mounts', outcome: 'ok', why: 'seen by me' }
    expect(await push(say(ruling))).toMatchObject([{ code: 'wrong-role' }])
    expect(await pushRaw(own, paddock.event, [await signed(own, payload(own, paddock.event, ruling))])).toMatchObject([{ code: null }])
  })

  test('[T1] no ruling calls an ok what the rule itself fails', async () => {
    const { paddock, phone, car, say } = await aServer(['chief'])
    const fail = finding(car, 'fail', { check: 'wheels.tread', measured: { depthMm: 1.2 } })
    const [, stored] = await pushRaw(phone, paddock.event, [await signed(phone, say(presented(car))), await signed(phone, say(fail))])
    const ruling = {
      kind: 'ruling',
      effect: 'permits',
      subject: { car },
      check: 'wheels.tread',
      outcome: 'ok',
      why: 'looks fine',
      basis: [stored?.hash],
    }
    expect(await pushRaw(phone, paddock.event, [await signed(phone, say(ruling))])).toMatchObject([{ code: 'milder-than-rule' }])
  })

  test('[T1] an actor the device was not enrolled for has no right on it', async () => {
    const { paddock, car, say, push } = await aServer()
    const other = await paddock.phone(['scrutineer'])
    expect(await push({ ...say(finding(car, 'ok')), actor: other.people[0] })).toMatchObject([{ code: 'wrong-role' }])
  })

  test('[T1] a role that has ended permits nothing more, and its fail still stops', async () => {
    const { paddock, phone, car, say, push } = await aServer()
    paddock
      .database()
      .update(tables.crewMember)
      .set({ state: 'ended' })
      .where(eq(tables.crewMember.personId, phone.people[0] ?? ''))
      .run()
    expect(await push(say(finding(car, 'ok')), say(finding(car, 'fail')))).toMatchObject([{ code: 'wrong-role' }, { code: 'wrong-role' }])
    expect(onServer(paddock, car).fails).toEqual(['seat.mounts'])
  })

  test.each(['retired', 'lost'] as const)('[T2] of a %s device what it recorded until then stands, and nothing after', async (state) => {
    const { paddock, phone, car, say, push } = await aServer()
    const before = say(finding(car, 'ok'))
    paddock
      .database()
      .update(tables.device)
      .set({ state, lastGoodSeq: before.deviceSeq as number })
      .where(eq(tables.device.id, phone.deviceId))
      .run()
    expect(await push(before, say(finding(car, 'ok')))).toMatchObject([{ code: null }, { code: `device-${state}` }])
  })

  test('[T3] a kind this build does not know is kept: its stop is taken, its permission is not', async () => {
    const { car, say, push } = await aServer()
    const newer = (effect: string) => say({ kind: 'towed', effect, subject: { car }, by: 'tractor' })
    expect(await push(newer('stops'), newer('permits'), newer('none'))).toMatchObject([
      { code: null },
      { code: 'wrong-role' },
      { code: null },
    ])
  })

  test('[T4] a key that no enrolment of this server vouches for is kept without effect; one without certificate is refused', async () => {
    const here = await aServer()
    const elsewhere = await aSyncPaddock()
    const stranger = await elsewhere.phone(['scrutineer'])
    const record = await signed(stranger, payload(stranger, here.paddock.event, hold(here.car)))
    const { certificate } = stranger.disk.values.get('enrolment') as { certificate: string }
    expect(await pushRaw(here.phone, here.paddock.event, [record])).toMatchObject([{ outcome: 'refused', code: 'unknown-device' }])
    const answers = await pushRaw(here.phone, here.paddock.event, [record], { certificates: [certificate] })
    expect(answers).toMatchObject([{ outcome: 'quarantined', code: 'unknown-enrolment' }])
    expect(onServer(here.paddock, here.car).verdict).not.toBe('held')
  })
})

describe('reading the log', () => {
  test('how the server has it in memory and how it reads the log from the file are the same', async () => {
    const paddock = await aSyncPaddock({ cars: 3 })
    const bay = await paddock.phone(['scrutineer'])
    const exit = await paddock.phone(['marshal'])
    await bay.day.loadDay()
    for (const car of paddock.cars.slice(0, 2)) {
      await presents(bay.day, car)
      await seesAll(bay.day, car)
      await bay.day.issuePass({ entry: car, passengerSeatUsable: true })
      await bay.day.drain()
    }
    await exit.day.loadDay()
    await one(exit.day, {
      kind: 'hold',
      subject: { car: paddock.cars[1] ?? '' },
      reason: 'contact',
      stations: ['body'],
      checks: [],
      stickerRemoved: null,
    })
    await exit.day.drain()
    await bay.day.drain()
    await finds(bay.day, paddock.cars[2] ?? '', 'seat.mounts', 'fail', { reason: 'other' })
    await bay.day.drain()
    const inMemory = paddock.cars.map((car) => onServer(paddock, car))
    expect(inMemory.map(({ verdict }) => verdict)).toEqual(['passed', 'held', 'not passed'])
    expect(inMemory.flatMap(({ passes }) => passes.map(({ state }) => state))).toEqual(['live', 'dead'])
    dropEventLog(paddock.database(), paddock.event)
    expect(paddock.cars.map((car) => onServer(paddock, car))).toEqual(inMemory)
    const found = paddock.database().select().from(tables.issuedPass).all()
    expect(found.map(({ subjectKey }) => subjectKey).sort()).toEqual(
      paddock.cars
        .slice(0, 2)
        .map((car) => `car:${car}`)
        .sort(),
    )
  })

  test('at midnight what perishes was not seen', async () => {
    const paddock = await aSyncPaddock()
    const bay = await paddock.phone(['scrutineer'])
    await bay.day.loadDay()
    const car = paddock.cars[0] as string
    await presents(bay.day, car)
    await seesAll(bay.day, car)
    await bay.day.drain()
    expect(onServer(paddock, car).verdict).toBe('passed')
    expect(onServer(paddock, car, paddock.time.now + 86_400_000).verdict).toBe('in progress')
  })

  test('the log in memory is read again where another process has written', async () => {
    const { paddock, car, say, push } = await aServer()
    await push(say(finding(car, 'ok')))
    const log = eventLog(paddock.database(), paddock.event)
    expect(log.seq).toBe(1)
    await push(say(finding(car, 'fail')))
    log.seq = 1
    log.chain = paddock.rows()[0]?.chain ?? ''
    log.bySubject.get(`car:${car}`)?.pop()
    expect(eventLog(paddock.database(), paddock.event).bySubject.get(`car:${car}`)).toHaveLength(2)
    log.chain = 'something else'
    expect(eventLog(paddock.database(), paddock.event)).not.toBe(log)
  })
})
