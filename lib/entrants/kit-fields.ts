import type { BookCheck } from '@/lib/checklist/book'
import type { MeasureField } from '@/lib/checklist/checklist'
import type { KitKind } from '@/lib/contracts/my-garage'

/** Asked where no check of the event judges the label. */
const AS_PRINTED: readonly MeasureField[] = [
  { kind: 'text', id: 'label', label: 'Standard on the label', maxLength: 60, hint: 'As it is printed.' },
  { kind: 'number', id: 'until', label: 'Not valid after, year', unit: '', min: 1990, max: 2099, decimals: 0 },
]

const IDS: Readonly<Partial<Record<KitKind, string>>> = {
  'head-restraint': 'kit.head-restraint',
  suit: 'kit.suit',
  gloves: 'kit.gloves',
}

/** The check that judges a piece of kit of this kind; null where none does. */
export function kitCheck(kind: KitKind, checks: readonly BookCheck[]): BookCheck | null {
  const judging = checks.filter(({ rule, measure }) => rule !== undefined && measure !== undefined)
  const wanted = (check: BookCheck) => (kind === 'helmet' ? check.rule?.name === 'helmet-standard' : check.id === IDS[kind])
  return judging.find(wanted) ?? null
}

/** What is asked of a label: the fields of the check that judges it, else standard and year as printed. */
export function kitFields(check: BookCheck | null): readonly MeasureField[] {
  return check?.measure ?? AS_PRINTED
}
