import type { Facts } from './judgement'
import { findRule } from './registry'

/**
 * One plain sentence for a judgement kept as code and facts, by the rule its code begins with. Total: a code of another version is named as it
 * stands, never turned into words that claim more than is known.
 */
export function explainJudgement(code: string, facts: Facts): string {
  const found = findRule(code.split('.', 1)[0] ?? '')
  if (found === null || code.endsWith('.unknown-rule')) return `Not judged here: this version does not know ${code}.`
  return found.explain({ code, facts })
}
