import { doesNotApply } from './applicable-checks'
import type { BookCheck } from './book'
import type { CarFacts } from './car-facts'
import type { JudgedKind, MeasureField } from './checklist'

/** Perishable things that are printed on the part or measured with a coin: an entrant can say them at home as well as anybody. */
const ALSO_AT_HOME: readonly string[] = ['tyre-age', 'tyre-tread', 'helmet-standard']

/**
 * What an entrant is asked of a check at home. `label`: values that the check's own rule judges (labels, dates, tyre codes, tread).
 * `statement`: whether it is so, for standing checks that nothing measures. Everything else needs the trade's eye at the car: null.
 */
export function askedAtHome(check: Pick<BookCheck, 'rule' | 'measure' | 'standing' | 'required'>): 'label' | 'statement' | null {
  if (check.rule && check.measure) return check.standing || ALSO_AT_HOME.includes(check.rule.name) ? 'label' : null
  return check.standing && check.required && !check.rule && !check.measure ? 'statement' : null
}

/** The field of a statement: its value is `yes` or `no`. */
export const STATEMENT_FIELD: Extract<MeasureField, { kind: 'choice' }> = {
  kind: 'choice',
  id: 'so',
  label: 'Is it so?',
  options: [
    { id: 'yes', label: 'Yes' },
    { id: 'no', label: 'No' },
  ],
}

/** The fields an entrant fills in at a check. */
export function fieldsAtHome(check: Pick<BookCheck, 'measure'>): readonly MeasureField[] {
  return check.measure ?? [STATEMENT_FIELD]
}

/** What stays as it is from one event to the next, so that nobody types it twice: never what wears off within a day. */
export function isKeptForNextTime(check: Pick<BookCheck, 'rule' | 'standing'>): boolean {
  return check.standing || check.rule?.name === 'tyre-age' || check.rule?.name === 'helmet-standard'
}

/** The checks of a book that an entrant is asked about these facts at home, in checklist order. A fact that is not known asks. */
export function checksAtHome<C extends BookCheck>(checks: readonly C[], subject: JudgedKind, facts: CarFacts): readonly C[] {
  return checks.filter((check) => check.subject === subject && askedAtHome(check) !== null && !doesNotApply(check, facts))
}

/** Where the answer to a check stands in a declaration: the check's id, for a person's kit with the person behind it. */
export function declaredKey(checkId: string, person: string | null): string {
  return person === null ? checkId : `${checkId}@${person}`
}

/** Check and person of a key. */
export function readDeclaredKey(key: string): { readonly check: string; readonly person: string | null } {
  const at = key.indexOf('@')
  return at < 0 ? { check: key, person: null } : { check: key.slice(0, at), person: key.slice(at + 1) }
}
