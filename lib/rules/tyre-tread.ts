import * as z from 'zod/mini'
import { numberBetween } from './fields'
import { undecided } from './judgement'
import { rule } from './rule'

const inputs = z.object({
  /** Least of the readings across the central three quarters of the tread, all round, mm. */
  leastMm: numberBetween(0, 20, 'mm'),
  /** Least at the inner edge, mm. */
  innerEdgeMm: numberBetween(0, 20, 'mm'),
})

const depth = z.number().check(z.gte(0), z.lte(20))
const params = z.strictObject({ failBelowMm: depth, adviseBelowMm: depth }).check(z.refine((p) => p.failBelowMm <= p.adviseBelowMm))

export const TYRE_TREAD_DEFAULTS: z.infer<typeof params> = { failBelowMm: 1.6, adviseBelowMm: 2.0 }

export const tyreTread = rule({
  name: 'tyre-tread',
  title: 'Tread depth',
  inputs,
  params,
  defaults: TYRE_TREAD_DEFAULTS,
  source: [],
  evaluate: () => undecided('tyre-tread.least-missing'),
  explain: () => '',
})
