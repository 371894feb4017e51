import 'server-only'
import { eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { photo } from '@/db/schema'
import type { PhotoView } from '@/lib/contracts/photos'
import { sha256 } from '@/lib/platform/sha256'
import { PhotoStoreFull, type PhotoStore } from '../port'
import { type PhotoFault, reEncode } from '../re-encode'
import { turns } from '../turns'

/** Decoding is heavy: two at once keep a small machine answering; what waits may hold this many bytes. */
const decoding = turns(2, 80_000_000)

export interface PhotoOwner {
  readonly clubId: string
  /** The event it was taken at; null for an entrant's own. */
  readonly eventId: string | null
  readonly accountId: string | null
  readonly deviceId: string | null
}

/**
 * Re-encodes a photograph, keeps its bytes in the store and its row in the database, in this order: a row never names bytes that are not
 * there. Known already: gives what is kept. Also for seeds. Gives a fault for what is no photograph, `busy` when too many wait, `no-room`.
 */
export async function keepPhoto(
  database: Db,
  store: PhotoStore,
  bytes: Uint8Array,
  owner: PhotoOwner,
  now: number,
): Promise<PhotoView | PhotoFault | 'busy' | 'no-room'> {
  const hash = sha256(bytes)
  const known = keptPhoto(database, hash)
  if (known !== null && (await store.has(known.storedHash))) return viewOf(known)
  const made = await decoding.take(bytes.byteLength, () => reEncode(bytes))
  if (made === null) return 'busy'
  if (typeof made === 'string') return made
  const storedHash = sha256(made.jpeg)
  try {
    await store.put(storedHash, made.jpeg)
  } catch (error) {
    if (error instanceof PhotoStoreFull) return 'no-room'
    throw error
  }
  const row = { ...owner, hash, storedHash, width: made.width, height: made.height, bytes: made.jpeg.byteLength, receivedAt: now }
  const { width, height, bytes: size } = row
  // The row of a photograph whose bytes were lost gets new ones; whose it is stays as it was.
  const again = { storedHash, width, height, bytes: size }
  database.insert(photo).values(row).onConflictDoUpdate({ target: photo.hash, set: again }).run()
  return viewOf(row)
}

function keptPhoto(database: Db, hash: string): typeof photo.$inferSelect | null {
  return database.select().from(photo).where(eq(photo.hash, hash)).get() ?? null
}

function viewOf({ hash, width, height, bytes }: PhotoView): PhotoView {
  return { hash, width, height, bytes }
}
