import { isCarried, outcomeOf, severity, type CheckLine } from './check-line'
import type { CheckGroup } from './check-group'

/** Records a ruling names that really disagree: made without knowing each other, with different outcomes. */
export interface Disagreement {
  readonly members: ReadonlySet<string>
  /** Severity of the mildest of them: nobody said less, so no ruling may. */
  readonly mildest: number
  /** One of the fails was worked out from measured values; only a fail may stand then. */
  readonly hasComputedFail: boolean
}

/**
 * The disagreement that the named lines form, null where there is none. One who looked knowing the other's finding has answered it,
 * not disagreed with it: without this, a ruling on [old ok, new fail] would end a fail that nobody looked at again.
 */
export function disagreementAmong(named: readonly CheckLine[], group: CheckGroup): Disagreement | null {
  const voices = named.filter((line) => line.record.kind !== 'dispensation' && !isCarried(line))
  const members = new Set<string>()
  for (const one of voices) {
    for (const other of voices) {
      if (outcomeOf(one) === outcomeOf(other) || knows(one, other, group) || knows(other, one, group)) continue
      members.add(one.hash).add(other.hash)
    }
  }
  if (members.size === 0) return null
  return {
    members,
    mildest: Math.min(...voices.filter((line) => members.has(line.hash)).map((line) => severity(outcomeOf(line)))),
    hasComputedFail: voices.some(isComputedFail),
  }
}

function isComputedFail({ record }: CheckLine): boolean {
  return record.kind === 'finding' && record.outcome === 'fail' && record.judgement?.outcome === 'fail'
}

/** Whether `later` was made knowing `earlier`, by what it names and what those name. */
function knows(later: CheckLine, earlier: CheckLine, group: CheckGroup): boolean {
  const seen = new Set<string>()
  const queue = [...later.record.basis]
  for (let hash = queue.pop(); hash !== undefined; hash = queue.pop()) {
    if (hash === earlier.hash) return true
    if (seen.has(hash)) continue
    seen.add(hash)
    queue.push(...(group.byHash.get(hash)?.record.basis ?? []))
  }
  return false
}
