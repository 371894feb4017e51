import type { Checklist } from './checklist'
import { checklistSchema } from './checklist'
import { conditionProblems } from './condition-problems'
import { readDraft } from './draft'
import type { Problem } from './problem'
import { schemaProblems } from './problem'
import { referenceProblems } from './reference-problems'
import { ruleProblems } from './rule-problems'

export type ParsedChecklist =
  { readonly ok: true; readonly checklist: Checklist } | { readonly ok: false; readonly problems: readonly Problem[] }

/**
 * Reads a checklist: its shape, and whatever a shape cannot say (references, subjects, conditions, rules). All problems at once, each with its
 * path, also when some entries have the wrong shape: whoever writes a checklist mends it in one round. Never throws.
 */
export function parseChecklist(json: unknown): ParsedChecklist {
  const parsed = checklistSchema.safeParse(json)
  const draft = readDraft(json)
  const problems = [
    ...(parsed.success ? [] : schemaProblems(parsed.error.issues)),
    ...referenceProblems(draft),
    ...conditionProblems(draft),
    ...ruleProblems(draft),
  ]
  return parsed.success && problems.length === 0 ? { ok: true, checklist: parsed.data } : { ok: false, problems }
}
