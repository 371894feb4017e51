/**
 * Where the bytes of photographs are kept, each under the SHA-256 of those very bytes (64 lower-case hex). It knows no owner and no right: whoever
 * asks it has been asked already. Adapters: a folder, memory; object storage later. All sit the exam in `tests/photos/store-contract.ts`.
 */
export interface PhotoStore {
  /** Kept for good when this resolves, or not at all. The same hash again changes nothing. Rejects with `PhotoStoreFull` or `PhotoStoreFailed`. */
  readonly put: (hash: string, bytes: Uint8Array) => Promise<void>
  /** Null where there is none. Rejects with `PhotoStoreDamaged` when what lies there is not what was kept, else with `PhotoStoreFailed`. */
  readonly get: (hash: string) => Promise<Uint8Array | null>
  readonly has: (hash: string) => Promise<boolean>
  /** Gone when this resolves; nothing there is no error. */
  readonly delete: (hash: string) => Promise<void>
}

/** No room for another photograph; those that are kept can still be read. */
export class PhotoStoreFull extends Error {
  override readonly name = 'PhotoStoreFull'
}

/** The bytes under a hash are not those that were kept. */
export class PhotoStoreDamaged extends Error {
  override readonly name = 'PhotoStoreDamaged'
}

/** Anything else: no right to the folder, a disk that fails. */
export class PhotoStoreFailed extends Error {
  override readonly name = 'PhotoStoreFailed'
}

const HASH = /^[0-9a-f]{64}$/

/** Refuses a name that is no hash: whatever comes here, no adapter ever makes a path of anything else. */
export function assertPhotoHash(hash: string): void {
  if (!HASH.test(hash)) throw new PhotoStoreFailed('a photograph is named by its SHA-256 in lower-case hex')
}
