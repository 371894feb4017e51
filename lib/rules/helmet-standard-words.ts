import { counted, dateFigure, figure } from './figure'
import { explainGap } from './gap'
import type { Fact, Judgement } from './judgement'
import { labelOf } from './label-of'
import { HELMET_STANDARDS } from './tables/helmet-standards'

const NAMES = {
  label: 'the label in the helmet',
  labels: 'the labels in the helmet',
  secondLabel: 'the second label',
  face: 'whether it is full face',
  openCar: 'whether the car is open',
  madeYear: 'the year it was made',
  madeMonth: 'the month it was made',
  impact: 'whether it has taken a blow',
}
const BODIES: Readonly<Record<string, { readonly label: string }>> = {
  'track-day': { label: 'on a track day' },
  'asn-uk': { label: 'under the UK national rules' },
  fia: { label: 'under the FIA list' },
}

/** The sentence for a judgement of a helmet. */
export function explainHelmetStandard({ code, facts }: Pick<Judgement, 'code' | 'facts'>): string {
  const gap = explainGap({ code, facts }, NAMES)
  if (gap !== null) return gap
  const standard = labelOf(HELMET_STANDARDS, facts.standard)
  const body = labelOf(BODIES, facts.body)
  switch (code) {
    case 'helmet-standard.accepted':
      return `${standard} is accepted ${body}${facts.lastValidDay === null ? '' : ` to ${dateFigure(facts, 'lastValidDay')}`}${wornClosed(facts.wornClosed)}.`
    case 'helmet-standard.ended':
      return `${standard} was accepted ${body} to ${dateFigure(facts, 'lastValidDay')}; this is ${dateFigure(facts, 'on')}.`
    case 'helmet-standard.not-accepted':
      return `${standard} is not accepted ${body}.`
    case 'helmet-standard.not-on-record':
      return `Not judged: we have not read whether ${standard} is accepted ${body}. The chief decides.`
    case 'helmet-standard.not-a-helmet-label':
      return `${standard} is the label of other kit (head-restraint posts or clothing), not of a helmet.`
    case 'helmet-standard.no-label':
      return 'No label can be read.'
    case 'helmet-standard.motorcycle-rated':
      return `${standard}: made for motorcycles or karts, not for cars.`
    case 'helmet-standard.not-for-cars':
      return `${standard}: not a standard for cars at speed.`
    case 'helmet-standard.motocross':
      return 'A motocross helmet is not accepted.'
    case 'helmet-standard.open-face-in-open-car':
      return 'An open face in an open car: full face is asked there.'
    case 'helmet-standard.took-a-blow':
      return 'It has taken a blow: not to be worn until the maker has passed it or it is replaced.'
    case 'helmet-standard.too-old':
      return `Made ${made(facts)}, ${counted(figure(facts, 'ageYears'), 'year')} old: over the limit of ${figure(facts, 'limitYears')} years.`
    case 'helmet-standard.ageing':
      return `Made ${made(facts)}, ${counted(figure(facts, 'ageYears'), 'year')} old; advisory over ${figure(facts, 'limitYears')}.`
    case 'helmet-standard.age-unknown':
      return 'Its age is not known.'
    case 'helmet-standard.made-in-future':
      return `Not judged: made ${made(facts)} lies after ${dateFigure(facts, 'on')}.`
    default:
      return `Not judged here: this version does not know ${code}.`
  }
}

function made(facts: Judgement['facts']): string {
  const month = facts.madeMonth
  return typeof month === 'number' ? `${figure(facts, 'madeYear')}-${String(month).padStart(2, '0')}` : figure(facts, 'madeYear')
}

function wornClosed(value: Fact | undefined): string {
  return value === true ? ', worn closed' : ''
}
