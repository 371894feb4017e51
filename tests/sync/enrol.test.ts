import { afterEach, expect, test, vi } from 'vitest'
import { enrolledHere, enrolHere, type BrowserStores } from '@/lib/sync/client/enrol-here'
import type { Enrolment } from '@/lib/sync/client/enrolment'
import { memoryDeviceStore, memoryDisk, type MemoryDisk } from '@/lib/sync/client/store-memory'
import { base64url } from '@/lib/sync/core/base64url'
import { newId } from '@/lib/platform/ids'

const EVENT = newId()
const PERSON = newId()

function aBrowser(): BrowserStores & { readonly disks: Map<string, MemoryDisk> } {
  const disks = new Map<string, MemoryDisk>()
  const open = async (name: string) => {
    const disk = disks.get(name) ?? memoryDisk(name)
    disks.set(name, disk)
    return memoryDeviceStore(disk)
  }
  return { disks, phone: () => open('phone'), device: (event, device) => open(`${event}-${device}`) }
}

/** Stands in for the server: one device per key, as the real one. `lose` answers are done and not heard. */
function aServer(lose = 0) {
  const devices = new Map<string, string>()
  let left = lose
  vi.stubGlobal('fetch', async (_: string, init: { readonly body: string }) => {
    const { publicKey, name } = JSON.parse(init.body) as { readonly publicKey: string; readonly name: string }
    const device = devices.get(publicKey) ?? newId()
    devices.set(publicKey, device)
    if (left-- > 0) throw new TypeError('fetch failed')
    const people = [{ id: PERSON, name: 'Asha', roles: ['scrutineer'] }]
    const says = { v: 1, device, event: EVENT, kid: devices.size, publicKey, deviceName: name, people, issuedAt: 1 }
    const part = (value: object) => base64url(new TextEncoder().encode(JSON.stringify(value)))
    const certificate = `${part({ alg: 'EdDSA' })}.${part(says)}.AA`
    return Response.json({ device, kid: devices.size, certificate, serverPublicKey: publicKey, people, serverTime: 1 })
  })
  return devices
}

afterEach(() => {
  vi.unstubAllGlobals()
})

test('[M2] a browser becomes a device: its key stays in the device’s store and cannot be read out', async () => {
  aServer()
  const browser = aBrowser()
  const outcome = await enrolHere({ event: EVENT, name: 'bay tablet' }, browser, 5)
  expect(outcome).toMatchObject({ ok: true, enrolled: { event: EVENT, name: 'bay tablet', at: 5 } })
  const [here] = await enrolledHere(browser)
  const held = browser.disks.get(`${EVENT}-${here?.device ?? ''}`)?.values.get('enrolment') as Enrolment
  expect(held).toMatchObject({
    says: { device: here?.device, people: [{ id: PERSON }] },
    key: { kind: 'device', publicKey: held.says.publicKey },
  })
  expect(held.key.kind === 'device' && held.key.privateKey.extractable).toBe(false)
  expect([...(browser.disks.get('phone')?.values.keys() ?? [])]).toEqual([`device:${here?.device ?? ''}`])
})

test('[M2] where the answer was lost the same key is asked for again, and gives the same device', async () => {
  const devices = aServer(1)
  const browser = aBrowser()
  expect(await enrolHere({ event: EVENT, name: 'phone' }, browser, 1)).toMatchObject({ ok: false, problem: { code: 'no-network' } })
  expect(await enrolHere({ event: EVENT, name: 'phone' }, browser, 2)).toMatchObject({ ok: true })
  expect(devices.size).toBe(1)
})

test('[M2] a second person on one tablet joins its device', async () => {
  const devices = aServer()
  const browser = aBrowser()
  await enrolHere({ event: EVENT, name: 'tablet' }, browser, 1)
  await enrolHere({ event: EVENT, name: 'tablet' }, browser, 2)
  expect(devices.size).toBe(1)
  expect(await enrolledHere(browser)).toHaveLength(1)
})
