import type { CheckLine } from './check-line'
import type { SubjectLog } from './read-log'

/** All findings, rulings and dispensations on one check of one subject. */
export interface CheckGroup {
  readonly check: string
  readonly lines: readonly CheckLine[]
  readonly byHash: ReadonlyMap<string, CheckLine>
}

/** Sorts a subject's lines by check; edges are looked for within one group only (rule F1). */
export function groupByCheck(log: SubjectLog): ReadonlyMap<string, CheckGroup> {
  const groups = new Map<string, { check: string; lines: CheckLine[]; byHash: Map<string, CheckLine> }>()
  for (const line of [...log.of('finding'), ...log.of('ruling'), ...log.of('dispensation')] as readonly CheckLine[]) {
    const check = line.record.check
    const group = groups.get(check) ?? { check, lines: [], byHash: new Map<string, CheckLine>() }
    group.lines.push(line)
    group.byHash.set(line.hash, line)
    groups.set(check, group)
  }
  return groups
}
