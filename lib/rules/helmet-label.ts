import type { CivilDate } from './civil-date'
import { advisory, fail, ok, undecided, type Judgement, type JudgementOutcome } from './judgement'
import { HELMET_STANDARDS, type HelmetBody, type HelmetStandardId } from './tables/helmet-standards'

/** The limits that bear on a label alone. */
export interface HelmetLimits {
  readonly body: HelmetBody
  readonly motorcycleRated: 'advisory' | 'fail'
  readonly notForCars: 'advisory' | 'fail'
}

const MILDNESS: Readonly<Record<JudgementOutcome, number>> = { ok: 3, advisory: 2, undecided: 1, fail: 0 }

/** What the best of the labels comes to: one accepted label is enough. Null without any label. */
export function bestLabel(labels: readonly HelmetStandardId[], limits: HelmetLimits, on: CivilDate): Judgement | null {
  const judged = labels.map((label) => judgeLabel(label, limits, on))
  return judged.reduce<Judgement | null>(
    (best, each) => (best === null || MILDNESS[each.outcome] > MILDNESS[best.outcome] ? each : best),
    null,
  )
}

function judgeLabel(standard: HelmetStandardId, limits: HelmetLimits, on: CivilDate): Judgement {
  const { kind, face, accepted } = HELMET_STANDARDS[standard]
  const acceptance = accepted[limits.body]
  const facts = { standard, body: limits.body }
  if (kind === 'none') return fail('helmet-standard.no-label')
  if (kind === 'other-kit') return fail('helmet-standard.not-a-helmet-label', facts)
  if (acceptance.is === 'not-known') return undecided('helmet-standard.not-on-record', facts)
  if (acceptance.is === 'not-accepted') return fail('helmet-standard.not-accepted', facts)
  if (acceptance.until !== null && acceptance.until < on)
    return fail('helmet-standard.ended', { ...facts, lastValidDay: acceptance.until, on })
  if (kind === 'motorcycle') return as(limits.motorcycleRated, 'helmet-standard.motorcycle-rated', facts)
  if (kind === 'not-for-cars') return as(limits.notForCars, 'helmet-standard.not-for-cars', facts)
  return ok('helmet-standard.accepted', { ...facts, lastValidDay: acceptance.until, wornClosed: face === 'full-when-closed' })
}

function as(outcome: 'advisory' | 'fail', code: string, facts: Judgement['facts']): Judgement {
  return outcome === 'fail' ? fail(code, facts) : advisory(code, facts)
}
