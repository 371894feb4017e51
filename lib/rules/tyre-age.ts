/**
 * Age of a tyre from its date code as printed.
 *
 * Decides: whole calendar years from the first day of the production week (the oldest it can be) to the event's last day.
 * Units: years. Edges: both limits are inclusive, from the anniversary of that Sunday on; week 53 only in years that have 53 Sundays after
 * the count begins; week 00, weeks over 53 and weeks that begin after the event are refused, not guessed. Three digits mean before 2000, the
 * decade unknown: at least as old as if made on the last day of 1999. The letters G I O Q S Z are never used in a marking: refused, with
 * what was probably meant. What cannot be read is undecided, never ok.
 * Sources: below. That codes had three digits until 1999 is the rule-maker's; the limits are a default of ours between industry advice and law.
 */
import * as z from 'zod/mini'
import { civilDate, wholeYearsBetween, type CivilDate } from './civil-date'
import { printedText } from './fields'
import { missing } from './gap'
import { advisory, fail, ok, undecided, type Judgement, type Source } from './judgement'
import { rule } from './rule'
import { explainTyreAge } from './tyre-age-words'
import { readTyreDateCode } from './tyre-date-code'

const NAME = 'tyre-age'

const inputs = z.object({
  /** The date code, or the whole identification number, as printed on the sidewall. */
  dateCode: printedText(40),
})

const years = z.int().check(z.gte(1), z.lte(20))
const params = z.strictObject({ failAtYears: years, adviseAtYears: years }).check(z.refine((p) => p.adviseAtYears <= p.failAtYears))
type Params = z.infer<typeof params>

export const TYRE_AGE_DEFAULTS: Params = { failAtYears: 10, adviseAtYears: 6 }

const SOURCES: readonly Source[] = [
  {
    id: 'us-574',
    title: '49 CFR 574.5, tyre identification number',
    edition: '80 FR 19553, 13 April 2015',
    where: '(a)',
    confidence: 'quoted',
  },
  { id: 'us-574-1999', title: '64 FR 36807: date code of four digits instead of three', edition: '8 July 1999', confidence: 'quoted' },
  { id: 'us-574-week', title: 'Week 01 is the first full week of the year, Sunday to Saturday', confidence: 'second-hand' },
  { id: 'us-574-letters', title: '49 CFR 574.5: letters used in a marking', where: '(f)', confidence: 'from memory: confirm' },
  { id: 'tyre-industry-age', title: 'Tyre industry advice to car owners: withdraw at ten years', confidence: 'quoted' },
  { id: 'car-makers-age', title: 'Several car makers: replace at six years', confidence: 'second-hand' },
  { id: 'lockwire-tyre-age', title: 'Fail from 10 years, advisory from 6', confidence: 'ours' },
]

export const tyreAge = rule({
  name: NAME,
  title: 'Age of the tyre',
  inputs,
  params,
  defaults: TYRE_AGE_DEFAULTS,
  source: SOURCES,
  evaluate({ dateCode }, limits, on) {
    if (dateCode === undefined) return missing(NAME, 'dateCode')
    const read = readTyreDateCode(dateCode)
    switch (read.kind) {
      case 'empty':
        return missing(NAME, 'dateCode')
      case 'week':
        return aged(read.week, read.year, read.start, limits, on)
      case 'before-2000':
        return agedBefore2000(read.week, limits, on)
      case 'no-such-week':
        return undecided(`${NAME}.no-such-week`, { dateCode, week: read.week, madeYear: read.year })
      case 'letters-never-used':
        return undecided(`${NAME}.letters-never-used`, { dateCode, suggestion: read.suggestion })
      case 'no-date':
        return undecided(`${NAME}.no-date`, { dateCode })
      case 'unreadable':
        return undecided(`${NAME}.unreadable`, { dateCode })
    }
  },
  explain: explainTyreAge,
})

function aged(week: number, madeYear: number, weekStart: CivilDate, limits: Params, on: CivilDate): Judgement {
  if (weekStart > on) return undecided(`${NAME}.in-the-future`, { week, madeYear, weekStart, on })
  const ageYears = wholeYearsBetween(weekStart, on)
  const facts = { week, madeYear, weekStart, ageYears }
  if (ageYears >= limits.failAtYears) return fail(`${NAME}.too-old`, { ...facts, limitYears: limits.failAtYears })
  if (ageYears >= limits.adviseAtYears) return advisory(`${NAME}.ageing`, { ...facts, limitYears: limits.adviseAtYears })
  return ok(`${NAME}.young-enough`, { ...facts, limitYears: limits.adviseAtYears })
}

function agedBefore2000(week: number, limits: Params, on: CivilDate): Judgement {
  const atLeastYears = wholeYearsBetween(civilDate('1999-12-31'), on)
  const facts = { week, atLeastYears, limitYears: limits.failAtYears }
  return atLeastYears >= limits.failAtYears ? fail(`${NAME}.before-2000`, facts) : undecided(`${NAME}.decade-unknown`, facts)
}
