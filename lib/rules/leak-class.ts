import * as z from 'zod/mini'
import { oneOf } from './fields'
import { undecided } from './judgement'
import { rule } from './rule'
import { FLUID_IDS, LEAK_CLASS_IDS, LEAK_REACHES_IDS } from './tables/leak-fluids'

const inputs = z.object({
  fluid: oneOf(FLUID_IDS),
  leakClass: oneOf(LEAK_CLASS_IDS),
  reaches: oneOf(LEAK_REACHES_IDS),
})

/** What a cell of the table may say; `note` is an ok with a note, `recheck` an advisory to be seen again after the first session. */
const cell = z.enum(['ok', 'note', 'advisory', 'recheck', 'fail'])
/** wet · drops form · drops fall */
const row = z.tuple([cell, cell, cell])
const mustFail = row.check(z.refine((cells) => cells.every((each) => each === 'fail')))

const params = z.strictObject({
  /** Any wet fails; no set of limits may loosen these two rows. */
  fuel: mustFail,
  hydraulic: mustFail,
  oil: row,
  coolant: row,
  damperOil: row,
  electrolyte: row,
  water: row,
  /** A leak that gets onto the exhaust, a tyre or a brake counts as one class worse. */
  raiseWhenReaching: z.boolean(),
})

export const LEAK_CLASS_DEFAULTS: z.infer<typeof params> = {
  fuel: ['fail', 'fail', 'fail'],
  hydraulic: ['fail', 'fail', 'fail'],
  oil: ['note', 'recheck', 'fail'],
  coolant: ['advisory', 'recheck', 'fail'],
  damperOil: ['note', 'advisory', 'fail'],
  electrolyte: ['fail', 'fail', 'fail'],
  water: ['ok', 'ok', 'ok'],
  raiseWhenReaching: true,
}

export const leakClass = rule({
  name: 'leak-class',
  title: 'Fluid leak',
  inputs,
  params,
  defaults: LEAK_CLASS_DEFAULTS,
  source: [],
  evaluate: () => undecided('leak-class.class-missing'),
  explain: () => '',
})
