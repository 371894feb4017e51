import { assertPhotoHash, PhotoStoreFailed, PhotoStoreFull, type PhotoStore } from './port'

/** Photographs in memory, for tests: what the next calls of `put` meet stands in `faults`, first first. */
export function memoryPhotoStore(faults: ('full' | 'failed')[] = []): PhotoStore {
  const kept = new Map<string, Uint8Array>()
  return {
    put: async (hash, bytes) => {
      assertPhotoHash(hash)
      const fault = faults.shift()
      if (fault === 'full') throw new PhotoStoreFull('no room')
      if (fault !== undefined) throw new PhotoStoreFailed(fault)
      if (!kept.has(hash)) kept.set(hash, Uint8Array.from(bytes))
    },
    get: async (hash) => {
      assertPhotoHash(hash)
      return kept.get(hash) ?? null
    },
    has: async (hash) => {
      assertPhotoHash(hash)
      return kept.has(hash)
    },
    delete: async (hash) => {
      assertPhotoHash(hash)
      kept.delete(hash)
    },
  }
}
