import * as z from 'zod/mini'
import { printedText } from './fields'
import { undecided } from './judgement'
import { rule } from './rule'

const inputs = z.object({
  /** The date code, or the whole identification number, as printed on the sidewall. */
  dateCode: printedText(40),
})

const years = z.int().check(z.gte(1), z.lte(20))
const params = z.strictObject({ failAtYears: years, adviseAtYears: years }).check(z.refine((p) => p.adviseAtYears <= p.failAtYears))

export const TYRE_AGE_DEFAULTS: z.infer<typeof params> = { failAtYears: 10, adviseAtYears: 6 }

export const tyreAge = rule({
  name: 'tyre-age',
  title: 'Age of the tyre',
  inputs,
  params,
  defaults: TYRE_AGE_DEFAULTS,
  source: [],
  evaluate: () => undecided('tyre-age.date-code-missing'),
  explain: () => '',
})
