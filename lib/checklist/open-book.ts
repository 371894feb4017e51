import type { Book, BookCheck } from './book'
import type { CheckDefinition, Checklist, FactDefinition, Limits } from './checklist'
import type { Condition } from './condition'
import { paramsHash } from './hash'

/**
 * Opens a parsed checklist with parsed limits. A check with a list of places becomes one per place, its id ending in `.<place>`; the limits
 * replace a check's own params key by key. The hashes are those of the two files, as `presented` pins them.
 * Whether the two fit the rules is not asked here but where they enter (`openCheckedBook`): a device opens only what its server checked, and
 * need not load every rule before it can find a car.
 */
export function openBook(checklist: Checklist, limits: Limits, hashes: { readonly checklist: string; readonly limits: string }): Book {
  const checks = checklist.checks.flatMap((check) => unfold(check, checklist, limits))
  return {
    checklistHash: hashes.checklist,
    limitsHash: hashes.limits,
    checklist,
    limits,
    checks,
    byId: new Map(checks.map((check) => [check.id, check])),
    stations: new Map(checklist.stations.map((station) => [station.id, station])),
  }
}

function unfold(check: CheckDefinition, checklist: Checklist, limits: Limits): BookCheck[] {
  const { place: places, applies, ...rest } = check
  const params = { ...check.rule?.params, ...(check.rule === undefined ? {} : limits.rules[check.rule.name]) }
  const opened = {
    ...rest,
    ...(applies === undefined ? {} : { applies: withDeclaredValues(applies, checklist.facts) }),
    params,
    paramsHash: check.rule === undefined ? null : paramsHash(check.rule.name, params),
  }
  return (typeof places === 'string' ? [places] : places).map((place) => ({
    ...opened,
    id: typeof places === 'string' ? check.id : `${check.id}.${place}`,
    place,
    reopens: check.reopens.flatMap((id) => reopened(id, place, checklist)),
  }))
}

/** The same corner of a check per corner; all its corners when it is not asked at this place; the id itself when it names its corner. */
function reopened(id: string, place: string, checklist: Checklist): readonly string[] {
  const places = checklist.checks.find((check) => check.id === id)?.place
  if (places === undefined || typeof places === 'string') return [id]
  return places.includes(place) ? [`${id}.${place}`] : places.map((each) => `${id}.${each}`)
}

function withDeclaredValues(condition: Condition, facts: readonly FactDefinition[]): Condition {
  if ('all' in condition) return { all: condition.all.map((part) => withDeclaredValues(part, facts)) }
  if ('any' in condition) return { any: condition.any.map((part) => withDeclaredValues(part, facts)) }
  if ('not' in condition) return { not: withDeclaredValues(condition.not, facts) }
  const declared = facts.find((fact) => fact.name === condition.fact)
  return declared === undefined ? condition : { ...condition, among: declared.values.map((each) => each.value) }
}
