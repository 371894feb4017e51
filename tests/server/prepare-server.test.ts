import { closeSync, mkdtempSync, openSync, rmSync, statSync, writeFileSync, writeSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, expect, test } from 'vitest'
import { UnfitDatabaseError } from '@/db/assert-database'
import { openDatabase } from '@/db/client'
import { prepareDatabase } from '@/db/prepare-server'

let folder: string
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'lockwire-'))
})
afterEach(() => rmSync(folder, { recursive: true, force: true }))

test('a new file is made, migrated and fit; started again it is as it was', () => {
  const file = join(folder, 'new', 'lockwire.db')
  prepareDatabase(() => openDatabase(file)).$client.close()
  prepareDatabase(() => openDatabase(file)).$client.close()
  expect(statSync(file).size).toBeGreaterThan(0)
})

test('a file that is no database is left alone and not served, with a word on the backup', () => {
  const file = join(folder, 'lockwire.db')
  writeFileSync(file, 'a shopping list, longer than the header of a database file would be, and then some more of it\n'.repeat(3))
  const before = statSync(file).size
  const serve = () => prepareDatabase(() => openDatabase(file))
  expect(serve).toThrow(UnfitDatabaseError)
  expect(serve).toThrow(/Restore the last good backup/)
  expect(statSync(file).size).toBe(before)
})

test('a file with a garbled page is not served', () => {
  const file = join(folder, 'lockwire.db')
  prepareDatabase(() => openDatabase(file)).$client.close()
  const handle = openSync(file, 'r+')
  const pages = statSync(file).size / 4096
  for (let page = 5; page < pages; page++) writeSync(handle, Buffer.alloc(4096, 0xa5), 0, 4096, page * 4096)
  closeSync(handle)
  expect(() => prepareDatabase(() => openDatabase(file))).toThrow(UnfitDatabaseError)
})
