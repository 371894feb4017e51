import { harnessValidity } from './harness-validity'
import { helmetStandard } from './helmet-standard'
import { leakClass } from './leak-class'
import type { Rule } from './rule'
import { shoulderAngle } from './shoulder-angle'
import { tyreAge } from './tyre-age'
import { tyreTread } from './tyre-tread'

/**
 * Forgets a rule's own input types so that all rules fit one map. Sound because `judge` alone calls `evaluate` through the map, and only
 * with what the rule's own schemas have parsed.
 */
function erased(typed: unknown): Rule {
  return typed as Rule
}

const ALL: readonly Rule[] = [harnessValidity, shoulderAngle, helmetStandard, tyreAge, tyreTread, leakClass].map(erased)

/** Every rule by its name: a new rule is one file and one name in the line above. */
export const RULES: ReadonlyMap<string, Rule> = new Map(ALL.map((each) => [each.name, each]))

/** The rule of that name, or null when this build does not know it. */
export function findRule(name: string): Rule | null {
  return RULES.get(name) ?? null
}
