import { describe, expect, test } from 'vitest'
import { type DayError } from '@/lib/sync/client/day-problem'
import { IDLE_FOR_MS, UNLOCKED_FOR_MS } from '@/lib/sync/client/day-client'
import { makeDeviceKey, signJwsWith, type DeviceKey } from '@/lib/sync/client/device-key'
import { recordOfJws } from '@/lib/sync/core/held-record'
import { parseJws } from '@/lib/sync/core/jws-parse'
import { ed25519Key, verifyJws } from '@/lib/platform/jws'
import { aSyncPaddock, PIN, type Phone } from '../support/sync-paddock'
import { aFinding, finds, one, presents, seesAll } from '../support/sync-walk'

async function aBay(...roles: Parameters<Awaited<ReturnType<typeof aSyncPaddock>>['phone']>) {
  const paddock = await aSyncPaddock()
  const phone = await paddock.phone(...roles)
  await phone.day.loadDay()
  return { paddock, phone, car: paddock.cars[0] as string }
}

function storedRecords(phone: Phone): readonly string[] {
  return [...phone.disk.values.keys()].filter((key) => key.startsWith('r:'))
}

describe('saving', () => {
  test('[M1] what was saved is there after the page was killed, with the number it was given', async () => {
    const { phone, car } = await aBay()
    const saved = await presents(phone.day, car)
    const again = await phone.reload()
    expect(again.log(`car:${car}`)).toMatchObject([{ hash: saved.hash, record: { deviceSeq: 1 }, disposition: { state: 'provisional' } }])
    expect(await finds(again, car, 'seat.mounts', 'ok')).toMatchObject({ record: { deviceSeq: 2 } })
  })

  test.each(['full', 'failed', 'killed'] as const)(
    '[M1] a disk that is %s keeps nothing of the action, says so, and the number is used by the next',
    async (fault) => {
      const { phone, car } = await aBay()
      await presents(phone.day, car)
      phone.disk.faults.push(fault)
      const drafts = [aFinding(phone.day, car, 'seat.mounts', 'ok'), aFinding(phone.day, car, 'brakes.pads', 'fail', { reason: 'other' })]
      const failed = await phone.day.record(drafts).catch((error: unknown) => error)
      expect((failed as DayError).problem.code).toBe(fault === 'full' ? 'storage-full' : 'storage-failed')
      expect((failed as DayError).problem.kept).not.toBe('')
      expect((failed as DayError).problem.todo).not.toBe('')
      expect(storedRecords(phone)).toHaveLength(1)
      expect(phone.day.status().unsent).toBe(1)
      expect(await phone.day.record(drafts)).toMatchObject([{ record: { deviceSeq: 2 } }, { record: { deviceSeq: 3 } }])
    },
  )

  test('[M1] one draft that is none takes the whole action with it', async () => {
    const { phone, car } = await aBay()
    const bad = aFinding(phone.day, car, 'not a check id', 'ok')
    await expect(phone.day.record([aFinding(phone.day, car, 'seat.mounts', 'fail'), bad])).rejects.toMatchObject({
      problem: { code: 'unreadable-draft' },
    })
    expect(storedRecords(phone)).toHaveLength(0)
  })

  test('[M1] two tabs that save at the same moment never give one number twice', async () => {
    const { phone, car } = await aBay()
    const other = await phone.tab()
    await presents(phone.day, car)
    const saved = await Promise.all(
      Array.from({ length: 20 }, (_, index) =>
        finds(index % 2 === 0 ? phone.day : other, car, 'body.mirror', 'advisory', { reason: 'other' }),
      ),
    )
    const numbers = saved.map(({ record }) => record.deviceSeq).sort((a, b) => a - b)
    expect(numbers).toEqual(Array.from({ length: 20 }, (_, index) => index + 2))
  })

  test('[M1] without locks over tabs the counter itself keeps two tabs apart', async () => {
    const { phone, car } = await aBay()
    const other = await phone.tab()
    // Every page its own queue, as in a browser that has no Web Locks.
    Object.assign(phone.disk.locks, { lock: (_: string, work: () => Promise<unknown>) => work() })
    const saved = await Promise.all([presents(phone.day, car), presents(other, car)])
    expect(saved.map(({ record }) => record.deviceSeq).sort()).toEqual([1, 2])
  })

  test('[M1] another tab shows what this one saved', async () => {
    const { phone, car } = await aBay()
    const other = await phone.tab()
    await presents(phone.day, car)
    await new Promise((resolve) => setImmediate(resolve))
    expect(other.log(`car:${car}`)).toHaveLength(1)
    expect(other.status().unsent).toBe(1)
  })

  test('[M1] a note is saved with the record that names it, under a salt of its own', async () => {
    const { phone, car } = await aBay()
    const [saved] = await phone.day.record(
      [{ kind: 'comment', subject: { car }, notes: ['note:said'] }],
      [{ ref: 'said', text: 'front splitter taped' }],
    )
    const hash = saved?.record.notes[0] ?? ''
    expect(hash).toMatch(/^[0-9a-f]{64}$/)
    expect(phone.day.note(hash)).toBe('front splitter taped')
    expect((await phone.reload()).note(hash)).toBe('front splitter taped')
  })
})

