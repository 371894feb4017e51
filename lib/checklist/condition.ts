import * as z from 'zod/mini'
import type { CarFacts } from './car-facts'

/** `among`: the values the checklist declares for the fact. Never written in a file: `openBook` fills it in. */
interface Leaf {
  readonly fact: string
  readonly among?: readonly (string | number | boolean)[]
}

/**
 * When a check applies: a small closed tree over the pinned facts, never an expression string.
 * A fact that is not known makes the condition *unknown*, and an unknown condition applies: missing never lets a check fall away.
 *
 * | part | all of them | any of them | not |
 * | --- | --- | --- | --- |
 * | one is false | false | by the others | true |
 * | one is true | by the others | true | false |
 * | else one is unknown | unknown | unknown | unknown |
 */
export type Condition =
  | (Leaf & { readonly is: string | number | boolean })
  | (Leaf & { readonly in: readonly (string | number)[] })
  | (Leaf & { readonly atLeast: number })
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

/** Whether the condition holds for these facts: true, false, or 'unknown' where a fact it reads is missing or has a value the checklist does not know. */
export function evaluateCondition(condition: Condition, facts: CarFacts): boolean | 'unknown' {
  if ('all' in condition) return conjunction(condition.all.map((part) => evaluateCondition(part, facts)))
  if ('any' in condition) return disjunction(condition.any.map((part) => evaluateCondition(part, facts)))
  if ('not' in condition) {
    const inner = evaluateCondition(condition.not, facts)
    return inner === 'unknown' ? 'unknown' : !inner
  }
  const value = facts[condition.fact]
  if (value === undefined || value === null) return 'unknown'
  // A value nobody declared (another version's, a typing slip) says nothing: it must not make every check that reads it fall away.
  if (condition.among !== undefined && !condition.among.includes(value)) return 'unknown'
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
