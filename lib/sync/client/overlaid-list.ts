import { subjectKey, type SubjectKey } from '@/lib/inspection/subject'
import { listEntry } from '@/lib/pass/build-pass-list'
import type { ListedEntry, PassList } from '@/lib/pass/pass-list'
import { isReflected, overlayEntry } from '../core/overlay-list'
import type { DayEntry } from './day-client'
import type { DayDisk } from './day-disk'
import type { DayParts } from './day-parts'

/** The server's list with what this device's own log knows besides; made again only when something changed. */
export function overlaidList(
  disk: DayDisk,
  { cars, snapshot: read }: Pick<DayParts, 'cars' | 'snapshot'>,
  day: () => string,
  version: () => number,
): () => PassList | null {
  let made: { readonly tag: string; readonly from: PassList; readonly list: PassList } | null = null
  const lines = new Map<string, { readonly tag: string; readonly from: ListedEntry; readonly line: ListedEntry }>()

  return () => {
    const from = disk.list()
    if (from === null) return null
    const tag = `${version()} ${day()}`
    if (made?.from === from && made.tag === tag) return made.list
    const entries = from.entries.map((listed) => {
      const car = cars.one(listed.entry)
      return car === null ? listed : lineOf(listed, car, from)
    })
    const same = entries.every((entry, index) => entry === from.entries[index])
    made = { tag, from, list: same ? from : { ...from, entries } }
    return made.list
  }

  function lineOf(listed: ListedEntry, car: DayEntry, from: PassList): ListedEntry {
    const keys = keysOf(car)
    const tag = `${keys.map(disk.memory.versionOf).join(' ')} ${day()}`
    const known = lines.get(listed.entry)
    if (known?.tag === tag && known.from === listed) return known.line
    const line = day() === from.day && isReflected(disk.memory.seqs(keys), from.seq) ? listed : overlayEntry(listed, ownLine(car, keys))
    lines.set(listed.entry, { tag, from: listed, line })
    return line
  }

  function ownLine(car: DayEntry, keys: readonly SubjectKey[]): ListedEntry {
    const snapshot = read()
    const names = new Map(snapshot?.people.map(({ id, name }) => [id, name]) ?? [])
    const states = new Map(keys.map((key) => [key, disk.memory.state(key, day())]))
    const book = snapshot === null ? null : disk.memory.book(snapshot.event.checklistHash, snapshot.event.limitsHash)
    return listEntry(car, { states, names, book, day: day() })
  }
}

/** The subjects whose records say something of an entry: its car, its people, and each of them in it. */
function keysOf(car: DayEntry): readonly SubjectKey[] {
  return [subjectKey({ car: car.id }), ...car.people.flatMap(({ person }) => [subjectKey({ person }), subjectKey({ fit: car.id, person })])]
}
