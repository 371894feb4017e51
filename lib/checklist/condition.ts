import * as z from 'zod/mini'
import type { CarFacts } from './car-facts'

/**
 * When a check applies: a small closed tree over the pinned facts, never an expression string.
 * A fact that is not known makes the condition *unknown*, and an unknown condition applies: missing never lets a check fall away.
 */
export type Condition =
  | { readonly fact: string; readonly is: string | number | boolean }
  | { readonly fact: string; readonly in: readonly (string | number)[] }
  | { readonly fact: string; readonly atLeast: number }
  | { readonly all: readonly Condition[] }
  | { readonly any: readonly Condition[] }
  | { readonly not: Condition }

const factName = z.string().check(z.regex(/^[a-zA-Z][a-zA-Z0-9]*$/))
const scalar = z.union([z.string(), z.number(), z.boolean()])

export const conditionSchema: z.ZodMiniType<Condition> = z.lazy(() =>
  z.union([
    z.strictObject({ fact: factName, is: scalar }),
    z.strictObject({ fact: factName, in: z.array(z.union([z.string(), z.number()])).check(z.minLength(1)) }),
    z.strictObject({ fact: factName, atLeast: z.number() }),
    z.strictObject({ all: z.array(conditionSchema).check(z.minLength(1)) }),
    z.strictObject({ any: z.array(conditionSchema).check(z.minLength(1)) }),
    z.strictObject({ not: conditionSchema }),
  ]),
)

/** Whether the condition holds for these facts: true, false, or 'unknown' where a fact it reads is missing. */
export function evaluateCondition(condition: Condition, facts: CarFacts): boolean | 'unknown' {
  if ('all' in condition) return conjunction(condition.all.map((part) => evaluateCondition(part, facts)))
  if ('any' in condition) return disjunction(condition.any.map((part) => evaluateCondition(part, facts)))
  if ('not' in condition) {
    const inner = evaluateCondition(condition.not, facts)
    return inner === 'unknown' ? 'unknown' : !inner
  }
  const value = facts[condition.fact]
  if (value === undefined || value === null) return 'unknown'
  if ('is' in condition) return value === condition.is
  if ('in' in condition) return condition.in.includes(value as string | number)
  return typeof value === 'number' && value >= condition.atLeast
}

function conjunction(parts: readonly (boolean | 'unknown')[]): boolean | 'unknown' {
  if (parts.includes(false)) return false
  return parts.includes('unknown') ? 'unknown' : true
}

function disjunction(parts: readonly (boolean | 'unknown')[]): boolean | 'unknown' {
  if (parts.includes(true)) return true
  return parts.includes('unknown') ? 'unknown' : false
}
