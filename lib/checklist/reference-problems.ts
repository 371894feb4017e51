import type { CheckDefinition, HoldReason } from './checklist'
import type { Draft, Read } from './draft'
import { askedIds, isOtherSubject, placesOf, subjectsById } from './draft'
import type { Problem } from './problem'
import { pathOf } from './problem'

/** Ids used twice, references to what is not there, subjects that do not fit, and what a check must have. */
export function referenceProblems(draft: Draft): Problem[] {
  return [
    ...duplicates(draft),
    ...draft.checks.flatMap((read) => (read.value === null ? [] : checkProblems(read.value, read.index, draft))),
    ...draft.holdReasons.flatMap((read) => (read.value === null ? [] : holdProblems(read.value, read.index, draft))),
  ]
}

function duplicates(draft: Draft): Problem[] {
  const seen = new Set<string>()
  const asked = draft.checks.flatMap(({ index, value }) =>
    value === null
      ? []
      : [...new Set(askedIds(value))].flatMap((id) =>
          isNew(seen, id) ? [] : [{ path: pathOf('checks', index, 'id'), problem: `the id ${id} is used twice` }],
        ),
  )
  return [
    ...repeated('facts', 'name', draft.facts),
    ...repeated('stations', 'id', draft.stations),
    ...repeated('places', 'id', draft.places),
    ...repeated('holdReasons', 'id', draft.holdReasons),
    ...asked,
  ]
}

function repeated(list: string, key: string, entries: readonly Read<unknown>[]): Problem[] {
  const seen = new Set<string>()
  return entries.flatMap(({ id, index }) =>
    id === null || isNew(seen, id) ? [] : [{ path: pathOf(list, index, key), problem: `the ${key} ${id} is used twice` }],
  )
}

function isNew(seen: Set<string>, id: string): boolean {
  if (seen.has(id)) return false
  seen.add(id)
  return true
}

function checkProblems(check: CheckDefinition, index: number, draft: Draft): Problem[] {
  const at = (...parts: readonly PropertyKey[]) => pathOf('checks', index, ...parts)
  const problems: Problem[] = []

  const station = subjectsById(draft.stations).get(check.station)
  if (station === undefined) problems.push({ path: at('station'), problem: `there is no station ${check.station}` })
  else if (isOtherSubject(check.subject, station))
    problems.push({
      path: at('station'),
      problem: `the station ${check.station} is about a ${station}, the check about a ${check.subject}`,
    })

  const places = subjectsById(draft.places)
  placesOf(check).forEach((id, at2) => {
    const path = typeof check.place === 'string' ? at('place') : at('place', at2)
    const place = places.get(id)
    if (place === undefined) problems.push({ path, problem: `there is no place ${id}` })
    else if (isOtherSubject(check.subject, place))
      problems.push({ path, problem: `the place ${id} is about a ${place}, the check about a ${check.subject}` })
  })
  if (new Set(placesOf(check)).size !== placesOf(check).length) problems.push({ path: at('place'), problem: 'a place is named twice' })

  if (check.critical && !check.required) problems.push({ path: at('required'), problem: 'a no-go item must be required' })
  problems.push(...ownListProblems(check, at), ...reopenProblems(check, at, draft))
  return problems
}

type At = (...parts: readonly PropertyKey[]) => string

function ownListProblems(check: CheckDefinition, at: At): Problem[] {
  const problems: Problem[] = []
  if (!check.reasons.some((reason) => reason.id === 'other'))
    problems.push({ path: at('reasons'), problem: 'has no reason "other" (anything else I do not like)' })
  problems.push(...twice(check.reasons, at, 'reasons'), ...twice(check.measure ?? [], at, 'measure'))
  check.measure?.forEach((field, index) => {
    if (field.kind === 'number' && field.min >= field.max)
      problems.push({ path: at('measure', index, 'min'), problem: `the least, ${field.min}, is not below the most, ${field.max}` })
    if (field.kind === 'choice') problems.push(...twice(field.options, (...rest) => at('measure', index, ...rest), 'options'))
  })
  return problems
}

function twice(entries: readonly { readonly id: string }[], at: At, list: string): Problem[] {
  const seen = new Set<string>()
  return entries.flatMap(({ id }, index) =>
    isNew(seen, id) ? [] : [{ path: at(list, index, 'id'), problem: `the id ${id} is used twice` }],
  )
}

function reopenProblems(check: CheckDefinition, at: At, draft: Draft): Problem[] {
  return check.reopens.flatMap((id, index) => {
    const path = at('reopens', index)
    if (id === check.id || askedIds(check).includes(id)) return [{ path, problem: 'a check cannot reopen itself' }]
    const target = draft.checks.find((other) => other.id === id || (other.value !== null && askedIds(other.value).includes(id)))
    if (target === undefined) return [{ path, problem: `there is no check ${id}` }]
    return isOtherSubject(check.subject, target.value?.subject ?? null)
      ? [{ path, problem: `the check ${id} is about a ${target.value?.subject}, this one about a ${check.subject}` }]
      : []
  })
}

function holdProblems(reason: HoldReason, index: number, draft: Draft): Problem[] {
  const stations = subjectsById(draft.stations)
  const wrongStations = reason.stations.flatMap((id, at): Problem[] => {
    const path = pathOf('holdReasons', index, 'stations', at)
    const subject = stations.get(id)
    if (subject === undefined) return [{ path, problem: `there is no station ${id}` }]
    return isOtherSubject(reason.subject, subject)
      ? [{ path, problem: `the station ${id} is about a ${subject}, the hold about a ${reason.subject}` }]
      : []
  })
  const wrongChecks = reason.checks.flatMap((id, at): Problem[] => {
    const path = pathOf('holdReasons', index, 'checks', at)
    const target = draft.checks.find((other) => (other.value === null ? other.id === id : askedIds(other.value).includes(id)))
    if (target === undefined) return [{ path, problem: `the walk asks no check ${id} (of a check per corner name each corner)` }]
    return isOtherSubject(reason.subject, target.value?.subject ?? null)
      ? [{ path, problem: `the check ${id} is about a ${target.value?.subject}, the hold about a ${reason.subject}` }]
      : []
  })
  return [...wrongStations, ...wrongChecks]
}
