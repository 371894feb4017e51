import type { CheckLine } from './check-line'
import type { SubjectLog } from './read-log'

/** All findings, rulings and dispensations on one check of one subject. */
export interface CheckGroup {
  readonly check: string
  readonly lines: readonly CheckLine[]
  readonly byHash: ReadonlyMap<string, CheckLine>
}

/** Sorts a subject's lines by check; edges are looked for within one group only (rule F1). Lines stand in the order of their hashes. */
export function groupByCheck(log: SubjectLog): ReadonlyMap<string, CheckGroup> {
  const groups = new Map<string, { check: string; lines: CheckLine[]; byHash: Map<string, CheckLine> }>()
  for (const line of linesOf(log)) {
    const check = line.record.check
    let group = groups.get(check)
    if (!group) groups.set(check, (group = { check, lines: [], byHash: new Map() }))
    group.lines.push(line)
    group.byHash.set(line.hash, line)
  }
  return groups
}

function linesOf(log: SubjectLog): readonly CheckLine[] {
  const others: readonly CheckLine[] = [...log.of('ruling'), ...log.of('dispensation')]
  if (others.length === 0) return log.of('finding')
  return [...log.of('finding'), ...others].sort((a, b) => (a.hash < b.hash ? -1 : 1))
}
