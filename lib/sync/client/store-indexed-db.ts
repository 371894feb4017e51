import { get, promisifyRequest, type UseStore } from 'idb-keyval'
import { StoreConflict, StoreFailed, StoreFull, type DeviceStore, type StoreChange, type StoreRoom } from './device-store'
import { lockQueue } from './lock-queue'

const STORE = 'day'

/** A device's disk in IndexedDB, one database per device and event, one key a record. */
export async function indexedDbStore(name: string): Promise<DeviceStore> {
  const database = await openDatabase(name)
  const useStore = strictStore(database)
  const channel = typeof BroadcastChannel === 'undefined' ? null : new BroadcastChannel(name)
  const locks = webLocks(name)
  return {
    name,
    locksReachTabs: locks.reachTabs,
    read: (key) => named(get<unknown>(key, useStore)),
    list: (prefix) => named(list(useStore, prefix)),
    commit: async (change) => {
      await named(commit(useStore, change))
      channel?.postMessage([...change.put.map(([key]) => key), ...(change.remove ?? [])])
    },
    lock: locks.lock,
    tryLock: locks.tryLock,
    onOtherTab: (listener) => {
      const hear = (event: MessageEvent<readonly string[]>) => listener(event.data)
      channel?.addEventListener('message', hear)
      return () => channel?.removeEventListener('message', hear)
    },
    beside: (other) => indexedDbStore(`${name}-${other}`),
    room,
    persist: async () => (typeof navigator === 'undefined' ? false : ((await navigator.storage?.persist?.()) ?? false)),
    close: () => {
      channel?.close()
      database.close()
    },
  }
}

function openDatabase(name: string): Promise<IDBDatabase> {
  const request = indexedDB.open(name, 1)
  request.onupgradeneeded = () => request.result.createObjectStore(STORE)
  return named(promisifyRequest(request))
}

/** idb-keyval's way into a store, with the one thing it leaves open: a transaction that is complete only once it is on the disk (rule M1). */
function strictStore(database: IDBDatabase): UseStore {
  return async (mode, callback) => callback(database.transaction(STORE, mode, { durability: 'strict' }).objectStore(STORE))
}

async function list(useStore: UseStore, prefix: string): Promise<readonly (readonly [string, unknown])[]> {
  return useStore('readonly', async (store) => {
    const range = IDBKeyRange.bound(prefix, `${prefix}\uffff`)
    const [keys, values] = await Promise.all([promisifyRequest(store.getAllKeys(range)), promisifyRequest(store.getAll(range))])
    return keys.map((key, index) => [key as string, values[index] as unknown] as const)
  })
}

function commit(useStore: UseStore, change: StoreChange): Promise<void> {
  return useStore('readwrite', (store) => {
    let cause: unknown = null
    function giveUp(why: unknown): void {
      cause = why
      store.transaction.abort()
    }
    function write(): void {
      try {
        for (const [key, value] of change.put) store.put(value, key)
        for (const key of change.remove ?? []) store.delete(key)
      } catch (error) {
        // A value that cannot be cloned throws in the middle of the puts; those before it must go too.
        giveUp(error)
      }
    }
    const done = promisifyRequest(store.transaction)
    const { expect } = change
    if (expect === undefined) write()
    else {
      const held = store.get(expect.key)
      held.onsuccess = () => {
        const value = (held.result as Record<string, unknown> | undefined)?.[expect.field]
        if (value === expect.value) write()
        else giveUp(new StoreConflict(`${expect.key}.${expect.field} is ${String(value)}`))
      }
    }
    return done.catch((error: unknown) => {
      throw cause ?? error
    })
  })
}

/** Gives every failure of the browser one of our three names. */
async function named<T>(work: Promise<T>): Promise<T> {
  try {
    return await work
  } catch (error) {
    if (error instanceof StoreConflict) throw error
    const name = error instanceof Error || error instanceof DOMException ? error.name : ''
    const message = error instanceof Error ? error.message : String(error)
    // Firefox reports a full disk as an UnknownError or a bare AbortError with the reason in its text only; those stay StoreFailed, as unsaved as full.
    if (name === 'QuotaExceededError') throw new StoreFull(message, { cause: error })
    throw new StoreFailed(`${name}: ${message}`, { cause: error })
  }
}

async function room(): Promise<StoreRoom> {
  if (typeof navigator === 'undefined' || navigator.storage === undefined) return { leftBytes: null, persisted: null }
  const [estimate, persisted] = await Promise.all([navigator.storage.estimate(), navigator.storage.persisted()])
  const leftBytes = estimate.quota === undefined || estimate.usage === undefined ? null : Math.max(0, estimate.quota - estimate.usage)
  return { leftBytes, persisted }
}

function webLocks(name: string): Pick<DeviceStore, 'lock' | 'tryLock'> & { readonly reachTabs: boolean } {
  const manager = typeof navigator === 'undefined' ? undefined : navigator.locks
  if (manager === undefined) return { ...lockQueue(), reachTabs: false }
  return {
    reachTabs: true,
    lock: <T>(lock: string, work: () => Promise<T>) => manager.request(`${name}/${lock}`, work) as Promise<T>,
    tryLock: <T>(lock: string, work: () => Promise<T>) =>
      manager.request(`${name}/${lock}`, { ifAvailable: true }, (held) =>
        held === null ? Promise.resolve(null) : work(),
      ) as Promise<T | null>,
  }
}