describe('keys and people', () => {
  test('[M2] a record is a JWS that the device’s enrolled key verifies, and no other', async () => {
    const { phone, car } = await aBay()
    await presents(phone.day, car)
    const [key] = storedRecords(phone)
    const { jws } = phone.disk.values.get(key ?? '') as { jws: string }
    const enrolment = phone.disk.values.get('enrolment') as { says: { publicKey: string } }
    expect(verifyJws(jws, 'lockwire-record', enrolment.says.publicKey)).toMatchObject({ kind: 'presented', device: phone.deviceId })
    expect(verifyJws(jws, 'lockwire-record', (await makeDeviceKey()).publicKey)).toBeNull()
  })

  test('[M2] where WebCrypto has no Ed25519 a software key signs the same way', async () => {
    const { keygenAsync } = await import('@noble/ed25519')
    const { secretKey, publicKey } = await keygenAsync()
    const key: DeviceKey = { kind: 'software', secret: secretKey, publicKey: Buffer.from(publicKey).toString('base64url') }
    const jws = await signJwsWith(key, 'lockwire-record', 'a device', { kind: 'comment' })
    expect(ed25519Key(key.publicKey)).not.toBeNull()
    expect(verifyJws(jws, 'lockwire-record', key.publicKey)).toEqual({ kind: 'comment' })
    expect(parseJws(jws)?.header).toEqual({ alg: 'EdDSA', typ: 'lockwire-record', kid: 'a device' })
  })

  test('[M3] the actor is who was unlocked at that moment, and nobody unlocked saves nothing', async () => {
    const { phone, car } = await aBay(['scrutineer'], ['helper'])
    const [first, second] = phone.people as [string, string]
    await phone.day.setPin(second, '111111')
    expect((await presents(phone.day, car)).record.actor).toBe(first)
    await phone.day.unlock(second, '111111')
    expect((await finds(phone.day, car, 'brakes.pads', 'fail', { reason: 'other' })).record.actor).toBe(second)
    await phone.day.lock()
    await expect(presents(phone.day, car)).rejects.toMatchObject({ problem: { code: 'locked' } })
    await expect(phone.day.unlock(first, '999999')).rejects.toMatchObject({ problem: { code: 'wrong-pin' } })
  })

  test('[M3] a reload keeps a person unlocked; idle or long since, the device locks', async () => {
    const { paddock, phone } = await aBay()
    expect((await phone.reload()).status().unlocked).not.toBeNull()
    paddock.time.now += IDLE_FOR_MS + 1
    expect(phone.day.status().unlocked).toBeNull()
    await phone.day.unlock(phone.people[0] ?? '', PIN)
    for (let passed = 0; passed < UNLOCKED_FOR_MS; passed += IDLE_FOR_MS / 2) {
      paddock.time.now += IDLE_FOR_MS / 2
      phone.day.touched()
    }
    paddock.time.now += 1
    expect(phone.day.status().unlocked).toBeNull()
  })

  test('[M3] a helper alone saves no ok, and the chief’s acts are saved on the chief’s own device only', async () => {
    const { paddock, phone, car } = await aBay(['helper'])
    await presents(phone.day, car)
    await expect(finds(phone.day, car, 'seat.mounts', 'ok')).rejects.toMatchObject({ problem: { code: 'not-allowed' } })
    await expect(finds(phone.day, car, 'seat.mounts', 'could-not-see')).resolves.toBeDefined()
    const shared = await paddock.phone(['chief'], ['helper'])
    await shared.day.loadDay()
    const hold = await one(shared.day, {
      kind: 'hold',
      subject: { car },
      reason: 'contact',
      stations: [],
      checks: [],
      stickerRemoved: null,
    })
    const lifted = { kind: 'lifted', subject: { car }, holds: [hold.hash], why: 'seen by me' } as const
    await expect(one(shared.day, lifted)).rejects.toMatchObject({ problem: { code: 'not-allowed' } })
    const own = await paddock.phone(['chief'])
    await own.day.loadDay()
    await expect(one(own.day, lifted)).resolves.toBeDefined()
  })

  test('[M4] somebody who joined by a code is certified for that role only, and may record no more', async () => {
    const { phone, car } = await aBay(['marshal'])
    expect(phone.day.people()).toMatchObject([{ roles: ['marshal'] }])
    await expect(finds(phone.day, car, 'seat.mounts', 'fail')).rejects.toMatchObject({ problem: { code: 'not-allowed' } })
  })
})

