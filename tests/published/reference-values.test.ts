import { describe, expect, test } from 'vitest'
import { civilDate } from '@/lib/rules/civil-date'
import { HARNESS_VALIDITY_DEFAULTS } from '@/lib/rules/harness-validity'
import { HELMET_STANDARD_DEFAULTS } from '@/lib/rules/helmet-standard'
import { judge } from '@/lib/rules/judge'
import { LEAK_CLASS_DEFAULTS } from '@/lib/rules/leak-class'
import { SHOULDER_ANGLE_DEFAULTS } from '@/lib/rules/shoulder-angle'
import { TYRE_AGE_DEFAULTS } from '@/lib/rules/tyre-age'
import { TYRE_TREAD_DEFAULTS } from '@/lib/rules/tyre-tread'
import { angleBelowHorizontal, mm } from '@/lib/rules/units'

/**
 * Values worked out elsewhere, each with where it comes from and how far that can be trusted:
 * Q/S read in the rule-maker's own text · Q2/S2 repeated by a club, retailer or trade page · M remembered, to be confirmed · D/C worked out from the
 * numbers beside it, or our own default. "May run" stands for ok and advisory alike where the source knows no advisory.
 */
type Tag = 'Q' | 'Q2' | 'M' | 'D' | 'S' | 'S2' | 'C'
interface Row {
  readonly source: string
  readonly tag: Tag
  readonly rule: string
  readonly inputs: Readonly<Record<string, unknown>>
  readonly limits: Readonly<Record<string, unknown>>
  readonly on: string
  readonly expect: 'ok' | 'advisory' | 'fail' | 'undecided'
}

const SOUND_BELTS = { labelsComplete: true, labelsSameNumber: true }
const UK_BELTS = { ...HARNESS_VALIDITY_DEFAULTS, reading: 'label-year-plus-five', adviseWithinDays: 0 }
const FIA_BELTS = { ...HARNESS_VALIDITY_DEFAULTS, reading: 'label-year', standardEnds8853_98: '2022-12-31', adviseWithinDays: 0 }
const SFI_DAY = { ...HARNESS_VALIDITY_DEFAULTS, sfiReading: 'to-the-day', adviseWithinDays: 0 }
const SFI_YEAR = { ...HARNESS_VALIDITY_DEFAULTS, sfiReading: 'end-of-year', adviseWithinDays: 0 }
const SOUND_HELMET = { face: 'full', openCar: false, impact: false }
const UK_HELMET = { ...HELMET_STANDARD_DEFAULTS, body: 'asn-uk', maxAgeYears: null, adviseOverYears: null }
const FIA_HELMET = { ...UK_HELMET, body: 'fia' }
const STRICT_TYRES = { failAtYears: 5, adviseAtYears: 4 }

function belts(source: string, tag: Tag, limits: Row['limits'], inputs: Row['inputs'], on: string, expected: Row['expect']): Row {
  return { source, tag, rule: 'harness-validity', inputs: { ...SOUND_BELTS, ...inputs }, limits, on, expect: expected }
}
function straps(source: string, tag: Tag, runMm: number, dropMm: number, headRestraint: boolean, expected: Row['expect']): Row {
  return {
    source,
    tag,
    rule: 'shoulder-angle',
    inputs: { runMm, dropMm, headRestraint },
    limits: SHOULDER_ANGLE_DEFAULTS,
    on: '2026-12-01',
    expect: expected,
  }
}
function helmet(source: string, tag: Tag, limits: Row['limits'], inputs: Row['inputs'], on: string, expected: Row['expect']): Row {
  return { source, tag, rule: 'helmet-standard', inputs: { ...SOUND_HELMET, ...inputs }, limits, on, expect: expected }
}
function tyre(source: string, tag: Tag, dateCode: string, expected: Row['expect'], limits: Row['limits'] = TYRE_AGE_DEFAULTS): Row {
  return { source, tag, rule: 'tyre-age', inputs: { dateCode }, limits, on: '2026-12-01', expect: expected }
}
function tread(source: string, tag: Tag, leastMm: number, expected: Row['expect']): Row {
  return {
    source,
    tag,
    rule: 'tyre-tread',
    inputs: { leastMm, innerEdgeMm: 8 },
    limits: TYRE_TREAD_DEFAULTS,
    on: '2026-12-01',
    expect: expected,
  }
}
function leak(source: string, tag: Tag, fluid: string, leakClass: string, expected: Row['expect'], reaches = 'nothing'): Row {
  return {
    source,
    tag,
    rule: 'leak-class',
    inputs: { fluid, leakClass, reaches },
    limits: LEAK_CLASS_DEFAULTS,
    on: '2026-12-01',
    expect: expected,
  }
}

const NCR = 'Motorsport UK competition rules 2025, ch. 7 app. 7'
const TL25 = 'FIA Technical List 25 of 11.12.2024, by a retailer'
const SCRUTINEER = 'UK sports-car club, chief scrutineer 2024'
const FULL_WEEK = '49 CFR 574.5, week 01 the first full week'

