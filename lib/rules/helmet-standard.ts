/**
 * Whether a helmet's label, age, face and history make it acceptable on a day.
 *
 * Decides: blows, label and its end date with the chosen body, face against the car, age. The most severe of the four stands.
 * Units: civil dates, whole years. Judged on the event's last day.
 * Edges: the last day of a standard is still accepted. Of several labels the best counts (a helmet of an ended Snell standard with an FIA label is taken).
 * FIA 8858 belongs to head-restraint posts and 8856 to clothing: neither makes a helmet. A label a body's list, as far as we have read it, does not
 * mention is undecided. Age runs from the *first* day of the month of making, the oldest it can be, and is over a limit the day after the anniversary;
 * with the year alone it is judged only where no month would change a fail. An unknown age is an advisory where age is judged.
 * An ECE J label or an open face counts as open; ECE P/J as full only when said to be (worn closed). Whether the car is open, or the face
 * full, is asked only where it matters. A motocross helmet fails.
 * Sources: `tables/helmet-standards.ts`.
 */
import * as z from 'zod/mini'
import { isYes, oneOf, wholeBetween, yesNo } from './fields'
import { missing, worstOf } from './gap'
import { ageJudged } from './helmet-age'
import { bestLabel } from './helmet-label'
import { explainHelmetStandard } from './helmet-standard-words'
import { advisory, fail, type Judgement } from './judgement'
import { rule } from './rule'
import { HELMET_SOURCES, HELMET_STANDARD_IDS, HELMET_STANDARDS, NO_SECOND_LABEL, type HelmetStandardId } from './tables/helmet-standards'

const NAME = 'helmet-standard'

const inputs = z.object({
  /** Every label found in the helmet; or, as the walk asks it, `label` and `secondLabel`. */
  labels: z.optional(z.array(z.enum(HELMET_STANDARD_IDS, { error: 'one of the list' }), { error: 'a list of labels' })),
  label: oneOf(HELMET_STANDARD_IDS),
  secondLabel: oneOf([...HELMET_STANDARD_IDS, NO_SECOND_LABEL]),
  face: oneOf(['full', 'open', 'motocross']),
  openCar: yesNo(),
  madeYear: wholeBetween(1970, 2099),
  madeMonth: wholeBetween(1, 12),
  /** It has taken a blow. */
  impact: yesNo(),
})
type Inputs = z.infer<typeof inputs>

const years = z.nullable(z.int().check(z.gte(0), z.lte(50)))
const params = z
  .strictObject({
    /** Whose end dates count. */
    body: z.enum(['track-day', 'asn-uk', 'fia']),
    /** Older than this fails; null: age is not judged. */
    maxAgeYears: years,
    /** Older than this is noted; null: not noted. */
    adviseOverYears: years,
    /** A motorcycle or karting label (Snell M, Snell K). */
    motorcycleRated: z.enum(['advisory', 'fail']),
    /** A label not made for cars at speed (DOT alone, youth karting CM). */
    notForCars: z.enum(['advisory', 'fail']),
    openFaceInOpenCar: z.enum(['advisory', 'fail']),
    /** Whether "has it taken a blow?" must be answered here; false only where another check asks it. */
    needsImpactAnswer: z.boolean(),
  })
  .check(z.refine((p) => p.maxAgeYears === null || p.adviseOverYears === null || p.adviseOverYears <= p.maxAgeYears))
type Params = z.infer<typeof params>

export const HELMET_STANDARD_DEFAULTS: Params = {
  body: 'track-day',
  maxAgeYears: 10,
  adviseOverYears: 5,
  motorcycleRated: 'advisory',
  notForCars: 'advisory',
  openFaceInOpenCar: 'fail',
  needsImpactAnswer: true,
}

export const helmetStandard = rule({
  name: NAME,
  title: 'Helmet label, age and blows',
  inputs,
  params,
  defaults: HELMET_STANDARD_DEFAULTS,
  source: HELMET_SOURCES,
  evaluate(given, limits, on) {
    const blow = isYes(given.impact)
    if (blow === true) return fail(`${NAME}.took-a-blow`)
    const labels = labelsOf(given)
    return worstOf(
      bestLabel(labels, limits, on) ?? missing(NAME, 'label'),
      ...faceJudged(labels, given, limits),
      ...ageJudged(given, limits, on),
      ...(blow === undefined && limits.needsImpactAnswer ? [missing(NAME, 'impact')] : []),
    )
  },
  explain: explainHelmetStandard,
})

function labelsOf({ labels, label, secondLabel }: Inputs): readonly HelmetStandardId[] {
  const second = secondLabel === undefined || secondLabel === NO_SECOND_LABEL ? [] : [secondLabel]
  return [...new Set([...(labels ?? []), ...(label === undefined ? [] : [label]), ...second])]
}

function faceJudged(labels: readonly HelmetStandardId[], given: Inputs, limits: Params): Judgement[] {
  if (given.face === 'motocross') return [fail(`${NAME}.motocross`)]
  const faceIsOpen = isOpenFace(labels, given.face)
  const carIsOpen = isYes(given.openCar)
  if (faceIsOpen === false || carIsOpen === false) return []
  if (carIsOpen === undefined) return [missing(NAME, 'openCar')]
  if (faceIsOpen === undefined) return [missing(NAME, 'face')]
  const code = `${NAME}.open-face-in-open-car`
  return [limits.openFaceInOpenCar === 'fail' ? fail(code) : advisory(code)]
}

/** What is seen and what the labels say, the more severe; undefined where neither tells. */
function isOpenFace(labels: readonly HelmetStandardId[], face: Inputs['face']): boolean | undefined {
  const said = labels.map((label) => HELMET_STANDARDS[label].face)
  if (face === 'open' || said.includes('open')) return true
  return face === 'full' || said.includes('full') ? false : undefined
}
