import { createHash } from 'node:crypto'
import { describe, expect, test } from 'vitest'
import { DISCARD_WORDS } from '@/lib/sync/client/day-client'
import { aSyncPaddock, type Phone, type SyncPaddock } from '../support/sync-paddock'
import { finds } from '../support/sync-walk'

/** A picture as far as a store knows. */
function aPhoto(words: string) {
  const bytes = new TextEncoder().encode(words)
  return { bytes, hash: createHash('sha256').update(bytes).digest('hex') }
}

async function aBay() {
  const paddock = await aSyncPaddock()
  const phone = await paddock.phone(['scrutineer'])
  await phone.day.loadDay()
  return { paddock, phone, car: paddock.cars[0] as string }
}

/** A fail that shows this photograph. */
async function failsWith(phone: Phone, car: string, words: string) {
  const photo = aPhoto(words)
  await phone.day.photos.keep(photo)
  await finds(phone.day, car, 'body.mirror', 'fail', { reason: 'other', photos: [photo.hash] })
  return photo
}

/** Lets time go on until it is so; signing takes real time, which the clock of the test does not know. */
async function until(paddock: SyncPaddock, isSo: () => boolean): Promise<void> {
  for (let tries = 0; tries < 200 && !isSo(); tries += 1) await paddock.time.pass(100)
  expect(isSo()).toBe(true)
}

const textOf = async (blob: Blob | null) => (blob === null ? null : blob.text())

describe('keeping', () => {
  test('[M1] a photograph is on the disk before any record names it, and a reload has both', async () => {
    const { phone, car } = await aBay()
    const photo = await failsWith(phone, car, 'a slack nut')
    const again = await phone.reload()

    expect(await textOf(await again.photos.read(photo.hash))).toBe('a slack nut')
    expect(again.status()).toMatchObject({ unsent: 1, photosUnsent: 1 })
  })

  test('it lies apart from the records: what is read at every start holds none of its bytes', async () => {
    const { phone, car } = await aBay()
    const photo = await failsWith(phone, car, 'a slack nut')

    expect([...phone.disk.values.keys()].some((key) => key.includes(photo.hash))).toBe(false)
    expect([...(phone.disk.beside.get('photos')?.values.keys() ?? [])].sort()).toEqual([`b:${photo.hash}`, `p:${photo.hash}`])
  })

  test('no room: told in words, nothing was kept, and what was recorded before stays', async () => {
    const { phone, car } = await aBay()
    await failsWith(phone, car, 'the first')
    phone.disk.beside.get('photos')?.faults.push('full')
    const photo = aPhoto('the second')

    await expect(phone.day.photos.keep(photo)).rejects.toMatchObject({ problem: { code: 'no-room-for-photo' } })
    expect(await phone.day.photos.read(photo.hash)).toBeNull()
    expect(phone.day.status()).toMatchObject({ unsent: 1, photosUnsent: 1 })
  })

  test('no room: one that the server has gives way, one that only this device has never does', async () => {
    const { phone, car } = await aBay()
    const sent = await failsWith(phone, car, 'sent')
    await phone.day.drain()
    expect(await phone.day.photos.send()).toBe(1)
    const waits = await failsWith(phone, car, 'waits')
    phone.disk.beside.get('photos')?.faults.push('full')
    await phone.day.photos.keep(aPhoto('new'))
    phone.network.weather = () => 'drop'

    expect(await phone.day.photos.read(sent.hash)).toBeNull()
    expect(await textOf(await phone.day.photos.read(waits.hash))).toBe('waits')
  })

  test('one that is taken away before a record names it is gone; one that is named stays', async () => {
    const { phone, car } = await aBay()
    const unnamed = aPhoto('the wrong wheel')
    await phone.day.photos.keep(unnamed)
    await phone.day.photos.drop(unnamed.hash)
    const named = await failsWith(phone, car, 'the right wheel')
    await phone.day.photos.drop(named.hash)

    expect(await phone.day.photos.read(unnamed.hash)).toBeNull()
    expect(await textOf(await phone.day.photos.read(named.hash))).toBe('the right wheel')
  })

  test('one that no record named within a day is forgotten at the next start', async () => {
    const { paddock, phone, car } = await aBay()
    const [unnamed, named] = [aPhoto('never answered'), await failsWith(phone, car, 'answered')]
    await phone.day.photos.keep(unnamed)
    await paddock.time.pass(25 * 3_600_000)
    const day = await phone.reload()

    expect(await day.photos.read(unnamed.hash)).toBeNull()
    expect(await textOf(await day.photos.read(named.hash))).toBe('answered')
  })
})

