import type { CivilDate } from '@/lib/rules/civil-date'
import type { Judgement } from '@/lib/rules/judgement'
import type { BookCheck } from './book'
import type { CarFacts } from './car-facts'
import { askedAtHome, STATEMENT_FIELD } from './declarable'
import { judgeCheck, type Measured } from './judge-check'

/** What a declaration comes to, worst first. Never *passed*: only a look at the car passes it. */
export const PRE_CHECKS = ['would not be passed', 'not answered', 'will be looked at', 'would be passed'] as const
export type PreCheck = (typeof PRE_CHECKS)[number]

const OF_OUTCOME = {
  ok: 'would be passed',
  advisory: 'will be looked at',
  fail: 'would not be passed',
  undecided: 'not answered',
} as const satisfies Readonly<Record<Judgement['outcome'], PreCheck>>

export interface PreChecked {
  readonly preCheck: PreCheck
  /** What the check's rule says; null for a statement. */
  readonly judgement: Judgement | null
}

/** Judges a declared answer by the very rule of the bay, on `on` (the event's last day). Nothing declared is *not answered*. */
export function preCheck(check: BookCheck, values: Measured | undefined, facts: CarFacts, on: CivilDate): PreChecked {
  if (askedAtHome(check) === 'statement') return { preCheck: ofStatement(values?.[STATEMENT_FIELD.id]), judgement: null }
  const judgement = judgeCheck(check, values, facts, on)
  return { preCheck: judgement === null ? 'not answered' : OF_OUTCOME[judgement.outcome], judgement }
}

function ofStatement(so: unknown): PreCheck {
  return so === 'yes' ? 'would be passed' : so === 'no' ? 'would not be passed' : 'not answered'
}

/** The worst of several; of none at all *not answered*, because nothing was said. */
export function worstPreCheck(all: readonly PreCheck[]): PreCheck {
  return PRE_CHECKS.find((each) => all.includes(each)) ?? 'not answered'
}
