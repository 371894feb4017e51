/**
 * How steeply the shoulder straps run down behind the seat, seen from the side.
 *
 * Decides: angle below the horizontal = atan2(drop, run), from the point where the strap leaves the top of the seat back to its anchor.
 * Steep straps press the spine together in a crash (per strap, sin 45° = 0.71 of its pull); climbing straps slide off the shoulders.
 * Units: mm and degrees; a positive angle runs down.
 * Edges: every limit is inclusive (exactly 45° is not over 45°), decided on the exact angle within 1e-9°; no dead band is taken off for the tape.
 * The figure shown is rounded to 0.1°, finer where 0.1° would land on the limit. With a head restraint the narrower band fails. Whether one is worn
 * is asked only where it changes the outcome.
 * Sources: below. The limits of 45°, 20° and −10° are taken together from several books; the split into advisory and fail is ours.
 */
import * as z from 'zod/mini'
import { isYes, numberBetween, yesNo } from './fields'
import { missing } from './gap'
import { advisory, fail, ok, undecided, type Judgement, type Source } from './judgement'
import { rule } from './rule'
import { explainShoulderAngle } from './shoulder-angle-words'
import { angleBelowHorizontal, isAbove, isBelow, mm, roundBeside, roundTo, type Deg } from './units'

const NAME = 'shoulder-angle'

const inputs = z.object({
  /** Level distance rearward from where the strap leaves the seat back to the anchor, mm. */
  runMm: numberBetween(0, 3000, 'mm'),
  /** How far the anchor lies below that point, mm; negative when it lies above. */
  dropMm: numberBetween(-1500, 3000, 'mm'),
  /** A frontal head restraint is worn with these belts. */
  headRestraint: yesNo(),
})

const angle = z.number().check(z.gte(-90), z.lte(90))
const params = z
  .strictObject({
    failAboveDeg: angle,
    adviseAboveDeg: angle,
    failAboveWithHeadRestraintDeg: angle,
    adviseBelowDeg: angle,
    failBelowDeg: angle,
    failBelowWithHeadRestraintDeg: angle,
  })
  .check(
    z.refine((p) => p.failBelowDeg <= p.adviseBelowDeg && p.adviseBelowDeg <= p.adviseAboveDeg && p.adviseAboveDeg <= p.failAboveDeg),
    z.refine((p) => p.failBelowWithHeadRestraintDeg >= p.failBelowDeg && p.failAboveWithHeadRestraintDeg <= p.failAboveDeg),
    z.refine((p) => p.failBelowWithHeadRestraintDeg <= p.failAboveWithHeadRestraintDeg),
  )
type Params = z.infer<typeof params>

export const SHOULDER_ANGLE_DEFAULTS: Params = {
  failAboveDeg: 45,
  adviseAboveDeg: 20,
  failAboveWithHeadRestraintDeg: 20,
  adviseBelowDeg: 0,
  failBelowDeg: -10,
  failBelowWithHeadRestraintDeg: 0,
}

const SOURCES: readonly Source[] = [
  {
    id: 'fia-j-253-6',
    title: 'FIA Appendix J, article 253: rearward and downward, not over 45°',
    edition: '1996 and 2013',
    where: 'art. 6.2',
    confidence: 'quoted',
  },
  { id: 'cams-i', title: 'Motorsport Australia, schedule I: not over 45° from the shoulder', edition: 'about 2014', confidence: 'quoted' },
  { id: 'fhr-manual', title: 'Installation manual of a harness maker: 0° to 20° with a head restraint', confidence: 'quoted' },
  {
    id: 'fsae-t5',
    title: 'Formula SAE rules: 10° above to 20° below',
    edition: '2014 and 2021',
    where: 'T5.4, T.2.4',
    confidence: 'quoted',
  },
  { id: 'lockwire-shoulder', title: 'Advisory from 20° to 45° and from 0° to −10° without a head restraint', confidence: 'ours' },
]

export const shoulderAngle = rule({
  name: NAME,
  title: 'Angle of the shoulder straps',
  inputs,
  params,
  defaults: SHOULDER_ANGLE_DEFAULTS,
  source: SOURCES,
  evaluate({ runMm, dropMm, headRestraint }, limits) {
    if (runMm === undefined) return missing(NAME, 'runMm')
    if (dropMm === undefined) return missing(NAME, 'dropMm')
    if (runMm === 0 && dropMm === 0) return undecided(`${NAME}.no-distance`, { runMm, dropMm })
    const exact = angleBelowHorizontal(mm(runMm), mm(dropMm))
    const worn = isYes(headRestraint)
    if (worn !== undefined) return banded(exact, worn, limits)
    const without = banded(exact, false, limits)
    const decides = without.outcome !== banded(exact, true, limits).outcome
    return decides ? missing(NAME, 'headRestraint', { angleDeg: roundTo(exact, 1) }) : without
  },
  explain: explainShoulderAngle,
})

function banded(exact: Deg, headRestraint: boolean, limits: Params): Judgement {
  const most = headRestraint ? limits.failAboveWithHeadRestraintDeg : limits.failAboveDeg
  const least = headRestraint ? limits.failBelowWithHeadRestraintDeg : limits.failBelowDeg
  if (isAbove(exact, most)) return fail(`${NAME}.over-limit`, against(exact, most, headRestraint))
  if (isBelow(exact, least)) return fail(`${NAME}.under-limit`, against(exact, least, headRestraint))
  if (isAbove(exact, limits.adviseAboveDeg)) return advisory(`${NAME}.steep`, against(exact, limits.adviseAboveDeg, headRestraint))
  if (isBelow(exact, limits.adviseBelowDeg)) return advisory(`${NAME}.climbs`, against(exact, limits.adviseBelowDeg, headRestraint))
  const fromDeg = Math.max(least, limits.adviseBelowDeg)
  const toDeg = Math.min(most, limits.adviseAboveDeg)
  return ok(`${NAME}.within-limits`, { angleDeg: roundTo(exact, 1), fromDeg, toDeg, headRestraint })
}

function against(exact: Deg, limitDeg: number, headRestraint: boolean) {
  const angleDeg = roundBeside(exact, limitDeg, 1)
  return { angleDeg, limitDeg, byDeg: roundTo(Math.abs(angleDeg - limitDeg), 6), headRestraint }
}
