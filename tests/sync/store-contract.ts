import { describe, expect, test } from 'vitest'
import { StoreConflict, StoreFailed, type DeviceStore } from '@/lib/sync/client/device-store'

/** The promises of a device store, as an exam that every implementation sits. `open` gives another tab on the same disk at each call. */
export function storeContract(name: string, newDisk: () => { readonly open: () => Promise<DeviceStore> }): void {
  describe(`a device store in ${name}`, () => {
    test('[M1] what was committed is there for whoever opens it later', async () => {
      const disk = newDisk()
      const first = await disk.open()
      await first.commit({ put: [['r:1', { jws: 'a' }]] })
      first.close()
      expect(await (await disk.open()).read('r:1')).toEqual({ jws: 'a' })
    })

    test('[M1] a commit of many is all or none: one value that cannot be kept takes the others with it', async () => {
      const store = await newDisk().open()
      await store.commit({ put: [['r:1', 1]] })
      await expect(
        store.commit({
          put: [
            ['r:1', 2],
            ['r:2', 2],
            ['r:3', () => 'a function has no clone'],
          ],
        }),
      ).rejects.toThrow()
      expect(await store.list('r:')).toEqual([['r:1', 1]])
    })

    test('[M1] a counter that another tab has moved on stops the whole commit', async () => {
      const disk = newDisk()
      const [one, two] = [await disk.open(), await disk.open()]
      const expectation = { key: 'm:make', field: 'deviceSeq', value: undefined }
      await one.commit({
        put: [
          ['m:make', { deviceSeq: 1 }],
          ['r:1', 'one'],
        ],
        expect: expectation,
      })
      const late = two.commit({
        put: [
          ['m:make', { deviceSeq: 1 }],
          ['r:2', 'two'],
        ],
        expect: expectation,
      })
      await expect(late).rejects.toBeInstanceOf(StoreConflict)
      expect(await one.list('r:')).toEqual([['r:1', 'one']])
      await one.commit({ put: [['m:make', { deviceSeq: 2 }]], expect: { ...expectation, value: 1 } })
      expect(await two.read('m:make')).toEqual({ deviceSeq: 2 })
    })

    test('lists by prefix, in the order of the keys, and nothing else', async () => {
      const store = await newDisk().open()
      await store.commit({
        put: [
          ['r:b', 2],
          ['n:a', 0],
          ['r:a', 1],
          ['s', 3],
        ],
      })
      expect(await store.list('r:')).toEqual([
        ['r:a', 1],
        ['r:b', 2],
      ])
      await store.commit({ put: [], remove: ['r:a'] })
      expect(await store.list('r:')).toEqual([['r:b', 2]])
      expect(await store.read('r:a')).toBeUndefined()
    })

    test('keeps a key pair that nobody can read out, and it still signs', async () => {
      const store = await newDisk().open()
      const pair = await crypto.subtle.generateKey('Ed25519', false, ['sign', 'verify'])
      await store.commit({ put: [['key', pair]] })
      const held = (await store.read('key')) as CryptoKeyPair
      const text = new TextEncoder().encode('hello')
      const signature = await crypto.subtle.sign('Ed25519', held.privateKey, text)
      expect(held.privateKey.extractable).toBe(false)
      expect(await crypto.subtle.verify('Ed25519', pair.publicKey, signature, text)).toBe(true)
    })

    test('a lock lets one in at a time, over tabs, and a holder that fails lets the next one in', async () => {
      const disk = newDisk()
      const [one, two] = [await disk.open(), await disk.open()]
      const order: string[] = []
      const failing = one.lock('make', async () => {
        order.push('one in')
        await Promise.resolve()
        order.push('one out')
        throw new Error('broke')
      })
      const waiting = two.lock('make', async () => order.push('two'))
      expect(await two.tryLock('make', async () => 'in')).toBeNull()
      await expect(failing).rejects.toThrow('broke')
      await waiting
      expect(order).toEqual(['one in', 'one out', 'two'])
      expect(await two.tryLock('make', async () => 'in')).toBe('in')
    })

    test('a tab hears of what another has committed, never of its own', async () => {
      const disk = newDisk()
      const [one, two] = [await disk.open(), await disk.open()]
      const own: (readonly string[])[] = []
      one.onOtherTab((keys) => own.push(keys))
      const heard = new Promise<readonly string[]>((resolve) => two.onOtherTab(resolve))
      await one.commit({ put: [['r:1', 1]], remove: ['r:0'] })
      expect(await heard).toEqual(['r:1', 'r:0'])
      expect(own).toEqual([])
    })

    test('a store beside it is of its own, and is found again by the same name', async () => {
      const disk = newDisk()
      const photos = await (await disk.open()).beside('photos')
      await photos.commit({ put: [['b:1', new Uint8Array([1, 2, 3])]] })
      const other = await disk.open()
      expect(await other.list('')).toEqual([])
      expect(await (await other.beside('photos')).read('b:1')).toEqual(new Uint8Array([1, 2, 3]))
    })

    test('a closed store takes nothing and says so', async () => {
      const store = await newDisk().open()
      store.close()
      await expect(store.commit({ put: [['r:1', 1]] })).rejects.toBeInstanceOf(StoreFailed)
    })
  })
}
