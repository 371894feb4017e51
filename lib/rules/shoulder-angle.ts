import * as z from 'zod/mini'
import { numberBetween, yesNo } from './fields'
import { undecided } from './judgement'
import { rule } from './rule'

const inputs = z.object({
  /** Level distance rearward from where the strap leaves the seat back (or shoulder) to the anchor, mm. */
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

export const SHOULDER_ANGLE_DEFAULTS: z.infer<typeof params> = {
  failAboveDeg: 45,
  adviseAboveDeg: 20,
  failAboveWithHeadRestraintDeg: 20,
  adviseBelowDeg: 0,
  failBelowDeg: -10,
  failBelowWithHeadRestraintDeg: 0,
}

export const shoulderAngle = rule({
  name: 'shoulder-angle',
  title: 'Angle of the shoulder straps',
  inputs,
  params,
  defaults: SHOULDER_ANGLE_DEFAULTS,
  source: [],
  evaluate: () => undecided('shoulder-angle.run-missing'),
  explain: () => '',
})
