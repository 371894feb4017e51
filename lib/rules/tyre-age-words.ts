import { counted, dateFigure, figure } from './figure'
import { explainGap } from './gap'
import type { Judgement } from './judgement'

/** The sentence for a judgement of a tyre's age. */
export function explainTyreAge({ code, facts }: Pick<Judgement, 'code' | 'facts'>): string {
  const gap = explainGap({ code, facts }, { dateCode: 'the date code' })
  if (gap !== null) return gap
  const week = figure(facts, 'week').padStart(2, '0')
  const made = `week ${week} of ${figure(facts, 'madeYear')}`
  const old = `${counted(figure(facts, 'ageYears'), 'year')} old`
  switch (code) {
    case 'tyre-age.too-old':
      return `Made ${made}, ${old}; the limit is ${figure(facts, 'limitYears')}.`
    case 'tyre-age.ageing':
    case 'tyre-age.young-enough':
      return `Made ${made}, ${old}; advisory from ${figure(facts, 'limitYears')}.`
    case 'tyre-age.before-2000':
      return `A date code of three digits is older than 2000: at least ${figure(facts, 'atLeastYears')} years; the limit is ${figure(facts, 'limitYears')}.`
    case 'tyre-age.decade-unknown':
      return 'Not judged: a date code of three digits does not say its decade.'
    case 'tyre-age.in-the-future':
      return `Not judged: ${made} begins on ${dateFigure(facts, 'weekStart')}, after ${dateFigure(facts, 'on')}.`
    case 'tyre-age.no-such-week':
      return facts.madeYear === null ? `Not judged: there is no week ${week}.` : `Not judged: there is no ${made}.`
    case 'tyre-age.letters-never-used':
      return `Not judged: G, I, O, Q, S and Z are never used in a tyre’s marking.${suggested(facts.suggestion)}`
    case 'tyre-age.no-date':
      return 'Not judged: this marking carries no date; look at the other sidewall.'
    case 'tyre-age.unreadable':
      return `Not judged: ${figure(facts, 'dateCode')} is no date code. Enter the last four digits, week and year.`
    default:
      return `Not judged here: this version does not know ${code}.`
  }
}

function suggested(suggestion: unknown): string {
  return typeof suggestion === 'string' ? ` Did you mean ${suggestion}?` : ''
}