const ROWS: readonly Row[] = [
  belts(`${NCR} art. 10.5`, 'Q', UK_BELTS, { standard: 'fia-8853-98', labelYear: 2025 }, '2025-12-31', 'ok'),
  belts(`${NCR} art. 10.5`, 'Q', UK_BELTS, { standard: 'fia-8853-98', labelYear: 2025 }, '2026-01-01', 'fail'),
  belts('FIA reading of the label year', 'M', FIA_BELTS, { standard: 'fia-8853-2016', labelYear: 2023 }, '2026-06-01', 'fail'),
  belts(`${NCR} art. 10.4`, 'Q', UK_BELTS, { standard: 'fia-8853-2016', labelYear: 2023 }, '2026-06-01', 'ok'),
  belts(`${NCR} art. 10.4`, 'Q', UK_BELTS, { standard: 'fia-8853-2016', labelYear: 2023 }, '2028-12-31', 'ok'),
  belts(`${NCR} art. 10.4`, 'Q', UK_BELTS, { standard: 'fia-8853-2016', labelYear: 2023 }, '2029-01-01', 'fail'),
  belts('UK historic club notice 2022', 'Q2', FIA_BELTS, { standard: 'fia-8853-98', labelYear: 2024 }, '2023-02-01', 'fail'),
  belts(`${NCR} art. 10.5`, 'Q', UK_BELTS, { standard: 'fia-8853-98', labelYear: 2024 }, '2023-02-01', 'ok'),
  belts('SFI, two years from making', 'Q2', SFI_DAY, { standard: 'sfi-16.1', madeYear: 2024, madeMonth: 3 }, '2026-06-15', 'fail'),
  belts('SCCA memo RM04-01', 'Q2', SFI_YEAR, { standard: 'sfi-16.1', madeYear: 2024, madeMonth: 3 }, '2026-06-15', 'ok'),
  belts('SCCA memo RM04-01', 'Q2', SFI_YEAR, { standard: 'sfi-16.1', madeYear: 2024, madeMonth: 3 }, '2027-01-01', 'fail'),
  belts(
    'NZ guidance on belt labels',
    'Q2',
    UK_BELTS,
    { standard: 'fia-8853-2016', labelYear: 2027, labelsComplete: false },
    '2026-06-01',
    'fail',
  ),
  belts(
    'NZ guidance on belt labels',
    'Q2',
    UK_BELTS,
    { standard: 'fia-8853-2016', labelYear: 2027, labelsSameNumber: false },
    '2026-06-01',
    'fail',
  ),

  straps('Harness maker’s manual, 0° to 20°', 'Q', 600, 100, false, 'ok'),
  straps('Advisory over 20° without a head restraint', 'D', 400, 150, false, 'advisory'),
  straps('Harness maker’s manual, 0° to 20°', 'Q', 400, 150, true, 'fail'),
  straps('FIA Appendix J art. 253-6.2, not over 45°', 'Q', 300, 300, false, 'advisory'),
  straps('FIA Appendix J art. 253-6.2, not over 45°', 'Q', 250, 300, false, 'fail'),
  straps('Formula SAE, to 10° above', 'Q', 500, -50, false, 'advisory'),

  helmet(SCRUTINEER, 'Q2', UK_HELMET, { label: 'snell-sa2015' }, '2026-12-31', 'ok'),
  helmet(SCRUTINEER, 'Q2', UK_HELMET, { label: 'snell-sa2015' }, '2027-01-01', 'fail'),
  helmet(TL25, 'Q2', FIA_HELMET, { label: 'snell-sa2015' }, '2024-01-01', 'fail'),
  helmet(TL25, 'Q2', FIA_HELMET, { label: 'fia-8860-2010' }, '2028-12-31', 'ok'),
  helmet(TL25, 'Q2', FIA_HELMET, { label: 'fia-8860-2010' }, '2029-01-01', 'fail'),
  helmet(TL25, 'Q2', FIA_HELMET, { label: 'fia-8859-2015' }, '2035-01-01', 'ok'),
  helmet('UK racer’s guide to date lives 2021', 'Q2', UK_HELMET, { label: 'fia-8860-2004' }, '2021-01-01', 'fail'),
  helmet('BS 6658-85 A/FR not approved from 2016', 'Q2', UK_HELMET, { label: 'bs-6658-a-fr' }, '2016-01-01', 'fail'),
  helmet(SCRUTINEER, 'Q2', HELMET_STANDARD_DEFAULTS, { label: 'fia-8858' }, '2026-06-01', 'fail'),
  helmet(SCRUTINEER, 'Q2', UK_HELMET, { labels: ['snell-sa2010', 'fia-8859-2015'] }, '2025-06-01', 'ok'),
  helmet(
    'UN R22.05, letter J',
    'Q2',
    HELMET_STANDARD_DEFAULTS,
    { label: 'ece-22.05-j', openCar: true, madeYear: 2024 },
    '2026-06-01',
    'fail',
  ),
  helmet(
    'UN R22.05, letter J',
    'Q2',
    HELMET_STANDARD_DEFAULTS,
    { label: 'ece-22.05-j', openCar: false, madeYear: 2024 },
    '2026-06-01',
    'ok',
  ),
  helmet(
    'Age over 10 years',
    'D',
    HELMET_STANDARD_DEFAULTS,
    { label: 'snell-sa2015', madeYear: 2016, madeMonth: 11 },
    '2026-12-01',
    'fail',
  ),
  helmet(
    'Age from 5 to 10 years',
    'D',
    HELMET_STANDARD_DEFAULTS,
    { label: 'snell-sa2015', madeYear: 2020, madeMonth: 1 },
    '2026-12-01',
    'advisory',
  ),
  helmet('Age under 5 years', 'D', HELMET_STANDARD_DEFAULTS, { label: 'snell-sa2020', madeYear: 2024, madeMonth: 5 }, '2026-12-01', 'ok'),
  helmet('Motorsport UK yearbook K10, blows', 'Q', HELMET_STANDARD_DEFAULTS, { label: 'snell-sa2020', impact: true }, '2026-12-01', 'fail'),

  tyre('Default limits 10 and 6 years', 'D', '0720', 'advisory'),
  tyre('Default limits 10 and 6 years', 'D', '4816', 'fail'),
  tyre('Default limits 10 and 6 years', 'D', '4916', 'advisory'),
  tyre('Default limits 10 and 6 years', 'D', '5220', 'ok'),
  tyre('Default limits 10 and 6 years', 'D', '0722', 'ok'),
  tyre('Circuit-day tech sheet: not over 5 years', 'S2', '5220', 'fail', STRICT_TYRES),
  tyre('Circuit-day tech sheet: not over 5 years', 'S2', '0722', 'advisory', STRICT_TYRES),
  tyre('Vehicle handbook: three digits before 2000', 'S2', '317', 'fail'),
  tyre(FULL_WEEK, 'S2', '5322', 'undecided'),
  tyre(FULL_WEEK, 'S2', '0022', 'undecided'),
  tyre(FULL_WEEK, 'S2', '5323', 'ok'),

  tread('GB Construction and Use reg. 27, 1.6 mm', 'S2', 1.59, 'fail'),
  tread('GB Construction and Use reg. 27, 1.6 mm', 'S2', 1.6, 'advisory'),
  tread('49 CFR 570, 2/32 in = 1.5875 mm, under the 1.6 of ours', 'S', 1.5875, 'fail'),
  tread('Advisory under 2.0 mm', 'D', 2, 'ok'),

  leak('US Army manuals: no fuel leak of any class', 'S', 'fuel', 'wet', 'fail'),
  leak('UK inspection manual 1.1.11: leaking hydraulics', 'S', 'brake-fluid', 'wet', 'fail'),
  leak('US Army manuals: class III reported at once', 'S', 'engine-oil', 'drops-fall', 'fail'),
  leak('Table of fluid and class', 'D', 'engine-oil', 'wet', 'ok'),
  leak('Table of fluid and class', 'D', 'coolant', 'drops-form', 'advisory'),
  leak('One class worse on exhaust, disc or tyre', 'D', 'engine-oil', 'drops-form', 'fail', 'exhaust'),
  leak('Water of washer and air conditioning', 'D', 'washer-water', 'drops-fall', 'ok'),
]

