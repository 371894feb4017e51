import type { CivilDate } from '@/lib/rules/civil-date'
import { judge } from '@/lib/rules/judge'
import type { Judgement } from '@/lib/rules/judgement'
import type { BookCheck } from './book'
import type { CarFacts } from './car-facts'

/** Values as entered at a check, by the id of their measure field. */
export type Measured = Readonly<Record<string, string | number | boolean | null>>

/**
 * Judges what was measured at a check by the check's rule under the limits in force, on `on` (the event's last day). Null where the check has
 * no rule. What was not measured (an emptied field too) or is not known is left out, and the rule answers *undecided* where it needs it.
 */
export function judgeCheck(
  check: Pick<BookCheck, 'rule' | 'params'>,
  measured: Measured | undefined,
  facts: CarFacts,
  on: CivilDate,
): Judgement | null {
  if (check.rule === undefined) return null
  const inputs = Object.entries(check.rule.inputs).flatMap(([name, from]) => {
    const value = 'measure' in from ? measured?.[from.measure] : 'fact' in from ? facts[from.fact] : from.value
    return value === undefined || value === null || value === '' ? [] : [[name, value] as const]
  })
  return judge(check.rule.name, Object.fromEntries(inputs), check.params, on)
}
