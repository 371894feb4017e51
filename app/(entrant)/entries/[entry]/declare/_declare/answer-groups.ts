import type { DeclaredItem } from '@/lib/entrants/declared-items'

/** The same question at one or more places, or for one person. */
export interface AnswerGroup {
  readonly id: string
  readonly station: string
  readonly items: readonly [DeclaredItem, ...DeclaredItem[]]
}

/** Items in their order, those of one check at several corners together: what to look at is said once. */
export function answerGroups(items: readonly DeclaredItem[]): readonly AnswerGroup[] {
  const groups = new Map<string, { id: string; station: string; items: [DeclaredItem, ...DeclaredItem[]] }>()
  for (const item of items) {
    const { check, person } = item
    const id = `${check.id.endsWith(`.${check.place}`) ? check.id.slice(0, -check.place.length - 1) : check.id}@${person ?? ''}`
    const known = groups.get(id)
    if (known) known.items.push(item)
    else groups.set(id, { id, station: check.station, items: [item] })
  }
  return [...groups.values()]
}
