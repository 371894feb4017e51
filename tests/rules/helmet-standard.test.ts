import { describe, expect, test } from 'vitest'
import { civilDate } from '@/lib/rules/civil-date'
import { explainJudgement } from '@/lib/rules/explain'
import { HELMET_STANDARD_DEFAULTS } from '@/lib/rules/helmet-standard'
import { judge } from '@/lib/rules/judge'
import { HELMET_STANDARD_IDS, HELMET_STANDARDS } from '@/lib/rules/tables/helmet-standards'

type Limits = Partial<typeof HELMET_STANDARD_DEFAULTS>
const SOUND = { face: 'full', openCar: false, impact: false, madeYear: 2024, madeMonth: 5 }
const UK: Limits = { body: 'asn-uk', maxAgeYears: null, adviseOverYears: null }
const FIA: Limits = { ...UK, body: 'fia' }

function judged(inputs: Record<string, unknown>, on = '2026-06-01', limits: Limits = {}) {
  return judge('helmet-standard', { ...SOUND, ...inputs }, { ...HELMET_STANDARD_DEFAULTS, ...limits }, civilDate(on))
}

describe('helmet-standard: label', () => {
  test.each<[string, Record<string, unknown>, string, Limits, string, string]>([
    ['SA2015 to the last day of 2026 in the UK', { label: 'snell-sa2015' }, '2026-12-31', UK, 'ok', 'accepted'],
    ['not a day longer', { label: 'snell-sa2015' }, '2027-01-01', UK, 'fail', 'ended'],
    ['SA2015 to the end of 2023 with the FIA', { label: 'snell-sa2015' }, '2024-01-01', FIA, 'fail', 'ended'],
    ['8860-2010 to the last day of 2028', { label: 'fia-8860-2010' }, '2028-12-31', UK, 'ok', 'accepted'],
    ['not a day longer either', { label: 'fia-8860-2010' }, '2029-01-01', UK, 'fail', 'ended'],
    ['8858 is the label of the posts', { label: 'fia-8858' }, '2026-06-01', {}, 'fail', 'not-a-helmet-label'],
    ['8856 is the label of clothing', { label: 'fia-8856' }, '2026-06-01', {}, 'fail', 'not-a-helmet-label'],
    ['8858 beside a helmet label does no harm', { label: 'fia-8858', secondLabel: 'snell-sa2020' }, '2026-06-01', {}, 'ok', 'accepted'],
    ['an FIA label beside an ended Snell', { label: 'snell-sa2010', secondLabel: 'fia-8859-2015' }, '2025-06-01', UK, 'ok', 'accepted'],
    ['the same as a list', { labels: ['snell-sa2010', 'fia-8859-2015'] }, '2025-06-01', UK, 'ok', 'accepted'],
    ['the ended Snell alone', { label: 'snell-sa2010', secondLabel: 'none' }, '2025-06-01', UK, 'fail', 'ended'],
    ['a road label on a track day', { label: 'ece-22.06-p' }, '2026-06-01', {}, 'ok', 'accepted'],
    ['a road label in UK racing', { label: 'ece-22.06-p' }, '2026-06-01', UK, 'fail', 'not-accepted'],
    ['a motorcycle label on a track day', { label: 'snell-m' }, '2026-06-01', {}, 'advisory', 'motorcycle-rated'],
    [
      'a motorcycle label where only SA is taken',
      { label: 'snell-m' },
      '2026-06-01',
      { motorcycleRated: 'fail' },
      'fail',
      'motorcycle-rated',
    ],
    ['DOT alone', { label: 'dot-only' }, '2026-06-01', {}, 'advisory', 'not-for-cars'],
    ['DOT alone where it is refused', { label: 'dot-only' }, '2026-06-01', { notForCars: 'fail' }, 'fail', 'not-for-cars'],
    ['no label to be read', { label: 'none-readable' }, '2026-06-01', {}, 'fail', 'no-label'],
    ['a label whose standing we have not read', { label: 'snell-sa2025' }, '2026-06-01', UK, 'undecided', 'not-on-record'],
  ])('%s', (_promise, inputs, on, limits, outcome, code) => {
    expect(judged(inputs, on, limits)).toMatchObject({ outcome, code: `helmet-standard.${code}` })
  })

  test('the walk’s list names every label differently', () => {
    expect(new Set(HELMET_STANDARD_IDS.map((id) => HELMET_STANDARDS[id].label)).size).toBe(HELMET_STANDARD_IDS.length)
  })

  test('the trap is said in words', () => {
    const { code, facts } = judged({ label: 'fia-8858' })
    expect(explainJudgement(code, facts)).toContain('not of a helmet')
  })
})

