import type * as z from 'zod/mini'
import type { CivilDate } from './civil-date'
import { impossible } from './gap'
import { undecided, type Fact, type Judgement } from './judgement'
import { findRule } from './registry'
import type { Rule } from './rule'

/**
 * Judges raw inputs by the rule of that name, on `on` (the event's last day).
 *
 * Never throws for any inputs: what is absent or null is *missing*, a value that cannot be true or is of the wrong kind is
 * `<rule>.impossible-value` with the field and its range, a rule this build does not know is `<rule>.unknown-rule`; all three undecided.
 * Throws when the params do not fit the rule: limits are checked when a checklist is opened, so that is a fault of ours, not of the day.
 */
export function judge(ruleName: string, rawInputs: unknown, rawParams: unknown, on: CivilDate): Judgement {
  const found = findRule(ruleName)
  if (found === null) return undecided(`${ruleName}.unknown-rule`)
  const params = parsedParams(found, rawParams)
  const inputs = found.inputs.safeParse(withoutNulls(rawInputs))
  if (!inputs.success) return impossibleValue(ruleName, inputs.error.issues, rawInputs)
  return found.evaluate(inputs.data, params, on)
}

function parsedParams(found: Rule, rawParams: unknown): unknown {
  const params = found.params.safeParse(rawParams)
  if (params.success) return params.data
  const problems = params.error.issues.map((issue) => `${issue.path.join('.')} ${issue.message}`).join('; ')
  throw new Error(`the limits do not fit the rule ${found.name}: ${problems}`)
}

/** A pinned fact that is not known is null, and null is missing. */
function withoutNulls(raw: unknown): unknown {
  if (typeof raw !== 'object' || raw === null || Array.isArray(raw)) return raw
  return Object.fromEntries(Object.entries(raw).filter(([, value]) => value !== null))
}

function impossibleValue(ruleName: string, issues: readonly z.core.$ZodIssue[], raw: unknown): Judgement {
  const issue = issues[0]
  const field = issue?.path[0]
  const name = typeof field === 'string' ? field : ''
  const given = name === '' ? raw : valueOf(raw, name)
  return impossible(ruleName, name, asFact(given), name === '' ? 'a set of named values' : (issue?.message ?? ''))
}

function valueOf(raw: unknown, name: string): unknown {
  return typeof raw === 'object' && raw !== null ? Object.getOwnPropertyDescriptor(raw, name)?.value : undefined
}

/** The value as it may stand in a record: short, and a scalar. */
function asFact(value: unknown): Fact {
  if (typeof value === 'string') return value.slice(0, 60)
  if (typeof value === 'boolean') return value
  return typeof value === 'number' && Number.isFinite(value) ? value : null
}
