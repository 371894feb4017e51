import 'server-only'
import { createHash, randomUUID } from 'node:crypto'
import { access, mkdir, open, readFile, rename, rm } from 'node:fs/promises'
import { join } from 'node:path'
import { assertPhotoHash, PhotoStoreDamaged, PhotoStoreFailed, PhotoStoreFull, type PhotoStore } from './port'

/**
 * Photographs in a folder, one file each, in 256 folders by the first two signs. Written beside its place, forced to the disk and only then
 * renamed, so that a power cut leaves a whole file or none; what it leaves beside (`.part`) is nobody's and may be deleted.
 */
export function filePhotoStore(folder: string): PhotoStore {
  const shelfOf = (hash: string) => join(folder, hash.slice(0, 2))
  const pathOf = (hash: string) => join(shelfOf(hash), `${hash}.jpg`)

  return {
    put: (hash, bytes) =>
      named(hash, async () => {
        if (await isThere(pathOf(hash))) return
        await mkdir(shelfOf(hash), { recursive: true })
        await writeWhole(pathOf(hash), bytes)
        await force(shelfOf(hash))
      }),
    get: (hash) =>
      named(hash, async () => {
        const bytes = await unlessMissing(readFile(pathOf(hash)), null)
        if (bytes !== null && createHash('sha256').update(bytes).digest('hex') !== hash) {
          throw new PhotoStoreDamaged('the file of a photograph is not what was written')
        }
        return bytes
      }),
    has: (hash) => named(hash, () => isThere(pathOf(hash))),
    delete: (hash) => named(hash, () => rm(pathOf(hash), { force: true })),
  }
}

async function writeWhole(path: string, bytes: Uint8Array): Promise<void> {
  // A name of its own: two who send the same photograph at once must not write into one file.
  const beside = `${path}.${randomUUID()}.part`
  try {
    const file = await open(beside, 'wx', 0o600)
    try {
      await file.writeFile(bytes)
      await file.sync()
    } finally {
      await file.close()
    }
    await rename(beside, path)
  } catch (error) {
    await rm(beside, { force: true })
    throw error
  }
}

/** A rename is on the disk only once its folder is. */
async function force(folder: string): Promise<void> {
  const handle = await open(folder, 'r')
  try {
    await handle.sync()
  } finally {
    await handle.close()
  }
}

function isThere(path: string): Promise<boolean> {
  return unlessMissing(
    access(path).then(() => true),
    false,
  )
}

async function unlessMissing<T>(work: Promise<T>, otherwise: T): Promise<T> {
  try {
    return await work
  } catch (error) {
    if (codeOf(error) === 'ENOENT') return otherwise
    throw error
  }
}

/** Gives every failure of the disk one of the port's names. */
async function named<T>(hash: string, work: () => Promise<T>): Promise<T> {
  assertPhotoHash(hash)
  try {
    return await work()
  } catch (error) {
    if (error instanceof PhotoStoreDamaged) throw error
    const code = codeOf(error)
    if (code === 'ENOSPC' || code === 'EDQUOT') throw new PhotoStoreFull(code, { cause: error })
    throw new PhotoStoreFailed(code, { cause: error })
  }
}

function codeOf(error: unknown): string {
  return error instanceof Error && 'code' in error ? String(error.code) : String(error)
}
