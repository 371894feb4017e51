import type { DayParts } from './day-parts'
import type { DayPhotos } from './day-photos'
import { storageError } from './problem-of'

/** What the screens do with photographs. */
export function photoAccess({ photos, sending, transport, disk }: DayParts): DayPhotos {
  return {
    keep: photos.keep,
    drop: async (hash) => {
      if (disk.memory.namesPhoto(hash)) return
      try {
        await photos.change(hash, () => null)
      } catch (error) {
        throw storageError(error)
      }
    },
    read: async (hash) => {
      const own = await photos.bytes(hash).catch(() => null)
      return own === null ? transport.getPhoto(hash) : new Blob([own], { type: 'image/jpeg' })
    },
    send: sending.sendAll,
  }
}
