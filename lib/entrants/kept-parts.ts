import type { BookCheck } from '@/lib/checklist/book'
import { fieldsAtHome, isKeptForNextTime, readDeclaredKey } from '@/lib/checklist/declarable'
import type { FactDefinition, MeasureField } from '@/lib/checklist/checklist'
import { type DeclarationParts, type Figures, NOTHING_DECLARED } from '@/lib/contracts/declaration'

/** Between a check and its field in a car's kept facts: `harness.label/labelYear`. No id holds one. */
const PARTED = '/'

/** What is kept of a car for its next event: the facts, and label values of what stays as it is. */
export function factsToKeep(parts: DeclarationParts, checks: readonly BookCheck[]): Figures {
  const byId = new Map(checks.map((check) => [check.id, check]))
  const values = Object.entries(parts.answers).flatMap(([key, said]) => {
    const { check, person } = readDeclaredKey(key)
    const known = byId.get(check)
    if (person !== null || known === undefined || !isKeptForNextTime(known)) return []
    return Object.entries(said).map(([field, value]) => [`${check}${PARTED}${field}`, value] as const)
  })
  return { ...parts.facts, ...Object.fromEntries(values) }
}

/** What a car's kept facts say of this event's checks. */
export function partsKept(kept: Figures, facts: readonly FactDefinition[], checks: readonly BookCheck[]): DeclarationParts {
  const answers: Record<string, Record<string, Figures[string]>> = {}
  const told: Record<string, Figures[string]> = {}
  for (const [name, value] of Object.entries(kept)) {
    const [check = '', field] = name.split(PARTED)
    if (field === undefined) told[name] = value
    else answers[check] = { ...answers[check], [field]: value }
  }
  return cleanParts({ ...NOTHING_DECLARED, facts: told, answers }, facts, checks, [])
}

/** A declaration with only what its checklist knows: facts with a value of the list, fields within what is possible, the kit of these people. */
export function cleanParts(
  parts: DeclarationParts,
  facts: readonly FactDefinition[],
  checks: readonly BookCheck[],
  people: readonly string[],
): DeclarationParts {
  const byId = new Map(checks.map((check) => [check.id, check]))
  const isKnownKey = (key: string) => {
    const { check, person } = readDeclaredKey(key)
    const known = byId.get(check)
    if (known === undefined) return false
    return known.subject === 'car' ? person === null : known.subject === 'person' && person !== null && people.includes(person)
  }
  const answers = Object.entries(parts.answers).flatMap(([key, said]) => {
    const check = byId.get(readDeclaredKey(key).check)
    const clean = check && isKnownKey(key) ? cleanValues(said, fieldsAtHome(check)) : {}
    return Object.keys(clean).length === 0 ? [] : [[key, clean] as const]
  })
  return {
    facts: Object.fromEntries(
      Object.entries(parts.facts).filter(([name, value]) =>
        facts.some((fact) => fact.name === name && fact.subject === 'car' && fact.values.some((each) => each.value === value)),
      ),
    ),
    answers: Object.fromEntries(answers),
    changes: parts.changes,
    photos: Object.fromEntries(Object.entries(parts.photos).filter(([key, hashes]) => hashes.length > 0 && isKnownKey(key))),
  }
}

function cleanValues(said: Figures, fields: readonly MeasureField[]): Figures {
  return Object.fromEntries(
    fields.flatMap((field) => {
      const value = said[field.id]
      return value !== undefined && value !== null && isPossible(value, field) ? [[field.id, value] as const] : []
    }),
  )
}

function isPossible(value: string | number | boolean, field: MeasureField): boolean {
  switch (field.kind) {
    case 'number':
      return typeof value === 'number' && value >= field.min && value <= field.max
    case 'text':
      return typeof value === 'string' && value !== '' && value.length <= field.maxLength
    case 'choice':
      return field.options.some(({ id }) => id === value)
  }
}
