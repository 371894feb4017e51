import type { DayPhoto, KeptPhoto } from './day-photos'
import { StoreFull, type DeviceStore } from './device-store'
import { dayError, storageError } from './problem-of'

/** One that no record names is forgotten after this: the check was left without an answer, ms. */
const UNNAMED_FOR_MS = 86_400_000
/** How many that the server has give way at once when there is no room. */
const MAKE_ROOM = 10

/** The photographs on this device's disk, what is known of them mirrored in memory. */
export interface PhotoShelf {
  readonly all: () => readonly KeptPhoto[]
  readonly keep: (photo: DayPhoto) => Promise<void>
  readonly bytes: (hash: string) => Promise<Uint8Array<ArrayBuffer> | null>
  readonly change: (hash: string, change: (photo: KeptPhoto) => KeptPhoto | null) => Promise<void>
  /** Those that the server once had, to be sent anew. */
  readonly sendAgain: () => Promise<void>
}

export interface ShelfParts {
  readonly store: DeviceStore
  readonly now: () => number
  readonly isNamed: (hash: string) => boolean
  readonly bump: () => void
}

export async function photoShelf({ store, now, isNamed, bump }: ShelfParts): Promise<PhotoShelf> {
  const known = new Map<string, KeptPhoto>()

  async function read(): Promise<void> {
    const rows = await store.list('p:')
    known.clear()
    for (const [, value] of rows) known.set((value as KeptPhoto).hash, value as KeptPhoto)
  }

  async function write(photos: readonly KeptPhoto[], bytes: readonly DayPhoto[] = []): Promise<void> {
    await store.commit({
      put: [
        ...bytes.map((photo) => [`b:${photo.hash}`, photo.bytes] as const),
        ...photos.map((photo) => [`p:${photo.hash}`, photo] as const),
      ],
    })
    for (const photo of photos) known.set(photo.hash, photo)
  }

  async function remove(hashes: readonly string[]): Promise<void> {
    if (hashes.length === 0) return
    await store.commit({ put: [], remove: hashes.flatMap((hash) => [`p:${hash}`, `b:${hash}`]) })
    for (const hash of hashes) known.delete(hash)
  }

  async function keep(photo: DayPhoto): Promise<void> {
    if (known.has(photo.hash)) return
    const { hash } = photo
    const kept: KeptPhoto = { hash, size: photo.bytes.byteLength, keptAt: now(), state: 'waits', code: null }
    for (;;) {
      try {
        await write([kept], [photo])
        return
      } catch (error) {
        if (!(error instanceof StoreFull)) throw storageError(error)
        const sent = [...known.values()].filter(({ state }) => state === 'sent').sort((a, b) => a.keptAt - b.keptAt)
        // What only this device has never gives way.
        if (sent.length === 0) throw dayError('no-room-for-photo')
        await remove(sent.slice(0, MAKE_ROOM).map((one) => one.hash))
      } finally {
        bump()
      }
    }
  }

  async function change(hash: string, to: (photo: KeptPhoto) => KeptPhoto | null): Promise<void> {
    const photo = known.get(hash)
    if (photo === undefined) return
    const next = to(photo)
    await (next === null ? remove([hash]) : write([next]))
    bump()
  }

  await read()
  await remove([...known.values()].filter(({ hash, keptAt }) => keptAt < now() - UNNAMED_FOR_MS && !isNamed(hash)).map(({ hash }) => hash))
  store.onOtherTab(() => void read().then(bump))
  return {
    all: () => [...known.values()],
    keep,
    change,
    bytes: async (hash) => ((await store.read(`b:${hash}`)) as Uint8Array<ArrayBuffer> | undefined) ?? null,
    sendAgain: async () => {
      await write([...known.values()].filter(({ state }) => state === 'sent').map((photo) => ({ ...photo, state: 'waits' as const })))
      bump()
    },
  }
}
