import { describe, expect, test, vi } from 'vitest'
import { DISCARD_WORDS } from '@/lib/sync/client/day-client'
import { aSyncPaddock, type Phone } from '../support/sync-paddock'
import { aFinding, finds, one, presents, seesAll } from '../support/sync-walk'
import { seeded } from '../support/seeded'
import type { Fault } from '../support/fake-network'

async function aBay(records = 0) {
  const paddock = await aSyncPaddock()
  const phone = await paddock.phone(['scrutineer'])
  await phone.day.loadDay()
  const car = paddock.cars[0] as string
  for (let index = 0; index < records; index += 1) await finds(phone.day, car, 'body.mirror', index % 2 === 0 ? 'ok' : 'advisory')
  return { paddock, phone, car }
}

function outbox(phone: Phone): readonly string[] {
  return [...phone.disk.values].flatMap(([key, value]) =>
    key.startsWith('r:') && (value as { out: string }).out === 'unsent' ? [key] : [],
  )
}

describe('sending', () => {
  test('[S1] everything unsent goes in deviceSeq order, at most 200 at once, each answered for', async () => {
    const { paddock, phone, car } = await aBay()
    await phone.day.record(Array.from({ length: 250 }, () => aFinding(phone.day, car, 'body.mirror', 'ok')))
    expect(await phone.day.push()).toMatchObject({ state: 'done', sent: 250 })
    expect(phone.network.requests.filter(({ what }) => what === 'push').map(({ records }) => records)).toEqual([200, 50])
    expect(paddock.rows().map(({ deviceSeq }) => deviceSeq)).toEqual(Array.from({ length: 250 }, (_, index) => index + 1))
  })

  test.each([413, 422] as const)(
    '[S1] on %i the batch is halved until the culprit stands alone, which is set aside; the rest arrives',
    async (status) => {
      const { paddock, phone } = await aBay(9)
      const culprit = [...phone.disk.values.values()].find((value) => (value as { deviceSeq?: number }).deviceSeq === 6) as {
        jws: string
        id: string
      }
      const push = phone.network.transport.push
      Object.assign(phone.network.transport, {
        push: (request: Parameters<typeof push>[0]) => {
          if (request.records.includes(culprit.jws)) phone.network.next.push(status)
          return push(request)
        },
      })
      expect(await phone.day.push()).toMatchObject({ state: 'done', sent: 8 })
      expect(paddock.rows()).toHaveLength(8)
      expect(phone.day.attention()).toMatchObject([
        { id: culprit.id, kind: 'finding', code: status === 413 ? 'too-large' : 'not-understood' },
      ])
      expect(phone.day.status()).toMatchObject({ unsent: 0, needsAttention: 1, problem: { code: 'needs-attention' } })
    },
  )

  test('[S2] a batch whose answer was lost after the commit is sent again and stored once', async () => {
    const { paddock, phone } = await aBay(3)
    phone.network.next.push('reply-lost', 'pass')
    await phone.day.push()
    expect(paddock.rows()).toHaveLength(3)
    expect(phone.day.status().unsent).toBe(3)
    expect(await phone.day.drain()).toMatchObject({ state: 'done', sent: 3 })
    expect(paddock.rows()).toHaveLength(3)
    expect(phone.day.status().unsent).toBe(0)
  })

  test('[S2] a batch that the network delivers twice is stored once', async () => {
    const { paddock, phone } = await aBay(3)
    phone.network.next.push('twice')
    expect(await phone.day.drain()).toMatchObject({ state: 'done', sent: 3 })
    expect(paddock.rows()).toHaveLength(3)
  })

  test('[S5] neither push nor pull needs a sign-in: the device’s own token is all they are asked for', async () => {
    const { syncPush } = await import('@/lib/contracts/sync-push')
    const { syncPull } = await import('@/lib/contracts/sync-pull')
    expect([syncPush.auth, syncPull.auth]).toEqual(['device', 'device'])
    expect(syncPush.evenRetired).toBe(true)
  })

  test.each(['drop', 'refused', 'busy', 'fault', 'no-room', 'not-our-server', 'too-old'] as const)(
    '[S6] %s leaves the outbox whole, on the disk too',
    async (fault) => {
      const { phone } = await aBay(3)
      phone.network.weather = () => fault
      expect(await phone.day.drain()).toMatchObject({ state: 'failed', sent: 0 })
      expect(outbox(phone)).toHaveLength(3)
      expect((await phone.reload()).status().unsent).toBe(3)
    },
  )

  test('[S6] an answer for records that were not sent drops nothing', async () => {
    const { phone } = await aBay(2)
    Object.assign(phone.network.transport, {
      push: async () => ({
        state: 'answered',
        value: { serverTime: 1, answers: [{ id: 'a'.repeat(36), hash: 'b'.repeat(64), outcome: 'stored', code: null, seq: 1 }] },
      }),
    })
    expect(await phone.day.push()).toMatchObject({ state: 'failed' })
    expect(outbox(phone)).toHaveLength(2)
  })

  test('[S6] a record set aside goes only when its discarding is typed, or when it is sent again', async () => {
    const { paddock, phone } = await aBay(2)
    phone.network.next.push(413, 413)
    await phone.day.push()
    const [waiting] = phone.day.attention()
    await expect(phone.day.discard(waiting?.id ?? '', 'yes')).rejects.toMatchObject({ problem: { code: 'wrong-words' } })
    expect(phone.day.status().needsAttention).toBe(1)
    await phone.day.retry(waiting?.id ?? '')
    await phone.day.push()
    expect(paddock.rows()).toHaveLength(2)
    await finds(phone.day, paddock.cars[0] as string, 'body.mirror', 'ok')
    phone.network.next.push(422)
    await phone.day.push()
    await phone.day.discard(phone.day.attention()[0]?.id ?? '', DISCARD_WORDS)
    expect(phone.day.status()).toMatchObject({ needsAttention: 0, unsent: 0 })
  })

  test('[S6] of two tabs one pushes, and the other hears of it', async () => {
    const { phone } = await aBay(3)
    const other = await phone.tab()
    const outcomes = await Promise.all([phone.day.push(), other.push()])
    expect(outcomes.map(({ state }) => state).sort()).toEqual(['done', 'other-tab'])
    await new Promise((resolve) => setImmediate(resolve))
    expect([phone.day.status().unsent, other.status().unsent]).toEqual([0, 0])
  })

  test('[S6] when the disk is full at the answer, nothing is forgotten: the next drain asks again', async () => {
    const { paddock, phone } = await aBay(2)
    phone.disk.faults.push('full')
    expect(await phone.day.push()).toMatchObject({ state: 'failed', problem: { code: 'storage-full' } })
    expect(outbox(phone)).toHaveLength(2)
    expect(await phone.day.drain()).toMatchObject({ state: 'done', sent: 2 })
    expect(paddock.rows()).toHaveLength(2)
  })

  const STORMS = Array.from({ length: 8 }, (_, index) => 1 + index * 7919)
  test.each(STORMS)('[S7] after faults end every outbox is empty within three drains, and all agree (seed %i)', async (seed) => {
    const random = seeded(seed)
    const faults: readonly (Fault | 'pass')[] = ['drop', 'reply-lost', 'twice', 'busy', 'fault', 'not-our-server', 'pass', 'pass', 'pass']
    const paddock = await aSyncPaddock()
    const phones = [await paddock.phone(), await paddock.phone()]
    for (const phone of phones) await phone.day.loadDay()
    for (const phone of phones) phone.network.weather = () => faults[Math.floor(random() * faults.length)] ?? 'pass'
    for (let step = 0; step < 25; step += 1) {
      const phone = phones[Math.floor(random() * phones.length)] as Phone
      const car = paddock.cars[Math.floor(random() * paddock.cars.length)] as string
      if (random() < 0.2) phone.disk.faults.push('full')
      await finds(phone.day, car, 'body.mirror', random() < 0.5 ? 'ok' : 'advisory').catch(() => undefined)
      if (random() < 0.5) await phone.day.drain()
      if (random() < 0.1) await phone.reload()
    }
    for (const phone of phones) {
      phone.network.weather = () => 'pass'
      phone.disk.faults.length = 0
    }
    for (let drains = 0; drains < 3; drains += 1) for (const phone of phones) await phone.day.drain()
    const made = phones.flatMap((phone) => [...phone.disk.values.keys()].filter((key) => key.startsWith('r:')))
    expect(phones.map((phone) => phone.day.status().unsent)).toEqual([0, 0])
    expect(
      paddock
        .rows()
        .map(({ hash }) => `r:${hash}`)
        .sort(),
    ).toEqual([...new Set(made)].sort())
    for (const car of paddock.cars) expect(phones[0]?.day.state(`car:${car}`)).toEqual(phones[1]?.day.state(`car:${car}`))
  })
})

