import { createHash } from 'node:crypto'
import { describe, expect, test } from 'vitest'
import type { PhotoStore } from '@/lib/photos/port'

export function named(text: string): { readonly hash: string; readonly bytes: Uint8Array } {
  const bytes = new TextEncoder().encode(text)
  return { hash: createHash('sha256').update(bytes).digest('hex'), bytes }
}

/** The promises of a photograph store, as an exam that every adapter sits. */
export function photoStoreContract(name: string, newStore: () => PhotoStore): void {
  describe(`a photograph store in ${name}`, () => {
    test('what was put is there, byte for byte, and nothing else is', async () => {
      const [store, one, other] = [newStore(), named('one'), named('other')]
      await store.put(one.hash, one.bytes)

      expect(Buffer.from((await store.get(one.hash)) ?? [])).toEqual(Buffer.from(one.bytes))
      expect([await store.has(one.hash), await store.has(other.hash)]).toEqual([true, false])
      expect(await store.get(other.hash)).toBeNull()
    })

    test('put a second time, even by two at once, it is there once and unchanged', async () => {
      const [store, one] = [newStore(), named('one')]
      await Promise.all([store.put(one.hash, one.bytes), store.put(one.hash, one.bytes)])
      await store.put(one.hash, one.bytes)

      expect(Buffer.from((await store.get(one.hash)) ?? [])).toEqual(Buffer.from(one.bytes))
    })

    test('what was deleted is gone, what was not stays, and deleting nothing is no error', async () => {
      const [store, one, other] = [newStore(), named('one'), named('other')]
      await store.put(one.hash, one.bytes)
      await store.put(other.hash, other.bytes)
      await store.delete(one.hash)
      await store.delete(one.hash)

      expect([await store.has(one.hash), await store.has(other.hash)]).toEqual([false, true])
    })

    test('changing the bytes after they were put changes nothing that is kept', async () => {
      const [store, one] = [newStore(), named('one')]
      const mine = Uint8Array.from(one.bytes)
      await store.put(one.hash, mine)
      mine.fill(0)

      expect(Buffer.from((await store.get(one.hash)) ?? [])).toEqual(Buffer.from(one.bytes))
    })

    test.each(['', '../../etc/passwd', `${'a'.repeat(63)}/`, 'A'.repeat(64), 'a'.repeat(65)])(
      '%j is no name for a photograph',
      async (hash) => {
        const store = newStore()
        for (const work of [store.get(hash), store.has(hash), store.put(hash, new Uint8Array(1)), store.delete(hash)])
          await expect(work).rejects.toMatchObject({ name: 'PhotoStoreFailed' })
      },
    )
  })
}