describe('edges', () => {
  test('[M5] a finding names every head of its check that the device holds, and nothing of another check', async () => {
    const { phone, car } = await aBay()
    await presents(phone.day, car)
    await finds(phone.day, car, 'seat.mounts', 'ok')
    const fail = await finds(phone.day, car, 'brakes.pads', 'fail', { reason: 'other' })
    const look = await finds(phone.day, car, 'brakes.pads', 'ok')
    expect(look.record.basis).toEqual([fail.hash])
  })

  test('[M5] a finding answers the holds and repairs that ask for its check, and a pass all it must', async () => {
    const { phone, car } = await aBay()
    await presents(phone.day, car)
    await seesAll(phone.day, car)
    const hold = await one(phone.day, {
      kind: 'hold',
      subject: { car },
      reason: 'contact',
      stations: ['brakes'],
      checks: [],
      stickerRemoved: null,
    })
    const look = await finds(phone.day, car, 'brakes.pads', 'ok', { found: { outcome: 'fail', reason: 'other' } })
    expect(look.record.answers).toEqual([hold.hash])
    const nuts = await finds(phone.day, car, 'wheels.nuts.front', 'ok')
    expect(nuts.record.answers).toEqual([look.hash])
    await finds(phone.day, car, 'wheels.nuts.rear', 'ok')
    const issued = await phone.day.issuePass({ entry: car, passengerSeatUsable: true })
    expect(issued.saved.record.answers).toEqual([...phone.day.state(`car:${car}`).toAnswer])
    expect(phone.day.state(`car:${car}`).passes).toMatchObject([{ state: 'live' }])
  })

  test('[M5] an undo names one’s own finding only', async () => {
    const { paddock, phone, car } = await aBay()
    await presents(phone.day, car)
    await finds(phone.day, car, 'seat.mounts', 'fail', { reason: 'other' })
    await phone.day.drain()
    const other = await paddock.phone()
    await other.day.loadDay()
    await expect(finds(other.day, car, 'seat.mounts', 'unseen')).rejects.toMatchObject({ problem: { code: 'unreadable-draft' } })
    const own = await finds(phone.day, car, 'seat.mounts', 'unseen')
    expect(own.record.basis).toHaveLength(1)
    expect(phone.day.state(`car:${car}`).fails).toEqual([])
  })

  test('what was shown, the day and the highest record seen are written into the record', async () => {
    const { phone, car } = await aBay()
    await presents(phone.day, car)
    await phone.day.drain()
    const { record } = await finds(phone.day, car, 'seat.mounts', 'ok')
    expect(record).toMatchObject({ shown: { number: '47', plateTail: '11KLM' }, day: '2026-05-09', seen: 1, offset: 0 })
    expect(recordOfJws(JSON.stringify(record))).toBeNull()
  })
})
