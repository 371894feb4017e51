import { mkdtempSync, readdirSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { filePhotoStore } from '@/lib/photos/file-photo-store'
import { memoryPhotoStore } from '@/lib/photos/memory-photo-store'
import { named, photoStoreContract } from './store-contract'

let folder = ''
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'lockwire-photos-'))
})
afterAll(() => rmSync(folder, { recursive: true, force: true }))

let folders = 0
const newFolder = () => join(folder, String(++folders))

photoStoreContract('memory', () => memoryPhotoStore())
photoStoreContract('a folder', () => filePhotoStore(newFolder()))

test('a folder: another process that opens it finds the photograph, readable by its owner only, and no half file beside it', async () => {
  const [at, one] = [newFolder(), named('one')]
  await filePhotoStore(at).put(one.hash, one.bytes)

  expect(Buffer.from((await filePhotoStore(at).get(one.hash)) ?? [])).toEqual(Buffer.from(one.bytes))
  const shelf = join(at, one.hash.slice(0, 2))
  expect(readdirSync(shelf)).toEqual([`${one.hash}.jpg`])
  expect(statSync(join(shelf, `${one.hash}.jpg`)).mode & 0o777).toBe(0o600)
})

test('a folder: a file that was changed on the disk is told, never served', async () => {
  const [at, one] = [newFolder(), named('one')]
  await filePhotoStore(at).put(one.hash, one.bytes)
  writeFileSync(join(at, one.hash.slice(0, 2), `${one.hash}.jpg`), 'two')

  await expect(filePhotoStore(at).get(one.hash)).rejects.toMatchObject({ name: 'PhotoStoreDamaged' })
})

test('a folder that cannot be one: the failure has its name, and the reason is kept with it', async () => {
  const [at, one] = [newFolder(), named('one')]
  writeFileSync(at, 'a file stands where the folder should')

  await expect(filePhotoStore(at).put(one.hash, one.bytes)).rejects.toMatchObject({ name: 'PhotoStoreFailed', message: 'ENOTDIR' })
})

test('memory: a full disk and a failing one have their names, and keep nothing', async () => {
  const [store, one] = [memoryPhotoStore(['full', 'failed']), named('one')]

  await expect(store.put(one.hash, one.bytes)).rejects.toMatchObject({ name: 'PhotoStoreFull' })
  await expect(store.put(one.hash, one.bytes)).rejects.toMatchObject({ name: 'PhotoStoreFailed' })
  expect(await store.has(one.hash)).toBe(false)
})
