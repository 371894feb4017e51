/**
 * Tread depth of one tyre.
 *
 * Decides: the smaller of the least reading in the central three quarters and the least at the inner edge, which camber wears first.
 * Units: mm. Edges: a depth equal to a limit is not below it (1.6 is not under 1.6; 2.0 is ok). One reading under the fail limit fails without
 * the other; otherwise both are needed. Equal readings are named as the central one.
 * Sources: below. The advisory band (wear during the day) is ours.
 */
import * as z from 'zod/mini'
import { numberBetween } from './fields'
import { figure } from './figure'
import { explainGap, missing } from './gap'
import { advisory, fail, ok, type Judgement, type Source } from './judgement'
import { rule } from './rule'
import { roundTo } from './units'

const NAME = 'tyre-tread'

const inputs = z.object({
  /** Least of the readings across the central three quarters of the tread, all round, mm. */
  leastMm: numberBetween(0, 20, 'mm'),
  /** Least at the inner edge, mm. */
  innerEdgeMm: numberBetween(0, 20, 'mm'),
})

const depth = z.number().check(z.gte(0), z.lte(20))
const params = z.strictObject({ failBelowMm: depth, adviseBelowMm: depth }).check(z.refine((p) => p.failBelowMm <= p.adviseBelowMm))

export const TYRE_TREAD_DEFAULTS: z.infer<typeof params> = { failBelowMm: 1.6, adviseBelowMm: 2.0 }

const SOURCES: readonly Source[] = [
  {
    id: 'gb-cu-27',
    title: 'Road Vehicles (Construction and Use) Regulations: 1.6 mm in the central three quarters',
    edition: '1986',
    where: 'reg. 27',
    confidence: 'second-hand',
  },
  {
    id: 'gb-tyre-defects',
    title: 'UK government guide to tyre defects: breadth of tread',
    edition: '9 December 2020',
    confidence: 'quoted',
  },
  { id: 'us-570', title: '49 CFR 570: 2/32 in, least of nine readings', confidence: 'quoted' },
  { id: 'lockwire-tread', title: 'Advisory under 2.0 mm for wear during the day; inner edge measured apart', confidence: 'ours' },
]

export const tyreTread = rule({
  name: NAME,
  title: 'Tread depth',
  inputs,
  params,
  defaults: TYRE_TREAD_DEFAULTS,
  source: SOURCES,
  evaluate({ leastMm, innerEdgeMm }, { failBelowMm, adviseBelowMm }) {
    if (leastMm === undefined && innerEdgeMm === undefined) return missing(NAME, 'leastMm')
    const treadMm = Math.min(leastMm ?? Infinity, innerEdgeMm ?? Infinity)
    const where = treadMm === leastMm ? 'centre' : 'inner-edge'
    if (treadMm < failBelowMm) return fail(`${NAME}.under-limit`, under(treadMm, failBelowMm, where))
    if (leastMm === undefined) return missing(NAME, 'leastMm')
    if (innerEdgeMm === undefined) return missing(NAME, 'innerEdgeMm')
    if (treadMm < adviseBelowMm) return advisory(`${NAME}.near-limit`, { ...under(treadMm, adviseBelowMm, where), failBelowMm })
    return ok(`${NAME}.deep-enough`, { treadMm, where, limitMm: adviseBelowMm })
  },
  explain: explainTyreTread,
})

function under(treadMm: number, limitMm: number, where: string) {
  return { treadMm, limitMm, byMm: roundTo(limitMm - treadMm, 6), where }
}

const NAMES = { leastMm: 'the least tread depth', innerEdgeMm: 'the depth at the inner edge' }

function explainTyreTread({ code, facts }: Pick<Judgement, 'code' | 'facts'>): string {
  const gap = explainGap({ code, facts }, NAMES)
  if (gap !== null) return gap
  const where = facts.where === 'inner-edge' ? 'at the inner edge' : 'across the tread'
  const [tread, limit, by] = [figure(facts, 'treadMm'), figure(facts, 'limitMm'), figure(facts, 'byMm')]
  switch (code) {
    case 'tyre-tread.under-limit':
      return `${tread} mm ${where} is ${by} mm under ${limit} mm.`
    case 'tyre-tread.near-limit':
      return `${tread} mm ${where} is under ${limit} mm; it fails under ${figure(facts, 'failBelowMm')} mm.`
    case 'tyre-tread.deep-enough':
      return `${tread} mm ${where}, at or over ${limit} mm.`
    default:
      return `Not judged here: this version does not know ${code}.`
  }
}
