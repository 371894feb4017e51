import { eq } from 'drizzle-orm'
import { describe, expect, test } from 'vitest'
import * as tables from '@/db/schema'
import { syncPullResponse } from '@/lib/contracts/sync-pull'
import { announce } from '@/lib/platform/live'
import { PULL_PAGE } from '@/lib/sync/server/serve-pull'
import { watchEvent } from '@/lib/sync/server/watch-event'
import { aSyncPaddock, type Phone } from '../support/sync-paddock'
import { payload, pushRaw, signed } from '../support/sync-raw'
import { finds, presents, seesAll } from '../support/sync-walk'

async function pull(phone: Phone, event: string, since = 0, at = '', snapshot = '') {
  const reply = await phone.network.transport.pull({ event, since, at, snapshot })
  if (reply.state !== 'answered') throw new Error('no answer')
  return syncPullResponse.parse(reply.value)
}

async function withRecords(count: number) {
  const paddock = await aSyncPaddock()
  const phone = await paddock.phone()
  const car = paddock.cars[0] as string
  for (let left = count; left > 0; left -= 200) {
    const comments = Array.from({ length: Math.min(200, left) }, () =>
      payload(phone, paddock.event, { kind: 'comment', effect: 'none', subject: { car }, notes: [] }),
    )
    await pushRaw(phone, paddock.event, await Promise.all(comments.map((each) => signed(phone, each))))
  }
  return { paddock, phone, car }
}

describe('pull', () => {
  test('[S4] a long log comes in pages without a gap, the list and the snapshot with the last', async () => {
    const { paddock, phone } = await withRecords(PULL_PAGE + 3)
    const first = await pull(phone, paddock.event)
    expect(first).toMatchObject({ more: true, seq: PULL_PAGE, head: PULL_PAGE + 3, list: null, snapshot: null })
    const second = await pull(phone, paddock.event, first.seq, first.chain)
    expect(second.records.map(({ seq }) => seq)).toEqual([PULL_PAGE + 1, PULL_PAGE + 2, PULL_PAGE + 3])
    expect(second).toMatchObject({ more: false, list: { seq: PULL_PAGE + 3 }, snapshot: { event: { name: 'Ottermere in May' } } })
    const third = await pull(phone, paddock.event, second.seq, second.chain, second.snapshot?.version)
    expect(third).toMatchObject({
      records: [],
      more: false,
      seq: second.seq,
      chain: second.chain,
      snapshot: null,
      list: { seq: PULL_PAGE + 3 },
    })
  })

  test('[S4] a hash that is not this log’s, or a place it has not reached, is told as restored', async () => {
    const { paddock, phone } = await withRecords(3)
    const page = await pull(phone, paddock.event)
    expect((await pull(phone, paddock.event, 2, 'a'.repeat(64))).restored).toBe(true)
    expect((await pull(phone, paddock.event, 99, page.chain)).restored).toBe(true)
    expect((await pull(phone, paddock.event, 3, page.chain)).restored).toBe(false)
  })

  test('[S4] the snapshot is sent again once something in it has changed, and only then', async () => {
    const { paddock, phone } = await withRecords(1)
    const page = await pull(phone, paddock.event)
    const again = () => pull(phone, paddock.event, page.seq, page.chain, page.snapshot?.version)
    expect((await again()).snapshot).toBeNull()
    paddock.change((database) =>
      database
        .update(tables.entry)
        .set({ note: 'new exhaust' })
        .where(eq(tables.entry.id, paddock.cars[0] ?? ''))
        .run(),
    )
    expect((await again()).snapshot?.entries[0]?.note).toBe('new exhaust')
  })

  test('a crew device is told no address, telephone or mail', async () => {
    const { paddock, phone } = await withRecords(1)
    expect(JSON.stringify(await pull(phone, paddock.event))).not.toContain('canary')
  })

  test('an event that is not the device’s own is as one that never was', async () => {
    const { paddock, phone } = await withRecords(1)
    const reply = await phone.network.transport.pull({ event: paddock.cars[0] ?? '', since: 0, at: '', snapshot: '' })
    expect(reply).toMatchObject({ state: 'unanswered', why: 'refused' })
  })

  test('the pass list names every key that ever signed, and whether it may issue', async () => {
    const { paddock, phone } = await withRecords(1)
    await paddock.phone(['marshal'])
    const { list } = await pull(phone, paddock.event)
    expect(list).toMatchObject({
      eventCode: 7,
      keys: [
        { kid: 1, mayIssue: true, state: 'active' },
        { kid: 2, mayIssue: false },
      ],
    })
  })

  test('[S4] the list only grows: what is dead or withdrawn stays on it', async () => {
    const { paddock, phone, car } = await withRecords(0)
    await phone.day.loadDay()
    await presents(phone.day, car)
    await seesAll(phone.day, car)
    await phone.day.issuePass({ entry: car, passengerSeatUsable: true })
    await finds(phone.day, car, 'brakes.pads', 'fail', { reason: 'other' })
    await phone.day.drain()
    const { list } = await pull(phone, paddock.event)
    expect(list).toMatchObject({ entries: [{ verdict: 'not passed', passes: [{ state: 'dead' }] }, { verdict: 'not presented' }] })
  })
})

describe('live', () => {
  async function open() {
    const { paddock, phone, car } = await withRecords(2)
    const stop = new AbortController()
    const actor = { kind: 'account', clubId: paddock.database().select().from(tables.club).get()?.id }
    const deps = { database: paddock.database(), now: paddock.time.now, signal: stop.signal }
    const stream = (await watchEvent(
      { params: { event: paddock.event }, query: {}, body: {} },
      actor as never,
      deps as never,
    )) as AsyncIterable<unknown>
    return { paddock, phone, car, stop, lines: stream[Symbol.asyncIterator]() }
  }

  test('[S8] tells where the event stands, then each change, and nothing but versions', async () => {
    const { paddock, phone, car, stop, lines } = await open()
    expect(await lines.next()).toMatchObject({ value: { seq: 2 } })
    const next = lines.next()
    await pushRaw(phone, paddock.event, [
      await signed(phone, payload(phone, paddock.event, { kind: 'comment', effect: 'none', subject: { car }, notes: [] })),
    ])
    const { value } = await next
    expect(Object.keys(value as object)).toEqual(['seq', 'snapshot'])
    expect(value).toMatchObject({ seq: 3 })
    stop.abort()
    expect((await lines.next()).done).toBe(true)
  })

  test('[S8] changes that come while one is being told are one line more, and a leaving listener is let go', async () => {
    const { paddock, stop, lines } = await open()
    await lines.next()
    for (let times = 0; times < 10; times += 1) announce(paddock.event)
    expect((await lines.next()).done).toBe(false)
    const waiting = lines.next()
    stop.abort()
    expect((await waiting).done).toBe(true)
  })

  test('an event of another club cannot be listened to', async () => {
    const { paddock } = await withRecords(0)
    const deps = { database: paddock.database(), signal: new AbortController().signal }
    const answer = await watchEvent(
      { params: { event: paddock.event }, query: {}, body: {} },
      { kind: 'account', clubId: 'another' } as never,
      deps as never,
    )
    expect(answer).toMatchObject({ code: 'missing' })
  })
})
