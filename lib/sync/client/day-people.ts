import type { DaySnapshot } from '@/lib/contracts/day-snapshot'
import type { DayDisk } from './day-disk'

/** Stands for a name that has not come or was erased. */
const NAMELESS = 'somebody whose name has not come'

/**
 * The snapshot with the people this device's records have brought since: seated at the desk, named by a note. The same object until one of them, their name
 * or the snapshot changes.
 */
export function dayPeople({ memory, notes }: Pick<DayDisk, 'memory' | 'notes'>): () => DaySnapshot | null {
  let made: { readonly from: DaySnapshot; readonly tag: string; readonly snapshot: DaySnapshot } | null = null
  let newcomers = memory.newcomers()
  return () => {
    const from = memory.snapshot()
    if (from === null || memory.newcomers().length === 0) return from
    const tag = `${notes.size}`
    if (made?.from === from && made.tag === tag && newcomers === memory.newcomers()) return made.snapshot
    newcomers = memory.newcomers()
    const known = new Set(from.people.map(({ id }) => id))
    const added = new Map(
      newcomers.flatMap(({ change, notes: named }) => {
        if (change.what !== 'people' || change.seated === undefined || known.has(change.seated.person)) return []
        const { person, minor } = change.seated
        // Whoever was never asked counts as under age: a consent asked too often harms nobody.
        return [[person, { id: person, name: notes.get(named?.[0] ?? '')?.text ?? NAMELESS, minor: minor ?? true }] as const]
      }),
    )
    made = { from, tag, snapshot: added.size === 0 ? from : { ...from, people: [...from.people, ...added.values()] } }
    return made.snapshot
  }
}
