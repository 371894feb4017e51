import { figure } from './figure'
import { explainGap } from './gap'
import type { Judgement } from './judgement'

const NAMES = {
  runMm: 'the run of the straps behind the seat',
  dropMm: 'the drop of the straps behind the seat',
  headRestraint: 'whether a head restraint is worn',
}

/** The sentence for a judgement of the shoulder straps' angle. */
export function explainShoulderAngle({ code, facts }: Pick<Judgement, 'code' | 'facts'>): string {
  const gap = explainGap({ code, facts }, NAMES)
  if (gap !== null) return facts.angleDeg === undefined ? gap : `${gap} The straps run ${figure(facts, 'angleDeg')}° down.`
  const [angle, limit, by] = [figure(facts, 'angleDeg'), figure(facts, 'limitDeg'), figure(facts, 'byDeg')]
  const worn = facts.headRestraint === true ? ' with a head restraint' : ''
  switch (code) {
    case 'shoulder-angle.over-limit':
      return `${angle}° is ${by}° over the limit of ${limit}°${worn}.`
    case 'shoulder-angle.under-limit':
      return `${angle}° is ${by}° under the limit of ${limit}°${worn}: the straps climb to their anchor.`
    case 'shoulder-angle.steep':
      return `${angle}° is within the limit, ${by}° over the advised ${limit}°.`
    case 'shoulder-angle.climbs':
      return `${angle}°: the straps climb to their anchor, ${by}° under the advised ${limit}°.`
    case 'shoulder-angle.within-limits':
      return `${angle}° lies between ${figure(facts, 'fromDeg')}° and ${figure(facts, 'toDeg')}°${worn}.`
    case 'shoulder-angle.no-distance':
      return 'Not judged: with no run and no drop there is no angle.'
    default:
      return `Not judged here: this version does not know ${code}.`
  }
}
