import type { JudgementOutcome } from '@/lib/rules/judgement'
import type { SubjectState } from './state'

/** What a new finding, ruling or dispensation on a check names in `basis`: every head of it that is held and, with a dispensation, the fail beneath it; nothing else (rule M5). */
export function basisFor(state: SubjectState, check: string): readonly string[] {
  const heads = state.checks.get(check)?.heads ?? []
  return unique(heads.flatMap((head) => [head.hash, ...head.beneath]))
}

/**
 * What an *unseen* names: this actor's own heads of the check only, since one that names another's finding undoes nothing (rules F4, T1).
 * Empty means there is nothing of theirs to undo.
 */
export function basisForUndo(state: SubjectState, check: string, actor: string): readonly string[] {
  const heads = state.checks.get(check)?.heads ?? []
  return heads.filter(({ record, outcome }) => record.actor === actor && outcome !== 'unseen').map(({ hash }) => hash)
}

/** What a new finding on a check carries in `answers`: every hold, due recall, wet switch and repair that names it or its station, ended or not (rule M5). */
export function answersFor(state: SubjectState, check: string): readonly string[] {
  return state.checks.get(check)?.toAnswer ?? []
}

/** What a new pass or band carries in `answers`: all that would otherwise kill it (rule F7). */
export function passAnswers(state: SubjectState): readonly string[] {
  return state.toAnswer
}

/** What a new pass or band names in `basis`: those it replaces, which die by it. */
export function passBasis(state: SubjectState): readonly string[] {
  return state.passes.filter((pass) => pass.state !== 'dead').map(({ hash }) => hash)
}

/** What a new `presented` names in `basis`: the heads it takes the place of (rule F12). */
export function presentedBasis(state: SubjectState): readonly string[] {
  return state.presentedHeads.map(({ hash }) => hash)
}

/** What a `returned` names in `basis`: the withdrawals in force. */
export function returnedBasis(state: SubjectState): readonly string[] {
  return state.withdrawnBy
}

/** The outcome a judgement proposes; null where it is undecided and the value must be taken first. The person decides, and may always be more severe. */
export function proposeOutcome(judgement: { readonly outcome: JudgementOutcome }): 'ok' | 'advisory' | 'fail' | null {
  return judgement.outcome === 'undecided' ? null : judgement.outcome
}

function unique(hashes: readonly string[]): readonly string[] {
  return [...new Set(hashes)]
}
