import { findRule } from '@/lib/rules/registry'
import type { Rule } from '@/lib/rules/rule'
import type { CheckDefinition, MeasureField } from './checklist'
import type { Draft } from './draft'
import type { Problem } from './problem'
import { pathOf, schemaProblems } from './problem'

/**
 * Checks whose rule is not there, whose limits the rule does not take, or that feed it what it cannot read: an unknown input, a measure or fact
 * that is not there, and every value that could be entered but the rule would refuse. What cannot be read is *undecided* for a whole day.
 */
export function ruleProblems(draft: Draft): Problem[] {
  return draft.checks.flatMap(({ value: check, index }) => (check?.rule === undefined ? [] : problemsOf(check, check.rule, index, draft)))
}

type CheckRule = NonNullable<CheckDefinition['rule']>

function problemsOf(check: CheckDefinition, used: CheckRule, index: number, draft: Draft): Problem[] {
  const path = pathOf('checks', index, 'rule')
  const rule = findRule(used.name)
  if (rule === null) return [{ path: `${path}.name`, problem: `there is no rule ${used.name}` }]

  const params = rule.params.safeParse(used.params ?? {})
  const ofParams = params.success
    ? []
    : schemaProblems(params.error.issues).map((each) => ({
        ...each,
        path: each.path === '' ? `${path}.params` : `${path}.params.${each.path}`,
      }))
  const ofInputs = Object.entries(used.inputs).flatMap(([name, from]) =>
    inputProblems(rule, name, from, `${path}.inputs.${name}`, check, draft),
  )
  return [...ofParams, ...ofInputs]
}

function inputProblems(
  rule: Rule,
  name: string,
  from: CheckRule['inputs'][string],
  path: string,
  check: CheckDefinition,
  draft: Draft,
): Problem[] {
  if (!inputNames(rule).includes(name)) return [{ path, problem: `the rule ${rule.name} has no input ${name}` }]
  if ('value' in from) return refused(rule, name, [from.value], path)
  if ('measure' in from) {
    const field = check.measure?.find((each) => each.id === from.measure)
    return field === undefined ? [{ path, problem: `the check measures no ${from.measure}` }] : refused(rule, name, extremes(field), path)
  }
  const declared = draft.facts.find((each) => each.id === from.fact)
  if (declared === undefined) return [{ path, problem: `there is no fact ${from.fact}` }]
  const fact = declared.value
  if (fact === null) return []
  if (fact.subject !== check.subject)
    return [{ path, problem: `the fact ${fact.name} is about a ${fact.subject}, the check about a ${check.subject}` }]
  return refused(
    rule,
    name,
    fact.values.map((each) => each.value),
    path,
  )
}

/** Names of a rule's inputs; empty where its schema is no object, so that every wired input is reported. */
function inputNames(rule: Rule): readonly string[] {
  const shape: unknown = 'shape' in rule.inputs ? rule.inputs.shape : null
  return typeof shape === 'object' && shape !== null ? Object.keys(shape) : []
}

/** Values at the ends of what can be entered. */
function extremes(field: MeasureField): readonly (string | number)[] {
  if (field.kind === 'number') return [field.min, field.max]
  if (field.kind === 'choice') return field.options.map((option) => option.id)
  return ['x'.repeat(field.maxLength)]
}

function refused(rule: Rule, name: string, values: readonly (string | number | boolean)[], path: string): Problem[] {
  const unread = values.filter((value) => !rule.inputs.safeParse({ [name]: value }).success)
  if (unread.length === 0) return []
  return [{ path, problem: `the rule ${rule.name} cannot read ${unread.map((value) => JSON.stringify(value)).join(', ')} as its ${name}` }]
}
