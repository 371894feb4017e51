import 'server-only'
import { env } from '@/lib/platform/env'
import { filePhotoStore } from './file-photo-store'
import type { PhotoStore } from './port'

// Next bundles routes apart; all of them must keep in the same place.
const holder = globalThis as typeof globalThis & { lockwirePhotoStore?: PhotoStore }

/** The store this server keeps photographs in. */
export function servedPhotoStore(): PhotoStore {
  holder.lockwirePhotoStore ??= filePhotoStore(env().photoFolder)
  return holder.lockwirePhotoStore
}

/** Makes this the store that `servedPhotoStore()` gives; for tests and scripts that open their own. */
export function usePhotoStore(store: PhotoStore): void {
  holder.lockwirePhotoStore = store
}
