/**
 * One device's disk for one event. Values are whatever a structured clone keeps, keys included. Implementations: IndexedDB and memory; both take the exam in
 * `tests/sync/store-contract.ts`.
 */
export interface DeviceStore {
  /** The same for all tabs of one device and event. */
  readonly name: string
  readonly read: (key: string) => Promise<unknown>
  /** Every value whose key begins with `prefix`, by key. */
  readonly list: (prefix: string) => Promise<readonly (readonly [key: string, value: unknown])[]>
  /**
   * One transaction: all of it is on the disk when this resolves, or nothing is. Rejects with `StoreFull` when there is no room, with `StoreConflict` when
   * `expect` is not met, with `StoreFailed` for anything else.
   */
  readonly commit: (change: StoreChange) => Promise<void>
  /** Runs `work` while no other tab or call holds `name`. */
  readonly lock: <T>(name: string, work: () => Promise<T>) => Promise<T>
  /** As `lock`, but gives `null` at once when it is held. */
  readonly tryLock: <T>(name: string, work: () => Promise<T>) => Promise<T | null>
  /** Tells of the keys that other tabs have committed; returns how to stop. */
  readonly onOtherTab: (listener: (keys: readonly string[]) => void) => () => void
  /** Another store of the same device and event, for what is heavy and is counted apart; found again by the same name. */
  readonly beside: (name: string) => Promise<DeviceStore>
  readonly room: () => Promise<StoreRoom>
  /** Asks that the browser never evicts this; false when it will not promise. */
  readonly persist: () => Promise<boolean>
  /** Whether locks reach over tabs. */
  readonly locksReachTabs: boolean
  readonly close: () => void
}

export interface StoreChange {
  readonly put: readonly (readonly [key: string, value: unknown])[]
  readonly remove?: readonly string[]
  /** What `key` must hold, compared within the transaction on this one field (undefined: the key is absent). The last guard against a forked counter. */
  readonly expect?: { readonly key: string; readonly field: string; readonly value: unknown }
}

export interface StoreRoom {
  /** Bytes left by the browser's own estimate; null when it gives none. */
  readonly leftBytes: number | null
  readonly persisted: boolean | null
}

export class StoreFull extends Error {
  override readonly name = 'StoreFull'
}

export class StoreConflict extends Error {
  override readonly name = 'StoreConflict'
}

export class StoreFailed extends Error {
  override readonly name = 'StoreFailed'
}
