import { outcomeOf, type CheckLine } from './check-line'
import { replacedBy } from './edges'
import type { CheckHeads } from './heads'
import type { Presented } from './presented'

/** An ok or advisory by which something was mended: what it disturbed must be seen again (rule F10). */
export interface Repair {
  readonly hash: string
  /** Checks to be seen again: those that apply to this subject. */
  readonly reopens: readonly string[]
}

/** Collects every repair ever made: it replaced a fail, or something was put right on the spot. */
export function readRepairs(checks: Iterable<CheckHeads>, presented: Presented): readonly Repair[] {
  const repairs: Repair[] = []
  for (const heads of checks) {
    for (const line of heads.group.lines) {
      if (isRepair(line, heads)) repairs.push({ hash: line.hash, reopens: reopenedBy(heads.group.check, presented) })
    }
  }
  return repairs
}

/**
 * Whether the line is a repair. Whoever mended something disturbed the car, with the right to say ok or without: quarantine takes the ok and
 * leaves the disturbance. A ruling that turns a fail into ok counts too, since the words "replaces a fail" leave it no way out.
 */
export function isRepair(line: CheckLine, { group, edges }: CheckHeads): boolean {
  const outcome = outcomeOf(line)
  if (line.record.kind === 'dispensation' || (outcome !== 'ok' && outcome !== 'advisory')) return false
  if (line.record.kind === 'finding' && line.record.found !== undefined) return true
  const targets = line.record.kind === 'finding' && !line.isFull ? replacedBy(line, group, () => true) : (edges.get(line) ?? [])
  return targets.some((target) => outcomeOf(target) === 'fail')
}

/** A check's own repair is its own look: it does not reopen itself. */
function reopenedBy(check: string, { definitions, applicable }: Presented): readonly string[] {
  const reopens = (definitions.get(check) ?? []).flatMap((definition) => definition.reopens)
  return [...new Set(reopens)].filter((id) => id !== check && applicable.has(id))
}
