import * as z from 'zod/mini'
import { parseCivilDate } from './civil-date'
import { oneOf, wholeBetween, yesNo } from './fields'
import { undecided } from './judgement'
import { rule } from './rule'
import { HARNESS_SOURCES, HARNESS_STANDARD_IDS } from './tables/harness-standards'

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

export const HARNESS_VALIDITY_DEFAULTS: z.infer<typeof params> = {
  reading: 'label-year',
  sfiReading: 'to-the-day',
  sfiLifeYears: 2,
  standardEnds8853_98: null,
  adviseWithinDays: 60,
  expiredIs: 'fail',
}

export const harnessValidity = rule({
  name: 'harness-validity',
  title: 'Harness labels and date',
  inputs,
  params,
  defaults: HARNESS_VALIDITY_DEFAULTS,
  source: HARNESS_SOURCES,
  evaluate: () => undecided('harness-validity.standard-missing'),
  explain: () => '',
})
