import { isLook, outcomeOf, type CheckLine } from './check-line'
import type { CheckHeads } from './heads'
import type { Defect } from './state'

/** Every defect ever recorded, oldest first: fails, and what was put right on the spot. Nothing that ends one takes it off this list. */
export function defectHistory(checks: readonly CheckHeads[]): readonly Defect[] {
  return checks
    .flatMap((heads) => heads.group.lines.flatMap((line) => defectIn(line, heads) ?? []))
    .sort((a, b) => a.at - b.at || (a.defect.hash < b.defect.hash ? -1 : 1))
    .map(({ defect }) => defect)
}

function defectIn(line: CheckLine, heads: CheckHeads): { readonly at: number; readonly defect: Defect } | null {
  if (line.record.kind !== 'finding') return null
  const { outcome, found, at } = line.record
  if (outcome !== 'fail' && found === undefined) return null
  const putRight = outcome === 'fail' ? isPutRight(line, heads) : true
  return { at, defect: { hash: line.hash, check: heads.group.check, putRight, undone: isUndone(line, heads) } }
}

function isPutRight(fail: CheckLine, { edges, takenBack }: CheckHeads): boolean {
  return [...edges].some(([line, targets]) => isLook(line) && outcomeOf(line) !== 'fail' && !takenBack.has(line) && targets.includes(fail))
}

function isUndone(fail: CheckLine, { edges }: CheckHeads): boolean {
  return [...edges].some(([line, targets]) => outcomeOf(line) === 'unseen' && targets.includes(fail))
}