describe('fetching', () => {
  test('[S4] a page that skips a record moves nothing', async () => {
    const { paddock, phone } = await aBay(3)
    const other = await paddock.phone()
    await phone.day.push()
    const pull = other.network.transport.pull
    Object.assign(other.network.transport, {
      pull: async (query: Parameters<typeof pull>[0]) => {
        const reply = await pull(query)
        return reply.state === 'answered' ? { ...reply, value: { ...reply.value, records: reply.value.records.slice(1) } } : reply
      },
    })
    expect(await other.day.pull()).toMatchObject({ state: 'failed' })
    expect(other.day.status()).toMatchObject({ seq: 0, loaded: false })
  })

  test('[S4] a pull whose records cannot be kept moves the cursor past none of them', async () => {
    const { paddock, phone } = await aBay(3)
    const other = await paddock.phone()
    await phone.day.push()
    other.disk.faults.push('full')
    expect(await other.day.pull()).toMatchObject({ state: 'failed', problem: { code: 'storage-full' } })
    expect(other.day.status().seq).toBe(0)
    expect(await other.day.pull()).toMatchObject({ state: 'done', received: 3 })
  })

  test('[S4] notes travel with the records that name them', async () => {
    const { paddock, phone, car } = await aBay()
    const other = await paddock.phone()
    const [saved] = await phone.day.record(
      [{ kind: 'comment', subject: { car }, notes: ['note:a'] }],
      [{ ref: 'a', text: 'seen at the gate' }],
    )
    await phone.day.push()
    await other.day.loadDay()
    expect(other.day.note(saved?.record.notes[0] ?? '')).toBe('seen at the gate')
  })

  test('[case 4] an own unsent record is provisional, and after the push’s answer all devices hold the same of it', async () => {
    const { paddock, phone, car } = await aBay()
    const other = await paddock.phone()
    await presents(phone.day, car)
    await finds(phone.day, car, 'brakes.pads', 'fail', { reason: 'other' })
    expect(phone.day.log(`car:${car}`).map(({ disposition }) => disposition.state)).toEqual(['provisional', 'provisional'])
    expect(phone.day.state(`car:${car}`).verdict).toBe('not passed')
    await phone.day.drain()
    await other.day.loadDay()
    expect(phone.day.log(`car:${car}`).map(({ disposition }) => disposition.state)).toEqual(['accepted', 'accepted'])
    expect(other.day.log(`car:${car}`)).toEqual(phone.day.log(`car:${car}`))
    expect(other.day.state(`car:${car}`)).toEqual(phone.day.state(`car:${car}`))
  })

  test('[case 17] a server restored from yesterday’s copy: devices reconnect, and nothing acknowledged is missing', async () => {
    const { paddock, phone, car } = await aBay()
    const marshal = await paddock.phone(['marshal'])
    await presents(phone.day, car)
    await phone.day.drain()
    await marshal.day.loadDay()
    const copy = paddock.backUp()

    const late = await paddock.phone(['scrutineer'])
    await late.day.loadDay()
    await seesAll(phone.day, car)
    await phone.day.drain()
    await one(late.day, { kind: 'hold', subject: { car }, reason: 'contact', stations: ['body'], checks: [], stickerRemoved: true })
    await late.day.drain()
    await marshal.day.drain()
    const acknowledged = paddock.rows().map(({ hash }) => hash)
    expect(acknowledged.length).toBeGreaterThan(5)

    paddock.restore(copy)
    expect(paddock.rows()).toHaveLength(1)
    // The marshal comes back first: it holds others' records too, and one of a device the copy has never heard of.
    expect(await marshal.day.drain()).toMatchObject({ state: 'done' })
    expect(paddock.rows().map(({ hash }) => hash)).toEqual(acknowledged)
    await phone.day.drain()
    await late.day.drain()
    expect(paddock.rows().map(({ hash }) => hash)).toEqual(acknowledged)
    for (const each of [phone, late, marshal]) expect(each.day.state(`car:${car}`).verdict).toBe('held')
    expect([phone, late, marshal].map((each) => each.day.status().unsent)).toEqual([0, 0, 0])
  })

  test('[case 17] restored at a place where the chain still fits: what was acknowledged and never pulled is sent again', async () => {
    const { paddock, phone, car } = await aBay()
    await presents(phone.day, car)
    await phone.day.drain()
    const copy = paddock.backUp()
    await finds(phone.day, car, 'seat.mounts', 'fail', { reason: 'other' })
    await phone.day.push()
    expect(paddock.rows()).toHaveLength(2)
    paddock.restore(copy)
    await phone.day.drain()
    expect(paddock.rows()).toHaveLength(2)
    expect(phone.day.status()).toMatchObject({ unsent: 0, seq: 2 })
  })
})

