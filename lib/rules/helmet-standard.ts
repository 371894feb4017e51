import * as z from 'zod/mini'
import { oneOf, wholeBetween, yesNo } from './fields'
import { undecided } from './judgement'
import { rule } from './rule'
import { HELMET_STANDARD_IDS, NO_SECOND_LABEL } from './tables/helmet-standards'

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

const years = z.nullable(z.number().check(z.gte(0), z.lte(50)))
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

export const HELMET_STANDARD_DEFAULTS: z.infer<typeof params> = {
  body: 'track-day',
  maxAgeYears: 10,
  adviseOverYears: 5,
  motorcycleRated: 'advisory',
  notForCars: 'advisory',
  openFaceInOpenCar: 'fail',
  needsImpactAnswer: true,
}

export const helmetStandard = rule({
  name: 'helmet-standard',
  title: 'Helmet label, age and blows',
  inputs,
  params,
  defaults: HELMET_STANDARD_DEFAULTS,
  source: [],
  evaluate: () => undecided('helmet-standard.label-missing'),
  explain: () => '',
})
