import type { FactDefinition, JudgedKind } from './checklist'
import type { Condition } from './condition'
import type { Draft } from './draft'
import type { Problem } from './problem'
import { pathOf } from './problem'

/** Conditions that read a fact nobody declares, one of another subject, or a value that is not in the fact's list. */
export function conditionProblems(draft: Draft): Problem[] {
  const ofChecks = draft.checks.flatMap(({ value, index }) =>
    value?.applies === undefined ? [] : problemsOf(value.applies, pathOf('checks', index, 'applies'), value.subject, draft),
  )
  const ofFacts = draft.facts.flatMap(({ value, index }) =>
    value?.applies === undefined ? [] : problemsOf(value.applies, pathOf('facts', index, 'applies'), value.subject, draft),
  )
  return [...ofChecks, ...ofFacts]
}

function problemsOf(condition: Condition, path: string, subject: JudgedKind, draft: Draft): Problem[] {
  if ('all' in condition) return condition.all.flatMap((part, index) => problemsOf(part, `${path}.all[${index}]`, subject, draft))
  if ('any' in condition) return condition.any.flatMap((part, index) => problemsOf(part, `${path}.any[${index}]`, subject, draft))
  if ('not' in condition) return problemsOf(condition.not, `${path}.not`, subject, draft)

  const declared = draft.facts.find((fact) => fact.id === condition.fact)
  if (declared === undefined) return [{ path, problem: `there is no fact ${condition.fact}` }]
  const fact = declared.value
  if (fact === null) return []
  // A fit is a person in a car: it may ask about either.
  if (fact.subject !== subject && subject !== 'fit')
    return [{ path, problem: `the fact ${fact.name} is about a ${fact.subject}, the condition about a ${subject}` }]
  return valueProblems(condition, path, fact)
}

type Leaf = Extract<Condition, { readonly fact: string }>

function valueProblems(leaf: Leaf, path: string, fact: FactDefinition): Problem[] {
  const values = fact.values.map((each) => each.value)
  if ('atLeast' in leaf) {
    return values.every((value) => typeof value === 'number') ? [] : [{ path, problem: `the fact ${fact.name} is no number` }]
  }
  const read = 'is' in leaf ? [leaf.is] : leaf.in
  return read
    .filter((value) => !values.includes(value))
    .map((value) => ({ path, problem: `the fact ${fact.name} has no value ${JSON.stringify(value)}` }))
}