describe('keeping in step', () => {
  test('[S8] a poke of the live stream is followed by a pull at once', async () => {
    const { paddock, phone, car } = await aBay()
    const other = await paddock.phone()
    const stop = other.day.start()
    await paddock.time.pass(100)
    await vi.waitFor(() => expect(other.day.status().busy).toBeNull())
    expect(other.day.status().link).toBe('live')
    await presents(phone.day, car)
    await phone.day.push()
    other.network.poke()
    await paddock.time.pass(1)
    await vi.waitFor(() => expect(other.day.status().seq).toBe(1))
    stop()
    expect(paddock.time.waiting()).toBe(0)
  })

  test('[S8] when the stream fails, polling goes on', async () => {
    const { paddock, phone, car } = await aBay()
    const other = await paddock.phone()
    const stop = other.day.start()
    await paddock.time.pass(100)
    await vi.waitFor(() => expect(other.day.status().busy).toBeNull())
    other.network.endLive()
    Object.assign(other.network.transport, { live: () => () => undefined })
    expect(other.day.status().link).toBe('polling')
    await presents(phone.day, car)
    await phone.day.push()
    await paddock.time.pass(61_000)
    await vi.waitFor(() => expect(other.day.status().seq).toBe(1))
    stop()
  })

  test('[S6] while nothing answers the wait doubles up to a minute, and the first answer brings everything', async () => {
    const { paddock, phone, car } = await aBay()
    const stop = phone.day.start()
    await paddock.time.pass(100)
    await vi.waitFor(() => expect(phone.day.status().busy).toBeNull())
    phone.network.weather = () => 'drop'
    await presents(phone.day, car)
    await paddock.time.pass(10 * 60_000)
    const tries = phone.network.requests.filter(({ what, fault }) => what === 'push' && fault === 'drop').length
    expect(tries).toBeGreaterThan(8)
    expect(tries).toBeLessThan(25)
    expect(phone.day.status()).toMatchObject({ link: 'offline', unsent: 1 })
    phone.network.weather = () => 'pass'
    await paddock.time.pass(61_000)
    await vi.waitFor(() => expect(phone.day.status().unsent).toBe(0))
    stop()
  })

  test('an action is sent by itself soon after it was saved', async () => {
    const { paddock, phone, car } = await aBay()
    const stop = phone.day.start()
    await paddock.time.pass(100)
    await vi.waitFor(() => expect(phone.day.status().busy).toBeNull())
    await presents(phone.day, car)
    await paddock.time.pass(500)
    await vi.waitFor(() => expect(paddock.rows()).toHaveLength(1))
    stop()
  })
})

