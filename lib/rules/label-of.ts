import type { Fact } from './judgement'

/** What people call the entry of that id in a table; the id itself where a record of another version names one this build lacks. */
export function labelOf(table: Readonly<Record<string, { readonly label: string }>>, id: Fact | undefined): string {
  if (typeof id !== 'string') return '?'
  return Object.hasOwn(table, id) ? (table[id]?.label ?? id) : id
}
