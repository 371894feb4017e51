import type { BookCheck } from '@/lib/checklist/book'
import { readDeclaredKey } from '@/lib/checklist/declarable'
import type { DeclarationParts, Figures } from '@/lib/contracts/declaration'

export interface ChangedParts {
  /** Names of facts that are said otherwise. */
  readonly facts: readonly string[]
  /** Keys of answers that are said otherwise. */
  readonly answers: readonly string[]
}

/** What one declaration says otherwise than another. What was not said before is new, not changed. */
export function changedParts(
  before: Pick<DeclarationParts, 'facts' | 'answers'>,
  now: Pick<DeclarationParts, 'facts' | 'answers'>,
): ChangedParts {
  return {
    facts: Object.keys(before.facts).filter((name) => isSaid(before.facts[name]) && now.facts[name] !== before.facts[name]),
    answers: Object.keys(before.answers).filter((key) => differs(before.answers[key] ?? {}, now.answers[key] ?? {})),
  }
}

/** The checks that the bay sees again because of what changed: those themselves and whatever a change there disturbs. */
export function reopenedBy(changed: ChangedParts, checks: readonly BookCheck[]): readonly BookCheck[] {
  const touched = new Set(changed.answers.map((key) => readDeclaredKey(key).check))
  const wanted = new Set([...touched, ...checks.filter(({ id }) => touched.has(id)).flatMap(({ reopens }) => reopens)])
  return checks.filter(({ id }) => wanted.has(id))
}

function differs(before: Figures, now: Figures): boolean {
  return Object.keys(before).some((field) => isSaid(before[field]) && now[field] !== before[field])
}

function isSaid(value: unknown): boolean {
  return value !== undefined && value !== null && value !== ''
}