describe('loading the day', () => {
  test('says how far it is, and what this device can do', async () => {
    const { paddock, phone } = await aBay(3)
    await phone.day.push()
    const other = await paddock.phone()
    const steps: string[] = []
    const check = await other.day.loadDay(({ step, records, entries }) => steps.push(`${step} ${records} ${entries}`))
    expect(steps).toEqual(['event 0 0', 'records 3 2', 'checklists 3 2', 'device 3 2', 'done 3 2'])
    expect(check).toMatchObject({ readyOffline: true, key: 'device', webLocks: true, clockOffsetMs: 0, problems: [] })
  })

  test('a nearly full device is told before it matters', async () => {
    const { phone } = await aBay()
    phone.disk.leftBytes = 2_000_000
    const check = await phone.day.loadDay()
    expect(check).toMatchObject({ readyOffline: false, problems: [{ code: 'storage-low' }] })
    expect(phone.day.status().problem?.code).toBe('storage-low')
  })

  test('without signal it rejects by name, and what was loaded before stays', async () => {
    const { phone } = await aBay()
    phone.network.weather = () => 'drop'
    await expect(phone.day.loadDay()).rejects.toMatchObject({ problem: { code: 'offline' } })
    expect(phone.day.entries()).toHaveLength(2)
  })

  test('the status object stays the same until something in it changes', async () => {
    const { phone, car } = await aBay()
    const before = phone.day.status()
    expect(phone.day.status()).toBe(before)
    const entries = phone.day.entries()
    const state = phone.day.state(`car:${paddockOther(car)}`)
    await presents(phone.day, car)
    expect(phone.day.status()).not.toBe(before)
    expect(phone.day.entries()[1]).toBe(entries[1])
    expect(phone.day.state(`car:${paddockOther(car)}`)).toBe(state)
  })

  test('a clock that was set back is noticed', async () => {
    const { paddock, phone } = await aBay()
    paddock.time.now -= 3_600_000
    expect(phone.day.status().clockWentBackwards).toBe(true)
  })
})

function paddockOther(car: string): string {
  return car.replace(/.$/, (last) => (last === '0' ? '1' : '0'))
}
