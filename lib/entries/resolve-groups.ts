import { foldWord, type EntryRow } from './entry-row'
import type { Asking } from './list-question'

/** A group of so many rows is taken for one at an event that has none yet; fewer may be a slip of the pen. */
const ROWS_OF_A_GROUP = 3
const NEW = 'new'

/**
 * The run group each written one is, by how it is written (folded): its name, or null while that is asked. Another writing of a group's own name is that group;
 * a word that is none (*INTER*, *adv.*, *Beginners*) is put to the organiser.
 */
export function resolveGroups(rows: readonly EntryRow[], known: readonly string[], asking: Asking): ReadonlyMap<string, string | null> {
  const written = new Map<string, { readonly name: string; readonly rows: EntryRow[] }>()
  for (const row of rows) {
    if (row.group === '' || row.role === 'spare') continue
    const own = written.get(foldWord(row.group))
    if (own) own.rows.push(row)
    else written.set(foldWord(row.group), { name: row.group, rows: [row] })
  }
  const groups =
    known.length > 0 ? known : [...written.values()].filter((one) => one.rows.length >= ROWS_OF_A_GROUP).map(({ name }) => name)
  const taken = groups.length > 0 ? groups : [...written.values()].map(({ name }) => name)
  const byFold = new Map(taken.map((name) => [foldWord(name), name]))
  const resolved = new Map<string, string | null>()
  for (const [fold, { name, rows: own }] of written) {
    const group = byFold.get(fold)
    resolved.set(fold, group ?? askGroup(name, own, taken, asking))
  }
  return resolved
}

function askGroup(name: string, rows: readonly EntryRow[], groups: readonly string[], asking: Asking): string | null {
  const answer = asking.ask(
    {
      id: `group:${foldWord(name)}`,
      asks: `“${name}” is no run group of this event. Which one is meant? ${rows.length === 1 ? 'One row says it' : `${rows.length} rows say it`}.`,
      rows: rows.slice(0, 5).map(({ row, number, plate, name: who, model }) => ({ row, number, plate, name: who, model })),
      options: [
        ...groups.map((group) => ({ value: `is:${group}`, words: `It is ${group}`, asks: null })),
        { value: NEW, words: `Make a new run group “${name}”`, asks: null },
      ],
      likely: likelyGroup(name, groups),
    },
    ({ value }) => (value === NEW ? `A run group “${name}” is made, without a first session yet.` : `They run with ${value.slice(3)}.`),
  )
  if (answer === null) return null
  return answer.value === NEW ? name : answer.value.slice(3)
}

/** The one group that begins as the word does, its full stop left away. */
function likelyGroup(name: string, groups: readonly string[]): string | null {
  const begin = foldWord(name).replace(/\W+$/, '')
  const fitting = groups.filter((group) => begin.length > 1 && foldWord(group).startsWith(begin))
  return fitting.length === 1 ? `is:${fitting[0] ?? ''}` : null
}
