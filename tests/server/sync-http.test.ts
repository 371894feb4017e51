import { afterEach, describe, expect, test, vi } from 'vitest'
import { GET as liveRoute } from '@/app/api/events/[event]/live/route'
import { GET as pullRoute } from '@/app/api/sync/pull/route'
import { POST as pushRoute } from '@/app/api/sync/push/route'
import { useDatabase } from '@/db/client'
import { sha256Hex } from '@/lib/checklist/hash'
import { setClock } from '@/lib/platform/clock'
import type { Enrolment } from '@/lib/sync/client/enrolment'
import { httpTransport } from '@/lib/sync/client/http-transport'
import { aSyncPaddock } from '../support/sync-paddock'
import { payload, signed } from '../support/sync-raw'

const ORIGIN = 'http://localhost:3000'

/** The browser's fetch, led straight to the route handlers; `meet` may answer in their place. */
async function overHttp(meet: (path: string) => Response | null = () => null) {
  const paddock = await aSyncPaddock()
  const phone = await paddock.phone()
  useDatabase(paddock.database())
  const stopClock = setClock(() => paddock.time.now)
  vi.stubGlobal('fetch', async (path: string, init: RequestInit) => {
    const met = meet(path)
    if (met !== null) return met
    const request = new Request(ORIGIN + path, {
      ...init,
      headers: { ...(init.headers as Record<string, string>), origin: ORIGIN, host: 'localhost:3000' },
    })
    const params = Promise.resolve(path.startsWith('/api/events/') ? { event: paddock.event } : undefined)
    const route = path.startsWith('/api/sync/push') ? pushRoute : path.startsWith('/api/sync/pull') ? pullRoute : liveRoute
    return route(request, { params })
  })
  const clock = { now: paddock.time.now }
  const transport = httpTransport(phone.disk.values.get('enrolment') as Enrolment, { now: () => clock.now, sha256: sha256Hex })
  const comment = () =>
    signed(phone, payload(phone, paddock.event, { kind: 'comment', effect: 'none', subject: { car: paddock.cars[0] }, notes: [] }))
  const push = async () =>
    transport.push({ protocol: 1, event: paddock.event, certificates: [], records: [await comment()], notes: [], unsent: 1 })
  const pull = () => transport.pull({ event: paddock.event, since: 0, at: '', snapshot: '' })
  return { paddock, phone, transport, push, pull, clock, stopClock }
}

afterEach(() => {
  vi.unstubAllGlobals()
  setClock(Date.now)()
})

describe('over HTTP', () => {
  test('[S5] push and pull are let in by the device’s own signature, with no cookie', async () => {
    const { push, pull, paddock } = await overHttp()
    expect(await push()).toMatchObject({
      state: 'answered',
      value: { answers: [{ outcome: 'stored', seq: 1 }], serverTime: paddock.time.now },
    })
    expect(await pull()).toMatchObject({ state: 'answered', value: { seq: 1, list: { seq: 1 }, snapshot: { event: { code: 7 } } } })
  })

  test('[S5] a token by a clock far out is refused with the server’s time, and by the corrected clock let in', async () => {
    const { push, clock, transport, paddock } = await overHttp()
    clock.now -= 3_600_000
    const reply = await push()
    expect(reply).toEqual({ state: 'unanswered', why: 'refused', serverTime: paddock.time.now })
    transport.setOffset(3_600_000)
    expect((await push()).state).toBe('answered')
  })

  test('[M2] a server that has forgotten the device knows it again by its certificate', async () => {
    const here = await overHttp()
    here.paddock.database().$client.exec('DELETE FROM device_person; DELETE FROM device; DELETE FROM crew_member')
    expect(await here.push()).toMatchObject({ state: 'answered', value: { answers: [{ outcome: 'stored' }] } })
  })

  test.each([
    ['a captive portal’s page', new Response('<html>welcome</html>', { headers: { 'content-type': 'text/html' } }), 'not-our-server'],
    ['a cut answer', new Response('{"answers":[{"id":'), 'not-our-server'],
    ['JSON of somebody else', new Response('{"ok":true}'), 'not-our-server'],
    ['a 502 of a proxy', new Response('bad gateway', { status: 502 }), 'not-our-server'],
  ] as const)('[S6] %s is no answer', async (_, response, why) => {
    const { push } = await overHttp(() => response.clone())
    expect(await push()).toEqual({ state: 'unanswered', why, serverTime: null })
  })

  test('[S6] no network and a redirect are no answer either', async () => {
    const { push } = await overHttp(() => {
      throw new TypeError('fetch failed')
    })
    expect(await push()).toEqual({ state: 'unanswered', why: 'offline', serverTime: null })
  })

  test('[S1] a body over the limit is told as too much', async () => {
    const { transport, paddock } = await overHttp()
    const records = ['x'.repeat(4_000_001)]
    const reply = await transport.push({ protocol: 1, event: paddock.event, certificates: [], records, notes: [], unsent: 1 })
    expect(reply).toEqual({ state: 'too-much', status: 413 })
  })

  test('[T3] a build whose protocol is no longer spoken is told so', async () => {
    const { transport, paddock } = await overHttp()
    const reply = await transport.push({ protocol: 0, event: paddock.event, certificates: [], records: [], notes: [], unsent: 0 })
    expect(reply).toMatchObject({ state: 'unanswered', why: 'too-old' })
  })

  test('[S8] the live stream tells a device of each change', async () => {
    const { transport, push } = await overHttp()
    const pokes: number[] = []
    const opened = vi.fn()
    const stop = transport.live({ onOpen: opened, onPoke: () => pokes.push(pokes.length + 1), onEnd: () => undefined })
    await vi.waitFor(() => expect(pokes).toHaveLength(1))
    expect(opened).toHaveBeenCalledOnce()
    await push()
    await vi.waitFor(() => expect(pokes).toHaveLength(2))
    stop()
  })
})
