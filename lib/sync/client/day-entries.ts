import type { DaySnapshot } from '@/lib/contracts/day-snapshot'
import { subjectKey, type Subject } from '@/lib/inspection/subject'
import { entryNow } from '../core/entry-now'
import { peopleNow } from '../core/people-now'
import type { DayEntry } from './day-client'
import type { DayMemory } from './day-memory'

export interface DayEntries {
  readonly all: () => readonly DayEntry[]
  readonly one: (entry: string) => DayEntry | null
  /** What a screen shows of a subject's car; empty where there is none (`shown` of a record). */
  readonly shown: (subject: Subject) => { readonly number: string; readonly plateTail: string }
}

/** The cars of the event as this device's records leave them; the same objects until one of them changes. */
export function dayEntries(memory: DayMemory, day: () => string): DayEntries {
  let made: {
    readonly snapshot: DaySnapshot
    readonly all: readonly DayEntry[]
    readonly byId: ReadonlyMap<string, DayEntry>
    readonly tags: string[]
  } | null = null
  const nothing: readonly DayEntry[] = []

  function now() {
    const snapshot = memory.snapshot()
    if (snapshot === null) return null
    const before = made?.snapshot === snapshot ? made : null
    const tags = snapshot.entries.map((entry) => `${memory.versionOf(subjectKey({ car: entry.id }))} ${day()}`)
    if (before !== null && tags.every((tag, index) => tag === before.tags[index])) return before
    const groups = new Map(snapshot.groups.map((group) => [group.id, group.name]))
    const all = snapshot.entries.map((entry, index) => {
      const known = before?.all[index]
      return known !== undefined && before?.tags[index] === tags[index] ? known : entryOf(entry, groups)
    })
    made = { snapshot, all, byId: new Map(all.map((entry) => [entry.id, entry])), tags }
    return made
  }

  function entryOf(entry: DaySnapshot['entries'][number], groups: ReadonlyMap<string, string>): DayEntry {
    const key = subjectKey({ car: entry.id })
    const records = memory.log(key).map(({ record, disposition }) => ({ record, quarantined: disposition.state === 'quarantined' }))
    const changed = entryNow(entry, records)
    const withdrawn = entry.withdrawn || memory.state(key, day()).withdrawn
    const people = peopleNow(entry.people, records)
    return {
      ...changed,
      people: [...people],
      withdrawn,
      groupName: groups.get(changed.group) ?? '',
      changedHere: changed !== entry || people !== entry.people || withdrawn !== entry.withdrawn,
    }
  }

  return {
    all: () => now()?.all ?? nothing,
    one: (entry) => now()?.byId.get(entry) ?? null,
    shown: (subject) => {
      const id = 'car' in subject ? subject.car : 'fit' in subject ? subject.fit : null
      const entry = id === null ? null : (now()?.byId.get(id) ?? null)
      return { number: entry?.number ?? '', plateTail: entry?.plateTail ?? '' }
    },
  }
}
