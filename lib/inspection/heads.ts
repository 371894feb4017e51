import type { CheckGroup } from './check-group'
import { isStop, outcomeOf, type CheckLine } from './check-line'
import { isExpired, replacedBy, type Days, type IsFull } from './edges'

/** The heads of one check and how each fail of it has ended. */
export interface CheckHeads {
  readonly group: CheckGroup
  readonly heads: readonly CheckLine[]
  /** Lines replaced for good or for now. */
  readonly superseded: ReadonlySet<string>
  /** Lines taken back by whoever made them. */
  readonly undone: ReadonlySet<string>
}

/** Works out the heads of one check: the lines with effect that no other replaces (rules F1, F2, F4). */
export function headsOf(group: CheckGroup, days: Days): CheckHeads {
  const isFull: IsFull = (line) => line.isFull
  const undone = undoneIn(group, isFull)
  const superseded = new Set<string>()
  for (const line of group.lines) {
    for (const target of replacedBy(line, group, isFull))
      if (!restsOnDispensation(line, target) && !isVoidEdge(line, target, undone)) superseded.add(target.hash)
  }
  // Only now: a dispensation that was itself replaced, taken back or is over accepts its fail no longer.
  for (const line of dispensationsIn(group)) {
    if (superseded.has(line.hash) || isExpired(line, days)) continue
    for (const target of replacedBy(line, group, isFull)) if (restsOnDispensation(line, target)) superseded.add(target.hash)
  }
  const heads = group.lines.filter((line) => !superseded.has(line.hash) && hasEffect(line, group, days))
  return { group, heads, superseded, undone }
}

/**
 * The lines that end this fail (rule F4) when `isFull` says who is believed: empty means it stands. `heads` says what was taken back
 * or replaced in the meantime.
 */
export function endingsOf(fail: CheckLine, { group, superseded, undone }: CheckHeads, days: Days, isFull: IsFull): readonly CheckLine[] {
  return group.lines.filter((line) => {
    if (!replacedBy(line, group, isFull).includes(fail) || isVoidEdge(line, fail, undone)) return false
    return line.record.kind !== 'dispensation' || (!superseded.has(line.hash) && !isExpired(line, days))
  })
}

/** A line that can be a head: what stops always; what permits when believed, and only on the grounds it needs. */
function hasEffect(line: CheckLine, group: CheckGroup, days: Days): boolean {
  if (line.record.kind === 'dispensation') {
    return (
      line.isFull && !isExpired(line, days) && replacedBy(line, group, (one) => one.isFull).some((target) => outcomeOf(target) === 'fail')
    )
  }
  if (isStop(line)) return true
  // A ruling that settles nothing is no look either, and so gives no ok.
  return line.isFull && (line.record.kind === 'finding' || replacedBy(line, group, (one) => one.isFull).length > 0)
}

function undoneIn(group: CheckGroup, isFull: IsFull): ReadonlySet<string> {
  const undoing = group.lines.filter((line) => line.record.kind === 'finding' && line.record.outcome === 'unseen')
  return new Set(undoing.flatMap((line) => replacedBy(line, group, isFull).map((target) => target.hash)))
}

/** A look taken back ends no fail any longer. */
function isVoidEdge(line: CheckLine, target: CheckLine, undone: ReadonlySet<string>): boolean {
  return outcomeOf(target) === 'fail' && undone.has(line.hash)
}

function restsOnDispensation(line: CheckLine, target: CheckLine): boolean {
  return line.record.kind === 'dispensation' && outcomeOf(target) === 'fail'
}

function dispensationsIn(group: CheckGroup): readonly CheckLine[] {
  return group.lines.filter((line) => line.record.kind === 'dispensation')
}
