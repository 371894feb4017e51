import { civilDate, wholeYearsBetween, type CivilDate } from './civil-date'
import { missing } from './gap'
import { advisory, fail, undecided, type Judgement } from './judgement'

interface Made {
  readonly madeYear?: number | undefined
  readonly madeMonth?: number | undefined
}
interface AgeLimits {
  readonly maxAgeYears: number | null
  readonly adviseOverYears: number | null
}

/** What the helmet's age comes to; nothing where it is young enough, or where age is not judged. */
export function ageJudged({ madeYear, madeMonth }: Made, limits: AgeLimits, on: CivilDate): Judgement[] {
  if (madeYear === undefined)
    return limits.maxAgeYears === null && limits.adviseOverYears === null ? [] : [advisory('helmet-standard.age-unknown')]
  const oldest = firstOf(madeYear, madeMonth ?? 1)
  if (oldest > on) return [undecided('helmet-standard.made-in-future', { madeYear, madeMonth: madeMonth ?? null, on })]
  const youngest = firstOf(madeYear, madeMonth ?? 12)
  // Without the month a fail must not be guessed, and a pass still less.
  if (isOver(oldest, limits.maxAgeYears, on) !== isOver(youngest, limits.maxAgeYears, on))
    return [missing('helmet-standard', 'madeMonth', { madeYear })]
  const facts = { madeYear, madeMonth: madeMonth ?? null, ageYears: wholeYearsBetween(oldest, on) }
  if (isOver(oldest, limits.maxAgeYears, on)) return [fail('helmet-standard.too-old', { ...facts, limitYears: limits.maxAgeYears })]
  if (isOver(oldest, limits.adviseOverYears, on))
    return [advisory('helmet-standard.ageing', { ...facts, limitYears: limits.adviseOverYears })]
  return []
}

function firstOf(year: number, month: number): CivilDate {
  return civilDate(`${year}-${String(month).padStart(2, '0')}-01`)
}

/** Over from the day after the anniversary. */
function isOver(made: CivilDate, limitYears: number | null, on: CivilDate): boolean {
  return limitYears !== null && on > `${Number(made.slice(0, 4)) + limitYears}${made.slice(4)}`
}
