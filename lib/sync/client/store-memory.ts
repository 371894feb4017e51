import { StoreConflict, StoreFailed, StoreFull, type DeviceStore, type StoreChange } from './device-store'
import { lockQueue, type LockQueue } from './lock-queue'

/** A disk in memory that several stores (tabs) share and that survives them, for tests and simulation. */
export interface MemoryDisk {
  readonly name: string
  readonly values: Map<string, unknown>
  readonly locks: LockQueue
  readonly tabs: Set<(from: DeviceStore, keys: readonly string[]) => void>
  /** What the next commits meet, first first: nothing of them is kept. */
  readonly faults: ('full' | 'failed' | 'killed')[]
  leftBytes: number | null
  readonly beside: Map<string, MemoryDisk>
}

export function memoryDisk(name = 'disk'): MemoryDisk {
  return { name, values: new Map(), locks: lockQueue(), tabs: new Set(), faults: [], leftBytes: 1_000_000_000, beside: new Map() }
}

/** A store on such a disk: one tab of one device. */
export function memoryDeviceStore(disk: MemoryDisk): DeviceStore {
  const listeners = new Set<(keys: readonly string[]) => void>()
  let closed = false
  const store: DeviceStore = {
    name: disk.name,
    locksReachTabs: true,
    read: async (key) => structuredClone(disk.values.get(key)),
    list: async (prefix) =>
      [...disk.values]
        .filter(([key]) => key.startsWith(prefix))
        .sort(([a], [b]) => (a < b ? -1 : 1))
        .map(([key, value]) => [key, structuredClone(value)] as const),
    commit: async (change) => {
      if (closed) throw new StoreFailed('the store is closed')
      commitTo(disk, change)
      const keys = [...change.put.map(([key]) => key), ...(change.remove ?? [])]
      for (const tab of disk.tabs) tab(store, keys)
    },
    lock: disk.locks.lock,
    tryLock: disk.locks.tryLock,
    onOtherTab: (listener) => {
      listeners.add(listener)
      return () => listeners.delete(listener)
    },
    beside: async (name) => {
      const other = disk.beside.get(name) ?? memoryDisk(`${disk.name}-${name}`)
      disk.beside.set(name, other)
      return memoryDeviceStore(other)
    },
    room: async () => ({ leftBytes: disk.leftBytes, persisted: true }),
    persist: async () => true,
    close: () => {
      closed = true
      disk.tabs.delete(hear)
    },
  }
  function hear(from: DeviceStore, keys: readonly string[]): void {
    if (from !== store) for (const listener of listeners) listener(keys)
  }
  disk.tabs.add(hear)
  return store
}

function commitTo(disk: MemoryDisk, change: StoreChange): void {
  const fault = disk.faults.shift()
  if (fault === 'full') throw new StoreFull('no room')
  if (fault !== undefined) throw new StoreFailed(fault)
  const { expect } = change
  if (expect !== undefined) {
    const held = disk.values.get(expect.key) as Record<string, unknown> | undefined
    if (held?.[expect.field] !== expect.value) throw new StoreConflict(`${expect.key}.${expect.field} is ${String(held?.[expect.field])}`)
  }
  const copies = change.put.map(([key, value]) => [key, structuredClone(value)] as const)
  for (const [key, value] of copies) disk.values.set(key, value)
  for (const key of change.remove ?? []) disk.values.delete(key)
}
