/**
 * A fluid leak, by what leaks, how far it has gone and what it gets onto.
 *
 * Decides: a table of fluid group × class. wet = seepage or stain without drops; drops form = drops that stay; drops fall = one drop that falls
 * while being looked at. Units: none.
 * Edges: fuel, brake and clutch fluid fail at any wet, and no set of limits can loosen that. A leak that gets onto the exhaust, a tyre or a brake counts
 * one class worse (drops that fall are the worst class). Dry needs no fluid named. What it gets onto is asked only where it changes the outcome.
 * A fluid nobody could name is undecided. Water of the washer or the air conditioning is no leak.
 * Sources: below. The classes are quoted; the table between them is ours.
 */
import * as z from 'zod/mini'
import { oneOf } from './fields'
import { explainGap, missing } from './gap'
import { advisory, fail, ok, undecided, type Judgement, type Source } from './judgement'
import { labelOf } from './label-of'
import { rule } from './rule'
import {
  FLUID_IDS,
  FLUIDS,
  LEAK_CLASS_IDS,
  LEAK_CLASSES,
  LEAK_REACHES,
  LEAK_REACHES_IDS,
  type FluidId,
  type LeakClassId,
} from './tables/leak-fluids'

const NAME = 'leak-class'

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
type Params = z.infer<typeof params>

export const LEAK_CLASS_DEFAULTS: Params = {
  fuel: ['fail', 'fail', 'fail'],
  hydraulic: ['fail', 'fail', 'fail'],
  oil: ['note', 'recheck', 'fail'],
  coolant: ['advisory', 'recheck', 'fail'],
  damperOil: ['note', 'advisory', 'fail'],
  electrolyte: ['fail', 'fail', 'fail'],
  water: ['ok', 'ok', 'ok'],
  raiseWhenReaching: true,
}

const SOURCES: readonly Source[] = [
  {
    id: 'us-army-leakage',
    title: 'US Army technical manuals: leakage classes I to III, no fuel leak of any class',
    edition: 'TM 5-3805-290, TM 10-4330-232',
    confidence: 'quoted',
  },
  {
    id: 'uk-mot-1',
    title: 'UK inspection manual: any hydraulic leak of the brakes is dangerous',
    where: '1.1.11, 1.1.12',
    confidence: 'quoted',
  },
  { id: 'lockwire-leaks', title: 'Table of fluid and class; one class worse on exhaust, tyre or brake', confidence: 'ours' },
]

export const leakClass = rule({
  name: NAME,
  title: 'Fluid leak',
  inputs,
  params,
  defaults: LEAK_CLASS_DEFAULTS,
  source: SOURCES,
  evaluate({ fluid, leakClass: seen, reaches }, limits) {
    if (seen === undefined) return missing(NAME, 'leakClass')
    if (seen === 'dry') return ok(`${NAME}.dry`)
    if (fluid === undefined) return missing(NAME, 'fluid')
    if (FLUIDS[fluid].group === null) return undecided(`${NAME}.fluid-not-known`, { fluid, leakClass: seen })
    if (reaches !== undefined) return tabled(fluid, seen, reaches, limits)
    const onNothing = tabled(fluid, seen, 'nothing', limits)
    const decides = onNothing.outcome !== tabled(fluid, seen, 'exhaust', limits).outcome
    return decides ? missing(NAME, 'reaches', { fluid, leakClass: seen }) : onNothing
  },
  explain: explainLeakClass,
})

type Wet = Exclude<LeakClassId, 'dry'>
const WORSE: Readonly<Record<Wet, Wet>> = { wet: 'drops-form', 'drops-form': 'drops-fall', 'drops-fall': 'drops-fall' }
const COLUMN: Readonly<Record<Wet, 0 | 1 | 2>> = { wet: 0, 'drops-form': 1, 'drops-fall': 2 }

function tabled(fluid: FluidId, seen: Wet, reaches: (typeof LEAK_REACHES_IDS)[number], limits: Params): Judgement {
  const { group } = FLUIDS[fluid]
  if (group === null) return undecided(`${NAME}.fluid-not-known`, { fluid, leakClass: seen })
  const countedAs = limits.raiseWhenReaching && reaches !== 'nothing' ? WORSE[seen] : seen
  const facts = { fluid, leakClass: seen, reaches, countedAs }
  switch (limits[group][COLUMN[countedAs]]) {
    case 'ok':
      return ok(`${NAME}.no-matter`, facts)
    case 'note':
      return ok(`${NAME}.noted`, facts)
    case 'advisory':
      return advisory(`${NAME}.advised`, facts)
    case 'recheck':
      return advisory(`${NAME}.see-again`, facts)
    case 'fail':
      return fail(`${NAME}.leaks`, facts)
  }
}

const NAMES = { fluid: 'which fluid it is', leakClass: 'how far the leak has gone', reaches: 'what the leak gets onto' }

function explainLeakClass({ code, facts }: Pick<Judgement, 'code' | 'facts'>): string {
  const gap = explainGap({ code, facts }, NAMES)
  if (gap !== null) return gap
  if (code === 'leak-class.dry') return 'Dry.'
  const what = `${labelOf(FLUIDS, facts.fluid)}: ${labelOf(LEAK_CLASSES, facts.leakClass).toLowerCase()}`
  const onto =
    facts.reaches === 'nothing' || facts.reaches === undefined ? '' : `, onto ${labelOf(LEAK_REACHES, facts.reaches).toLowerCase()}`
  const raised = facts.countedAs === facts.leakClass ? '' : `, counted as “${labelOf(LEAK_CLASSES, facts.countedAs).toLowerCase()}”`
  const ends: Readonly<Record<string, string>> = {
    'leak-class.no-matter': 'no matter',
    'leak-class.noted': 'noted, may run',
    'leak-class.advised': 'advisory',
    'leak-class.see-again': 'advisory, to be seen again after the first session',
    'leak-class.leaks': 'may not run like this',
    'leak-class.fluid-not-known': 'not judged until somebody says what it is',
  }
  const end = Object.hasOwn(ends, code) ? ends[code] : undefined
  return end === undefined
    ? `Not judged here: this version does not know ${code}.`
    : `${what}${onto}${code.endsWith('not-known') ? '' : raised}; ${end}.`
}
