import type { MeasureField } from '@/lib/checklist/checklist'
import type { Values } from './answer'

/** What was typed, by field id; a field not typed yet is missing. */
export type Typed = Readonly<Record<string, string>>

/** Values ready to judge, and what cannot be one. */
export interface ReadValues {
  readonly values: Values
  readonly problems: readonly { readonly field: string; readonly why: string }[]
}

/** Reads what was typed at a check. A number takes comma or point; one outside the range that is possible at all is named with that range. */
export function readValues(fields: readonly MeasureField[], typed: Typed): ReadValues {
  const values: Record<string, string | number | boolean | null> = {}
  const problems: { field: string; why: string }[] = []
  for (const field of fields) {
    const text = (typed[field.id] ?? '').trim()
    if (text === '') continue
    const read = readField(field, text)
    if ('why' in read) problems.push({ field: field.id, why: read.why })
    else values[field.id] = read.value
  }
  return { values, problems }
}

function readField(field: MeasureField, text: string): { readonly value: string | number } | { readonly why: string } {
  if (field.kind === 'choice') {
    const known = field.options.some((option) => option.id === text)
    return known ? { value: text } : { why: `${field.label}: choose one of the list.` }
  }
  if (field.kind === 'text') {
    return text.length <= field.maxLength ? { value: text } : { why: `${field.label}: at most ${field.maxLength} characters.` }
  }
  const number = readNumber(text)
  if (number === null || number < field.min || number > field.max)
    return { why: `${field.label}: a number from ${field.min} to ${[field.max, field.unit].join(' ').trim()}.` }
  return { value: number }
}

/** Half-typed is a number too: it is judged at each keystroke, and `2.` is on its way to `2.5`. */
function readNumber(text: string): number | null {
  return /^-?(\d+[.,]?\d*|[.,]\d+)$/.test(text) ? Number(text.replace(',', '.')) : null
}
