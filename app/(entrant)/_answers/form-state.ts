import type { BookCheck } from '@/lib/checklist/book'
import { fieldsAtHome, readDeclaredKey } from '@/lib/checklist/declarable'
import type { DeclarationParts, Figures } from '@/lib/contracts/declaration'
import { readValues, type Typed } from '@/lib/walk/read-values'
import { typedOf } from './typed-of'

/** A declaration as it is being filled in: what cannot be a value yet stays as it was typed. */
export interface FormState {
  readonly facts: Figures
  readonly typed: Readonly<Record<string, Typed>>
  readonly changes: string
  readonly photos: DeclarationParts['photos']
}

/** The form that shows these parts. */
export function formOf(parts: DeclarationParts): FormState {
  const typed = Object.fromEntries(Object.entries(parts.answers).map(([key, values]) => [key, typedOf(values)]))
  return { facts: parts.facts, typed, changes: parts.changes, photos: parts.photos }
}

/** What the form comes to: only what can be a value. */
export function partsOfForm(form: FormState, checks: readonly BookCheck[]): DeclarationParts {
  const byId = new Map(checks.map((check) => [check.id, check]))
  const answers = Object.entries(form.typed).flatMap(([key, typed]) => {
    const check = byId.get(readDeclaredKey(key).check)
    const values = check ? readValues(fieldsAtHome(check), typed).values : {}
    return Object.keys(values).length === 0 ? [] : [[key, values] as const]
  })
  return { facts: form.facts, answers: Object.fromEntries(answers), changes: form.changes, photos: form.photos }
}
