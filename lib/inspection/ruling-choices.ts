import { groupByCheck } from './check-group'
import { isStop, severity } from './check-line'
import { basisFor } from './compose'
import { disagreementAmong } from './disagreement'
import type { LogEntry } from './log-entry'
import type { RecordOf } from './record'
import { readLog } from './read-log'
import type { SubjectState } from './state'

export type RulingOutcome = RecordOf<'ruling'>['outcome']

const MILDEST_FIRST: readonly RulingOutcome[] = ['ok', 'advisory', 'could-not-see', 'fail']

/**
 * The outcomes a chief's ruling on this check may say, mildest first: never milder than the mildest who disagrees, and only fail where a fail was worked out
 * from values (rule F4). Empty where nobody really disagrees: then only a new look ends what stands. `entries` are the subject's records.
 */
export function rulingChoices(entries: readonly LogEntry[], state: SubjectState, check: string): readonly RulingOutcome[] {
  const group = groupByCheck(readLog(entries, state.key)).get(check)
  if (group === undefined) return []
  const named = basisFor(state, check).flatMap((hash) => group.byHash.get(hash) ?? [])
  const disagreement = disagreementAmong(
    named.filter((line) => line.isFull || isStop(line)),
    group,
  )
  if (disagreement === null) return []
  return MILDEST_FIRST.filter(
    (outcome) => severity(outcome) >= disagreement.mildest && (!disagreement.hasComputedFail || outcome === 'fail'),
  )
}
