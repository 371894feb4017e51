import type { CheckGroup } from './check-group'
import { isStop, outcomeOf, type CheckLine } from './check-line'
import { isExpired, replacedBy, type Days, type IsFull } from './edges'

/** The heads of one check and how each fail of it has ended. */
export interface CheckHeads {
  readonly group: CheckGroup
  readonly heads: readonly CheckLine[]
  /** What each line replaces by rule, with everybody believed who is so far; lines without an edge are left out. */
  readonly edges: ReadonlyMap<CheckLine, readonly CheckLine[]>
  /** Lines replaced, for good or for now. */
  readonly superseded: ReadonlySet<CheckLine>
  /** Lines taken back by whoever made them, believed or not: to take back a permission is to stop (rule T1). */
  readonly takenBack: ReadonlySet<CheckLine>
}

const NO_EDGES: CheckHeads['edges'] = new Map()
const NOBODY: ReadonlySet<CheckLine> = new Set()

/** Works out the heads of one check: the lines with effect that no other replaces (rules F1, F2, F4). */
export function headsOf(group: CheckGroup, days: Days): CheckHeads {
  // Most checks of a day have one line and so no edge: a fold of a whole event should not make three collections for each of them.
  if (group.lines.length === 1)
    return {
      group,
      heads: group.lines.filter((line) => hasEffect(line, NO_EDGES, days)),
      edges: NO_EDGES,
      superseded: NOBODY,
      takenBack: NOBODY,
    }
  const edges = edgesIn(group)
  const takenBack = takenBackIn(group)
  const superseded = new Set<CheckLine>()
  for (const [line, targets] of edges) {
    for (const target of targets) if (!isAcceptance(line, target) && !isVoid(line, target, takenBack)) superseded.add(target)
  }
  // Only now: a dispensation that was itself replaced, taken back or is over accepts its fail no longer.
  for (const [line, targets] of edges) {
    if (superseded.has(line) || isExpired(line, days)) continue
    for (const target of targets) if (isAcceptance(line, target) && !isVoid(line, target, takenBack)) superseded.add(target)
  }
  const heads = group.lines.filter((line) => !superseded.has(line) && hasEffect(line, edges, days))
  return { group, heads, edges, superseded, takenBack }
}

/**
 * The lines that end this fail (rule F4) when `isFull` says who is believed: empty means it stands. What was taken back or replaced since
 * is told by `heads`, which knows everything.
 */
export function endingsOf(fail: CheckLine, heads: CheckHeads, days: Days, isFull: IsFull): readonly CheckLine[] {
  const { group, superseded, takenBack } = heads
  return group.lines.filter((line) => {
    if (!endsIn(line, heads, isFull).includes(fail) || isVoid(line, fail, takenBack)) return false
    return line.record.kind !== 'dispensation' || (!superseded.has(line) && !isExpired(line, days))
  })
}

/** What a line replaces, by the edges already worked out where nobody's belief hangs on an adoption. */
function endsIn(line: CheckLine, { group, edges }: CheckHeads, isFull: IsFull): readonly CheckLine[] {
  const isSettled = group.lines.every((one) => one.adoptedBy.length === 0)
  return isSettled ? (edges.get(line) ?? []) : replacedBy(line, group, isFull)
}

function edgesIn(group: CheckGroup): ReadonlyMap<CheckLine, readonly CheckLine[]> {
  const edges = new Map<CheckLine, readonly CheckLine[]>()
  for (const line of group.lines) {
    const targets = replacedBy(line, group, (one) => one.isFull)
    if (targets.length > 0) edges.set(line, targets)
  }
  return edges
}

/** A line that can be a head: what stops always; what permits when believed, and only on the grounds it needs. */
function hasEffect(line: CheckLine, edges: CheckHeads['edges'], days: Days): boolean {
  const targets = edges.get(line) ?? []
  if (line.record.kind === 'dispensation') return !isExpired(line, days) && targets.some((target) => outcomeOf(target) === 'fail')
  if (isStop(line)) return true
  // A ruling that settles nothing is no look either, and so gives no ok.
  return line.isFull && (line.record.kind === 'finding' || targets.length > 0)
}

function takenBackIn(group: CheckGroup): ReadonlySet<CheckLine> {
  const taken = new Set<CheckLine>()
  for (const line of group.lines) {
    if (line.record.kind !== 'finding' || line.record.outcome !== 'unseen') continue
    for (const target of replacedBy(line, group, () => true)) taken.add(target)
  }
  return taken
}

/** What was taken back ends no fail any longer. */
function isVoid(line: CheckLine, target: CheckLine, takenBack: ReadonlySet<CheckLine>): boolean {
  return takenBack.has(line) && outcomeOf(target) === 'fail'
}

function isAcceptance(line: CheckLine, target: CheckLine): boolean {
  return line.record.kind === 'dispensation' && outcomeOf(target) === 'fail'
}