describe('sending', () => {
  test('[S9] a record never waits for its photograph: it travels while the photographs do not arrive', async () => {
    const { paddock, phone, car } = await aBay()
    await failsWith(phone, car, 'a slack nut')
    phone.network.nextPhoto.push('drop')
    expect(await phone.day.drain()).toMatchObject({ state: 'done', sent: 1 })
    expect(await phone.day.photos.send()).toBe(0)

    expect(paddock.rows()).toHaveLength(1)
    expect(phone.day.status()).toMatchObject({ unsent: 0, photosUnsent: 1 })
  })

  test('[S9] a photograph waits for its record, so that the record goes first', async () => {
    const { phone, car } = await aBay()
    await failsWith(phone, car, 'a slack nut')
    expect(await phone.day.photos.send()).toBe(0)
    await phone.day.drain()

    expect(await phone.day.photos.send()).toBe(1)
    expect(phone.day.status()).toMatchObject({ photosUnsent: 0, needsAttention: 0 })
  })

  test('[S9] one that arrived and whose answer was lost is sent again, and is one', async () => {
    const { phone, car } = await aBay()
    const photo = await failsWith(phone, car, 'a slack nut')
    await phone.day.drain()
    phone.network.nextPhoto.push('reply-lost')
    expect(await phone.day.photos.send()).toBe(0)
    expect(phone.day.status().photosUnsent).toBe(1)
    expect(await phone.day.photos.send()).toBe(1)

    expect([...phone.network.photos.keys()]).toEqual([photo.hash])
  })

  test('one that no record names is not sent', async () => {
    const { phone } = await aBay()
    await phone.day.photos.keep(aPhoto('never answered'))
    await phone.day.drain()

    expect(await phone.day.photos.send()).toBe(0)
    expect(phone.day.status().photosUnsent).toBe(0)
  })

  test('the loop sends by itself after the records, backs off while nothing arrives, and comes back', async () => {
    const { paddock, phone, car } = await aBay()
    const stop = phone.day.start()
    await paddock.time.pass(1_000)
    phone.network.nextPhoto.push('drop', 'drop')
    await failsWith(phone, car, 'a slack nut')
    await until(paddock, () => paddock.rows().length === 1)
    expect(phone.day.status().photosUnsent).toBe(1)
    await until(paddock, () => phone.day.status().photosUnsent === 0)
    stop()

    expect(phone.network.nextPhoto).toEqual([])
  })

  test('one the server will not have is set aside, shown, sent again when asked and thrown away only by typing it', async () => {
    const { phone, car } = await aBay()
    const photo = await failsWith(phone, car, 'not a picture')
    await phone.day.drain()
    phone.network.nextPhoto.push('refused', 'refused')
    await phone.day.photos.send()
    expect(phone.day.status()).toMatchObject({ photosUnsent: 0, needsAttention: 1, problem: { code: 'needs-attention' } })
    expect(phone.day.attention()).toMatchObject([{ id: photo.hash, kind: 'photograph', code: 'photo-unreadable' }])

    await phone.day.retry(photo.hash)
    await phone.day.photos.send()
    await expect(phone.day.discard(photo.hash, 'yes')).rejects.toMatchObject({ problem: { code: 'wrong-words' } })
    await phone.day.discard(photo.hash, DISCARD_WORDS)
    expect(phone.day.status()).toMatchObject({ needsAttention: 0, problem: null })
  })

  test('[S4] after the server was restored from an older copy, the photographs are sent to it anew', async () => {
    const { paddock, phone, car } = await aBay()
    const copy = paddock.backUp()
    const photo = await failsWith(phone, car, 'a slack nut')
    await phone.day.drain()
    await phone.day.photos.send()
    paddock.restore(copy)
    phone.network.photos.clear()
    await phone.day.drain()
    await phone.day.photos.send()

    expect([...phone.network.photos.keys()]).toEqual([photo.hash])
    expect(paddock.rows()).toHaveLength(1)
  })
})

test('another phone sees the photograph once the server has it, and nothing while offline', async () => {
  const { paddock, phone, car } = await aBay()
  const photo = await failsWith(phone, car, 'a slack nut')
  await phone.day.drain()
  await phone.day.photos.send()
  const other = await paddock.phone(['scrutineer'])
  other.network.photos.set(photo.hash, photo.bytes)
  expect(await textOf(await other.day.photos.read(photo.hash))).toBe('a slack nut')
  other.network.weather = () => 'drop'

  expect(await other.day.photos.read(photo.hash)).toBeNull()
})

test('two tabs of one phone: what one keeps the other shows and counts', async () => {
  const { phone, car } = await aBay()
  const other = await phone.tab()
  const photo = await failsWith(phone, car, 'a slack nut')
  await new Promise((done) => setImmediate(done))

  expect(await textOf(await other.photos.read(photo.hash))).toBe('a slack nut')
  expect(other.status().photosUnsent).toBe(1)
})
