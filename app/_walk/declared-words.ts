import type { BookCheck } from '@/lib/checklist/book'
import { fieldsAtHome } from '@/lib/checklist/declarable'

/** Declared values in a line: `24 W19`, `5.5 mm, 5 mm`, `FIA 8853-2016, 2027, yes`. Empty where nothing was declared. */
export function declaredWords(values: Readonly<Record<string, string | number | boolean | null>>, check: BookCheck): string {
  return fieldsAtHome(check)
    .flatMap((field) => {
      const value = values[field.id]
      if (value === undefined || value === null || value === '') return []
      if (field.kind === 'choice') return [wordsOfChoice(field.label, field.options.find(({ id }) => id === value)?.label ?? String(value))]
      return [field.kind === 'number' && field.unit !== '' ? `${String(value)} ${field.unit}` : String(value)]
    })
    .join(', ')
}

/** A yes or no says nothing without what it is about. */
function wordsOfChoice(label: string, option: string): string {
  return /^(yes|no)$/i.test(option) ? `${label.toLowerCase().replace(/\?$/, '')}: ${option.toLowerCase()}` : option
}
