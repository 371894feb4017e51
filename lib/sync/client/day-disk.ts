import type { DaySnapshot } from '@/lib/contracts/day-snapshot'
import type { PassList } from '@/lib/pass/pass-list'
import type { StoredRecord } from '../core/held-record'
import { dayMemory, type DayMemory } from './day-memory'
import type { DeviceStore } from './device-store'
import { KEYS, NO_COUNTERS, NO_PULL, type MakeCounters, type PullState } from './enrolment'
import type { Made, StoredNote } from './make-records'
import type { Taken } from './sync-engine'

/** What lies on the device's disk, mirrored in memory; kept true by this tab's own commits and by what other tabs tell. */
export interface DayDisk {
  readonly memory: DayMemory
  readonly notes: ReadonlyMap<string, StoredNote>
  readonly pull: () => PullState
  readonly list: () => PassList | null
  readonly read: () => Promise<void>
  /** Mirrors what the engine has just committed. */
  readonly took: (taken: Taken) => void
  /** Mirrors what `record` has just committed. */
  readonly made: (made: Made) => void
  /** Reads the records again where another tab has made some of which this one has not heard. */
  readonly catchUp: () => Promise<void>
  /** Reads these keys again. */
  readonly reread: (keys: readonly string[]) => Promise<void>
}

export function dayDisk(store: DeviceStore): DayDisk {
  const memory = dayMemory()
  const notes = new Map<string, StoredNote>()
  let pull: PullState = NO_PULL
  let list: PassList | null = null
  let counters: MakeCounters = NO_COUNTERS

  async function readSingles(): Promise<void> {
    pull = ((await store.read(KEYS.pull)) as PullState | undefined) ?? NO_PULL
    list = ((await store.read(KEYS.list)) as PassList | undefined) ?? null
    memory.setSnapshot(((await store.read(KEYS.snapshot)) as DaySnapshot | undefined) ?? null)
  }

  async function readRecords(): Promise<void> {
    counters = ((await store.read(KEYS.make)) as MakeCounters | undefined) ?? NO_COUNTERS
    const [records, texts] = [await store.list('r:'), await store.list('n:')]
    memory.put(records.map(([, value]) => value as StoredRecord))
    for (const [, value] of texts) takeNote(value as StoredNote)
  }

  function takeNote(note: StoredNote): void {
    notes.set(note.hash, note)
  }

  async function reread(keys: readonly string[]): Promise<void> {
    for (const key of keys.filter((one) => one.startsWith('r:'))) {
      const value = (await store.read(key)) as StoredRecord | undefined
      if (value === undefined) memory.remove(key.slice(2))
      else memory.put([value])
    }
    for (const key of keys.filter((one) => one.startsWith('n:'))) takeNote((await store.read(key)) as StoredNote)
    if (keys.includes(KEYS.make)) counters = (await store.read(KEYS.make)) as MakeCounters
    if (keys.includes(KEYS.pull) || keys.includes(KEYS.snapshot) || keys.includes(KEYS.list)) {
      const version = memory.snapshot()?.version
      pull = ((await store.read(KEYS.pull)) as PullState | undefined) ?? NO_PULL
      list = ((await store.read(KEYS.list)) as PassList | undefined) ?? null
      const snapshot = (await store.read(KEYS.snapshot)) as DaySnapshot | undefined
      if (snapshot !== undefined && snapshot.version !== version) memory.setSnapshot(snapshot)
    }
  }

  return {
    memory,
    notes,
    pull: () => pull,
    list: () => list,
    read: async () => {
      await readSingles()
      await readRecords()
    },
    took: (taken) => {
      memory.put(taken.records)
      for (const note of taken.notes ?? []) takeNote(note)
      pull = taken.pull
      if (taken.page?.snapshot) memory.setSnapshot(taken.page.snapshot)
      if (taken.page?.list) list = taken.page.list as PassList
    },
    made: ({ stored, notes: texts, counters: next }) => {
      memory.put(stored)
      for (const note of texts) takeNote(note)
      counters = next
    },
    catchUp: async () => {
      const held = ((await store.read(KEYS.make)) as MakeCounters | undefined) ?? NO_COUNTERS
      if (held.deviceSeq !== counters.deviceSeq) await readRecords()
    },
    reread,
  }
}
