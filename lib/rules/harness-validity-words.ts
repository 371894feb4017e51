import { counted, dateFigure, figure } from './figure'
import { explainGap } from './gap'
import type { Judgement } from './judgement'
import { labelOf } from './label-of'
import { HARNESS_STANDARDS } from './tables/harness-standards'

const NAMES = {
  standard: 'the standard on the label',
  labelYear: 'the year on the label',
  madeYear: 'the year it was made',
  madeMonth: 'the month it was made',
  labelsComplete: 'whether every strap has its label',
  labelsSameNumber: 'whether all straps carry one number',
}

/** The sentence for a judgement of the harness labels. */
export function explainHarnessValidity({ code, facts }: Pick<Judgement, 'code' | 'facts'>): string {
  const gap = explainGap({ code, facts }, NAMES)
  if (gap !== null) return gap
  const standard = labelOf(HARNESS_STANDARDS, facts.standard)
  const last = dateFigure(facts, 'lastValidDay')
  switch (code) {
    case 'harness-validity.mixed-numbers':
      return 'The straps carry different homologation numbers: parts of different sets may not be mixed.'
    case 'harness-validity.no-readable-label':
      return 'No label can be read: the set counts as expired.'
    case 'harness-validity.labels-missing':
      return `A label is missing or cannot be read: the ${standard} set counts as expired.`
    case 'harness-validity.road-belt-undated':
      return 'A road belt has no end date: its condition decides.'
    case 'harness-validity.label-year-not-possible':
      return `Not judged: a label cannot say ${figure(facts, 'labelYear')} yet; the latest printed so far is ${figure(facts, 'latestYear')}.`
    case 'harness-validity.made-in-future':
      return `Not judged: made ${figure(facts, 'madeYear')} lies after ${dateFigure(facts, 'on')}.`
    case 'harness-validity.standard-ended':
      return `${standard} itself ended on ${last}, ${counted(figure(facts, 'daysOver'), 'day')} before ${dateFigure(facts, 'on')}, whatever the label says.`
    case 'harness-validity.expired':
      return `${standard}: last valid day ${last}, ${counted(figure(facts, 'daysOver'), 'day')} before ${dateFigure(facts, 'on')}.`
    case 'harness-validity.ends-soon':
      return `${standard}: valid to ${last}, ${counted(figure(facts, 'daysLeft'), 'day')} left.`
    case 'harness-validity.in-date':
      return `${standard}: valid to ${last}.`
    default:
      return `Not judged here: this version does not know ${code}.`
  }
}
