/**
 * Whether the labels of a harness or belt make it acceptable on a day.
 *
 * Decides: a label on every strap; one homologation number on all straps of an FIA set; the last valid day by standard.
 * Units: civil dates and calendar years. Judged on the event's last day.
 * Edges: the last valid day is still valid. An FIA label year ends on 31 December of that year, or (`label-year-plus-five`, FIA 8853-2016 alone)
 * five years later. An SFI life runs from the *first* day of the punched month, the oldest it can be; to the day it ends on the anniversary, which
 * is still valid, or with `end-of-year` on 31 December of that year. A standard that has itself ended overrides a later label. The advisory window
 * is the last `adviseWithinDays` days and counts the last valid day. A label year more than five years ahead cannot have been printed yet.
 * Missing or unreadable labels count as expired; mixed numbers always fail. A road belt has no date.
 * Sources: `tables/harness-standards.ts`. That an FIA label ends with its year is quoted for 8853/98 and from memory for 8853-2016.
 */
import * as z from 'zod/mini'
import { civilDate, dayNumber, parseCivilDate, type CivilDate } from './civil-date'
import { isYes, oneOf, wholeBetween, yesNo } from './fields'
import { missing, worstOf } from './gap'
import { explainHarnessValidity } from './harness-validity-words'
import { advisory, fail, ok, undecided, type Facts, type Judgement } from './judgement'
import { rule } from './rule'
import { HARNESS_SOURCES, HARNESS_STANDARD_IDS, HARNESS_STANDARDS, type HarnessStandardId } from './tables/harness-standards'

const NAME = 'harness-validity'

const inputs = z.object({
  standard: oneOf(HARNESS_STANDARD_IDS),
  /** The year after "Not valid after" on an FIA label. */
  labelYear: wholeBetween(1995, 2099),
  /** Made, as punched on an SFI label. */
  madeYear: wholeBetween(1985, 2099),
  madeMonth: wholeBetween(1, 12),
  /** A readable label on every strap that must carry one. */
  labelsComplete: yesNo(),
  /** One homologation number on all straps; asked of FIA sets. */
  labelsSameNumber: yesNo(),
})
type Inputs = z.infer<typeof inputs>

const params = z.strictObject({
  /** What the label year of FIA 8853-2016 means: the last year itself, or five years more. */
  reading: z.enum(['label-year', 'label-year-plus-five']),
  /** Whether an SFI life ends on the anniversary or on 31 December of that year. */
  sfiReading: z.enum(['to-the-day', 'end-of-year']),
  sfiLifeYears: z.int().check(z.gte(1), z.lte(10)),
  /** The last day FIA 8853/98 itself is accepted, whatever the label says; null: the label alone decides. */
  standardEnds8853_98: z.nullable(z.string().check(z.refine((text) => parseCivilDate(text) !== null))),
  /** Length of the advisory window that ends with the last valid day (that day is one of them); 0: none. */
  adviseWithinDays: z.int().check(z.gte(0), z.lte(730)),
  /** What an expired or unreadable set comes to. Mixed sets always fail. */
  expiredIs: z.enum(['fail', 'advisory']),
})
type Params = z.infer<typeof params>

export const HARNESS_VALIDITY_DEFAULTS: Params = {
  reading: 'label-year',
  sfiReading: 'to-the-day',
  sfiLifeYears: 2,
  standardEnds8853_98: null,
  adviseWithinDays: 60,
  expiredIs: 'fail',
}

export const harnessValidity = rule({
  name: NAME,
  title: 'Harness labels and date',
  inputs,
  params,
  defaults: HARNESS_VALIDITY_DEFAULTS,
  source: HARNESS_SOURCES,
  evaluate(given, limits, on) {
    if (isYes(given.labelsSameNumber) === false) return fail(`${NAME}.mixed-numbers`)
    const { standard } = given
    if (standard === undefined) return missing(NAME, 'standard')
    if (HARNESS_STANDARDS[standard].dating === 'unreadable') return expired('no-readable-label', {}, limits)
    if (HARNESS_STANDARDS[standard].dating === 'undated') return ok(`${NAME}.road-belt-undated`, { standard })
    return worstOf(dated(standard, given, limits, on), ...labelled(standard, given, limits))
  },
  explain: explainHarnessValidity,
})

function labelled(standard: HarnessStandardId, given: Inputs, limits: Params): Judgement[] {
  const complete = isYes(given.labelsComplete)
  const askNumber = standard.startsWith('fia-') && given.labelsSameNumber === undefined
  return [
    ...(complete === false ? [expired('labels-missing', { standard }, limits)] : []),
    ...(complete === undefined ? [missing(NAME, 'labelsComplete')] : []),
    ...(askNumber ? [missing(NAME, 'labelsSameNumber')] : []),
  ]
}

function dated(standard: HarnessStandardId, given: Inputs, limits: Params, on: CivilDate): Judgement {
  const last =
    HARNESS_STANDARDS[standard].dating === 'years-from-made'
      ? lastDayFromMade(given, limits, on)
      : lastDayFromLabel(standard, given, limits, on)
  if (typeof last !== 'string') return last
  const ends = standard === 'fia-8853-98' && limits.standardEnds8853_98 !== null ? limits.standardEnds8853_98 : null
  const ended = ends !== null && ends < last
  const lastValidDay = ended ? civilDate(ends) : last
  const daysLeft = dayNumber(lastValidDay) - dayNumber(on)
  if (daysLeft < 0) return expired(ended ? 'standard-ended' : 'expired', { standard, lastValidDay, on, daysOver: -daysLeft }, limits)
  const facts = { standard, lastValidDay, on, daysLeft }
  return daysLeft < limits.adviseWithinDays ? advisory(`${NAME}.ends-soon`, facts) : ok(`${NAME}.in-date`, facts)
}

function lastDayFromLabel(standard: HarnessStandardId, { labelYear }: Inputs, limits: Params, on: CivilDate): CivilDate | Judgement {
  if (labelYear === undefined) return missing(NAME, 'labelYear')
  const latestYear = Number(on.slice(0, 4)) + 5
  if (labelYear > latestYear) return undecided(`${NAME}.label-year-not-possible`, { labelYear, latestYear })
  const grace = standard === 'fia-8853-2016' && limits.reading === 'label-year-plus-five' ? 5 : 0
  return civilDate(`${labelYear + grace}-12-31`)
}

function lastDayFromMade({ madeYear, madeMonth }: Inputs, limits: Params, on: CivilDate): CivilDate | Judgement {
  if (madeYear === undefined) return missing(NAME, 'madeYear')
  const toTheDay = limits.sfiReading === 'to-the-day'
  if (toTheDay && madeMonth === undefined) return missing(NAME, 'madeMonth')
  const month = String(madeMonth ?? 1).padStart(2, '0')
  if (`${madeYear}-${month}-01` > on) return undecided(`${NAME}.made-in-future`, { madeYear, madeMonth: madeMonth ?? null, on })
  const lastYear = madeYear + limits.sfiLifeYears
  return civilDate(toTheDay ? `${lastYear}-${month}-01` : `${lastYear}-12-31`)
}

function expired(code: string, facts: Facts, limits: Params): Judgement {
  return limits.expiredIs === 'fail' ? fail(`${NAME}.${code}`, facts) : advisory(`${NAME}.${code}`, facts)
}
