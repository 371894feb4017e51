import type { CheckGroup } from './check-group'
import { isCarried, isStop, outcomeOf, severity, type CheckLine } from './check-line'
import { disagreementAmong } from './disagreement'

const NONE: readonly CheckLine[] = []

/** Who is believed: the fold asks with everything adopted so far, a pass with the adoptions it knew. */
export type IsFull = (line: CheckLine) => boolean

/** The venue days that decide whether a dispensation still holds. */
export interface Days {
  readonly day: string
  readonly lastDay: string
}

/** Whether a dispensation's days are over. */
export function isExpired({ record }: CheckLine, { day, lastDay }: Days): boolean {
  return record.kind === 'dispensation' && (day > lastDay || (record.until !== null && day > record.until))
}

/**
 * The lines that `line` replaces, if it is believed (rules F1, F4, F11). Nothing here knows time of arrival or a clock.
 * A dispensation's edge to its fail is given even when expired or replaced: `supersededIn` decides whether it counts.
 */
export function replacedBy(line: CheckLine, group: CheckGroup, isFull: IsFull): readonly CheckLine[] {
  if (line.record.basis.length === 0 || !isFull(line)) return NONE
  const named = namedBy(line, group)
  if (named.length === 0) return NONE
  switch (line.record.kind) {
    case 'ruling':
      return replacedByRuling(line, named, group, isFull)
    case 'dispensation':
      return named.filter((target) => outcomeOf(target) === 'fail' || target.record.kind === 'dispensation')
    case 'finding':
      if (line.record.outcome === 'unseen') return named.every((target) => target.record.actor === line.record.actor) ? named : []
      return named.filter((target) => mayReplace(line, target))
  }
}

/** The lines of the same check that a line names in `basis`, believed or not (rule F1). */
export function namedBy(line: CheckLine, group: CheckGroup): readonly CheckLine[] {
  const named: CheckLine[] = []
  for (const hash of line.record.basis) {
    const target = group.byHash.get(hash)
    if (target && target !== line) named.push(target)
  }
  return named
}

/** Whether a finding may take the place of another line: one who could not see ends no fail, and a carried finding is no look. */
function mayReplace(line: CheckLine, target: CheckLine): boolean {
  const onFail = outcomeOf(target) === 'fail' || target.record.kind === 'dispensation'
  if (isCarried(line)) return !onFail && outcomeOf(target) !== 'could-not-see'
  return !onFail || outcomeOf(line) !== 'could-not-see'
}

function replacedByRuling(line: CheckLine, named: readonly CheckLine[], group: CheckGroup, isFull: IsFull): readonly CheckLine[] {
  const disagreement = disagreementAmong(
    named.filter((target) => isFull(target) || isStop(target)),
    group,
  )
  if (!disagreement) return []
  const outcome = outcomeOf(line)
  const mayEndFails = severity(outcome) >= disagreement.mildest && (!disagreement.hasComputedFail || outcome === 'fail')
  return named.filter((target) => outcomeOf(target) !== 'fail' || (mayEndFails && disagreement.members.has(target.hash)))
}