describe('helmet-standard: face', () => {
  test.each<[string, Record<string, unknown>, string]>([
    ['jet in an open car', { label: 'ece-22.05-j', openCar: true }, 'fail'],
    ['jet in a closed car', { label: 'ece-22.05-j', openCar: false }, 'ok'],
    ['jet said to be full face, in an open car', { label: 'ece-22.05-j', face: 'full', openCar: true }, 'fail'],
    ['P/J worn closed in an open car', { label: 'ece-22.06-p-j', face: 'full', openCar: true }, 'ok'],
    ['P/J worn open in an open car', { label: 'ece-22.06-p-j', face: 'open', openCar: true }, 'fail'],
    ['P/J in an open car, nothing said', { label: 'ece-22.06-p-j', face: undefined, openCar: true }, 'undecided'],
    ['P in an open car, nothing said', { label: 'ece-22.06-p', face: undefined, openCar: true }, 'ok'],
    ['open face in an open car', { label: 'snell-sa2020', face: 'open', openCar: 'yes' }, 'fail'],
    ['full face in an open car', { label: 'snell-sa2020', face: 'full', openCar: true }, 'ok'],
    ['open face, car not known', { label: 'snell-sa2020', face: 'open', openCar: undefined }, 'undecided'],
    ['full face, car not known', { label: 'snell-sa2020', face: 'full', openCar: undefined }, 'ok'],
    ['face not known in a closed car', { label: 'snell-sa2020', face: undefined, openCar: false }, 'ok'],
    ['face not known in an open car', { label: 'snell-sa2020', face: undefined, openCar: true }, 'undecided'],
    ['motocross anywhere', { label: 'ece-22.06-p', face: 'motocross', openCar: false }, 'fail'],
  ])('%s', (_promise, inputs, outcome) => {
    expect(judged(inputs).outcome).toBe(outcome)
  })

  test('an open car that is not known is named as what is missing', () => {
    expect(judged({ label: 'ece-22.06-j', openCar: null })).toMatchObject({
      code: 'helmet-standard.missing',
      facts: { missing: 'openCar' },
    })
  })
})

describe('helmet-standard: age and blows', () => {
  const label = 'snell-sa2020'
  test.each<[string, Record<string, unknown>, string, string]>([
    ['ten years and a month', { madeYear: 2016, madeMonth: 11 }, '2026-12-01', 'fail'],
    ['ten years to the day', { madeYear: 2016, madeMonth: 12 }, '2026-12-01', 'advisory'],
    ['a day over ten years', { madeYear: 2016, madeMonth: 12 }, '2026-12-02', 'fail'],
    ['six years', { madeYear: 2020, madeMonth: 1 }, '2026-12-01', 'advisory'],
    ['five years to the day', { madeYear: 2021, madeMonth: 12 }, '2026-12-01', 'ok'],
    ['a day over five years', { madeYear: 2021, madeMonth: 12 }, '2026-12-02', 'advisory'],
    ['two years', { madeYear: 2024, madeMonth: 5 }, '2026-12-01', 'ok'],
    ['unknown', { madeYear: undefined, madeMonth: undefined }, '2026-12-01', 'advisory'],
    ['the year alone, every month too old', { madeYear: 2015, madeMonth: undefined }, '2026-12-01', 'fail'],
    ['the year alone, some months too old', { madeYear: 2016, madeMonth: undefined }, '2026-12-01', 'undecided'],
    ['the year alone, no month too old', { madeYear: 2024, madeMonth: undefined }, '2026-12-01', 'ok'],
    ['made after the event', { madeYear: 2027, madeMonth: 1 }, '2026-12-01', 'undecided'],
    ['a blow, whatever else', { impact: true }, '2026-12-01', 'fail'],
    ['a blow, nothing else known', { impact: 'yes', label: undefined, madeYear: undefined }, '2026-12-01', 'fail'],
    ['blow not answered', { impact: undefined }, '2026-12-01', 'undecided'],
  ])('%s', (_promise, inputs, on, outcome) => {
    expect(judged({ label, ...inputs }, on).outcome).toBe(outcome)
  })

  test('age is not judged where the body has no age', () => {
    expect(judged({ label, madeYear: 2005 }, '2026-12-01', UK).outcome).toBe('ok')
    expect(judged({ label, madeYear: undefined }, '2026-12-01', UK).outcome).toBe('ok')
  })

  test('a blow is not asked twice where another check asks it', () => {
    expect(judged({ label, impact: undefined }, '2026-06-01', { needsImpactAnswer: false }).outcome).toBe('ok')
    expect(judged({ label, impact: true }, '2026-06-01', { needsImpactAnswer: false }).outcome).toBe('fail')
  })

  test.each([[{ label: undefined }], [{ labels: [], label: undefined }], [{ label: undefined, secondLabel: 'none' }]])(
    '%j is undecided for want of a label',
    (inputs) => {
      expect(judged(inputs)).toMatchObject({ outcome: 'undecided', facts: { missing: 'label' } })
    },
  )

  test.each([
    [{ label: 'snell-sa2121' }, 'label'],
    [{ labels: 'snell-sa2020' }, 'labels'],
    [{ label: 'none' }, 'label'],
    [{ label: 'snell-sa2020', madeYear: 24 }, 'madeYear'],
  ])('%j is answered with the field', (inputs, field) => {
    expect(judged(inputs)).toMatchObject({ outcome: 'undecided', code: 'helmet-standard.impossible-value', facts: { field } })
  })
})
