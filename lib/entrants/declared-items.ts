import type { BookCheck } from '@/lib/checklist/book'
import type { CarFacts } from '@/lib/checklist/car-facts'
import { askedAtHome, checksAtHome, declaredKey } from '@/lib/checklist/declarable'
import { type PreCheck, preCheck, worstPreCheck } from '@/lib/checklist/pre-check'
import type { DeclarationParts, Figures } from '@/lib/contracts/declaration'
import type { CivilDate } from '@/lib/rules/civil-date'
import type { Judgement } from '@/lib/rules/judgement'

/** One thing that is asked of an entrant, with what was said of it and what the bay's rule makes of that. */
export interface DeclaredItem {
  readonly key: string
  readonly check: BookCheck
  /** Whose kit; null for the car. */
  readonly person: string | null
  readonly kind: 'label' | 'statement'
  readonly values: Figures
  readonly preCheck: PreCheck
  readonly judgement: Judgement | null
}

const NONE: Figures = {}

/**
 * Everything that is asked of this car and of these people's kit, in checklist order, judged on `on` (the event's last day). Runs in the
 * browser at each key and on the server for the organiser: the same rules, the same limits.
 */
export function declaredItems(
  checks: readonly BookCheck[],
  parts: Pick<DeclarationParts, 'facts' | 'answers'>,
  people: readonly string[],
  on: CivilDate,
): readonly DeclaredItem[] {
  const item = (check: BookCheck, person: string | null, facts: CarFacts): DeclaredItem => {
    const key = declaredKey(check.id, person)
    const values = parts.answers[key] ?? NONE
    return { key, check, person, kind: askedAtHome(check) ?? 'statement', values, ...preCheck(check, values, facts, on) }
  }
  const aboard = personFacts(parts.facts)
  return [
    ...checksAtHome(checks, 'car', parts.facts).map((check) => item(check, null, parts.facts)),
    ...people.flatMap((person) => checksAtHome(checks, 'person', aboard).map((check) => item(check, person, aboard))),
  ]
}

/** What the car says of who sits in it: an open car and a harness ask more of a helmet. */
export function personFacts(car: CarFacts): CarFacts {
  const roof = car.roof === 'open' ? { openCar: true } : car.roof === 'closed' ? { openCar: false } : {}
  const worn = car.belts === 'standard' ? false : car.headRestraint
  return { ...roof, ...(typeof worn === 'boolean' ? { headRestraintWorn: worn } : {}) }
}

export interface DeclaredSum {
  readonly says: PreCheck
  readonly answered: number
  readonly asked: number
}

/** What a declaration comes to as a whole. A statement nobody answered is looked at in the bay anyway and keeps nothing open here. */
export function sumOf(items: readonly DeclaredItem[]): DeclaredSum {
  const counted = items.filter(({ kind, preCheck: says }) => kind === 'label' || says !== 'not answered')
  return {
    says: worstPreCheck(counted.map(({ preCheck: says }) => says)),
    answered: counted.filter(({ preCheck: says }) => says !== 'not answered').length,
    asked: counted.length,
  }
}