describe('values from outside', () => {
  test('at least thirty of them, no two alike', () => {
    expect(ROWS.length).toBeGreaterThanOrEqual(30)
    expect(new Set(ROWS.map((row) => JSON.stringify([row.rule, row.inputs, row.limits, row.on]))).size).toBe(ROWS.length)
  })

  test.each(ROWS.map((row) => [row.rule, JSON.stringify(row.inputs), row.on, row.expect, row.tag, row.source, row] as const))(
    '%s %s on %s: %s [%s: %s]',
    (_rule, _inputs, _on, _expect, _tag, _source, row) => {
      expect(judge(row.rule, row.inputs, row.limits, civilDate(row.on)).outcome).toBe(row.expect)
    },
  )
})

describe('figures from outside', () => {
  test.each([
    [600, 100, 9.46],
    [400, 150, 20.56],
    [300, 300, 45],
    [250, 300, 50.19],
    [500, -50, -5.71],
  ])('D: %i mm run and %i mm drop make %f°', (run, drop, angleDeg) => {
    expect(angleBelowHorizontal(mm(run), mm(drop))).toBeCloseTo(angleDeg, 2)
  })

  test.each([
    ['0720', '2020-02-16', 6],
    ['0722', '2022-02-13', 4],
    ['0109', '2009-01-04', 17],
    ['5220', '2020-12-27', 5],
    ['5323', '2023-12-31', 2],
    ['4816', '2016-11-27', 10],
    ['4916', '2016-12-04', 9],
  ])('C: tyre code %s begins on %s and is %i years old on 1 December 2026', (dateCode, weekStart, ageYears) => {
    expect(judge('tyre-age', { dateCode }, TYRE_AGE_DEFAULTS, civilDate('2026-12-01')).facts).toMatchObject({ weekStart, ageYears })
  })
})
