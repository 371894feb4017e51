import type { BookCheck } from '@/lib/checklist/book'
import type { MeasureField } from '@/lib/checklist/checklist'
import { fieldsAtHome } from '@/lib/checklist/declarable'

const DATES: readonly string[] = ['labelYear', 'madeYear', 'madeMonth']

/** The fields of a check that what was said so far leaves open: a belt's label carries its last year or when it was made, never both. */
export function fieldsAsked(check: Pick<BookCheck, 'measure' | 'rule'>, typed: Readonly<Record<string, string>>): readonly MeasureField[] {
  const fields = fieldsAtHome(check)
  if (check.rule?.name !== 'harness-validity') return fields
  const asked = datesOn(typed.standard ?? '')
  return fields.filter(({ id }) => !DATES.includes(id) || asked.includes(id))
}

function datesOn(standard: string): readonly string[] {
  if (standard.startsWith('fia-')) return ['labelYear']
  return standard.startsWith('sfi-') ? ['madeYear', 'madeMonth'] : []
}
