import { describe, expect, test } from 'vitest'
import { civilDate } from '@/lib/rules/civil-date'
import { explainJudgement } from '@/lib/rules/explain'
import { HARNESS_VALIDITY_DEFAULTS } from '@/lib/rules/harness-validity'
import { judge } from '@/lib/rules/judge'

type Limits = Partial<typeof HARNESS_VALIDITY_DEFAULTS>
const SOUND = { labelsComplete: true, labelsSameNumber: true }

function judged(inputs: Record<string, unknown>, on: string, limits: Limits = {}) {
  return judge('harness-validity', { ...SOUND, ...inputs }, { ...HARNESS_VALIDITY_DEFAULTS, ...limits }, civilDate(on))
}

describe('harness-validity', () => {
  const label2025 = { standard: 'fia-8853-98', labelYear: 2025 }
  test.each<[string, Record<string, unknown>, string, Limits, string]>([
    ['an FIA label ends with its year', label2025, '2026-01-01', {}, 'fail'],
    ['the last 60 days are noted, the last valid day among them', label2025, '2025-12-31', {}, 'advisory'],
    ['the first of the last 60 days', label2025, '2025-11-02', {}, 'advisory'],
    ['the day before them', label2025, '2025-11-01', {}, 'ok'],
    ['no window at all', label2025, '2025-12-31', { adviseWithinDays: 0 }, 'ok'],
    ['8854/98 likewise', { standard: 'fia-8854-98', labelYear: 2025 }, '2026-01-01', {}, 'fail'],
    ['five more years are for 8853-2016 alone', label2025, '2026-01-01', { reading: 'label-year-plus-five' }, 'fail'],
    ['8853-2016 by its label', { standard: 'fia-8853-2016', labelYear: 2023 }, '2024-01-01', {}, 'fail'],
    ['8853-2016 plus five', { standard: 'fia-8853-2016', labelYear: 2023 }, '2028-10-01', { reading: 'label-year-plus-five' }, 'ok'],
    [
      '8853-2016 plus five, over',
      { standard: 'fia-8853-2016', labelYear: 2023 },
      '2029-01-01',
      { reading: 'label-year-plus-five' },
      'fail',
    ],
    [
      'the standard itself ended',
      { standard: 'fia-8853-98', labelYear: 2024 },
      '2023-01-01',
      { standardEnds8853_98: '2022-12-31' },
      'fail',
    ],
    [
      'on its last day',
      { standard: 'fia-8853-98', labelYear: 2024 },
      '2022-12-31',
      { standardEnds8853_98: '2022-12-31', adviseWithinDays: 0 },
      'ok',
    ],
    ['the label ends first', { standard: 'fia-8853-98', labelYear: 2021 }, '2022-06-01', { standardEnds8853_98: '2022-12-31' }, 'fail'],
    [
      'SFI to the day, on the anniversary',
      { standard: 'sfi-16.1', madeYear: 2024, madeMonth: 3 },
      '2026-03-01',
      { adviseWithinDays: 0 },
      'ok',
    ],
    ['SFI to the day, after it', { standard: 'sfi-16.1', madeYear: 2024, madeMonth: 3 }, '2026-03-02', {}, 'fail'],
    ['SFI to 31 December', { standard: 'sfi-16.5', madeYear: 2024 }, '2026-10-01', { sfiReading: 'end-of-year' }, 'ok'],
    ['SFI after 31 December', { standard: 'sfi-16.6', madeYear: 2024 }, '2027-01-01', { sfiReading: 'end-of-year' }, 'fail'],
    ['expired is a note where the event says so', label2025, '2026-06-01', { expiredIs: 'advisory' }, 'advisory'],
    ['a missing label counts as expired', { ...label2025, labelsComplete: false }, '2025-06-01', {}, 'fail'],
    [
      'a missing label, where expired is a note',
      { ...label2025, labelsComplete: 'no' },
      '2025-06-01',
      { expiredIs: 'advisory' },
      'advisory',
    ],
    ['mixed numbers fail even there', { ...label2025, labelsSameNumber: false }, '2025-06-01', { expiredIs: 'advisory' }, 'fail'],
    ['mixed numbers fail without a standard', { labelsSameNumber: false }, '2025-06-01', {}, 'fail'],
    ['no readable label', { standard: 'none-readable' }, '2025-06-01', {}, 'fail'],
    ['a road belt has no date', { standard: 'un-r16' }, '2025-06-01', {}, 'ok'],
    ['an expired set fails though an answer is missing', { ...label2025, labelsComplete: null }, '2026-06-01', {}, 'fail'],
  ])('%s', (_promise, inputs, on, limits, outcome) => {
    expect(judged(inputs, on, limits).outcome).toBe(outcome)
  })

  test.each([
    [{}, 'standard'],
    [{ standard: 'fia-8853-98' }, 'labelYear'],
    [{ standard: 'fia-8853-2016' }, 'labelYear'],
    [{ standard: 'sfi-16.1', madeMonth: 3 }, 'madeYear'],
    [{ standard: 'sfi-16.1', madeYear: 2024 }, 'madeMonth'],
    [{ standard: 'fia-8853-98', labelYear: 2027, labelsComplete: undefined }, 'labelsComplete'],
    [{ standard: 'fia-8853-98', labelYear: 2027, labelsSameNumber: undefined }, 'labelsSameNumber'],
    [{ standard: 'sfi-16.1', madeYear: 2025, madeMonth: 3, labelsComplete: undefined }, 'labelsComplete'],
  ])('%j is undecided for want of %s', (inputs, missing) => {
    expect(judged(inputs, '2025-06-01')).toMatchObject({ outcome: 'undecided', code: 'harness-validity.missing', facts: { missing } })
  })

  test('a label year that cannot have been printed yet is asked again', () => {
    expect(judged({ standard: 'fia-8853-98', labelYear: 2031 }, '2026-06-01').outcome).toBe('ok')
    expect(judged({ standard: 'fia-8853-98', labelYear: 2032 }, '2026-06-01')).toMatchObject({
      outcome: 'undecided',
      code: 'harness-validity.label-year-not-possible',
      facts: { latestYear: 2031 },
    })
  })

  test('a harness made after the event is asked again', () => {
    expect(judged({ standard: 'sfi-16.1', madeYear: 2026, madeMonth: 7 }, '2026-06-01').code).toBe('harness-validity.made-in-future')
  })

  test.each([
    [{ standard: 'fia-9999' }, 'standard', 'one of the list'],
    [{ standard: 'fia-8853-98', labelYear: 25 }, 'labelYear', 'a whole number, 1995 to 2099'],
    [{ standard: 'sfi-16.1', madeYear: 2024, madeMonth: 13 }, 'madeMonth', 'a whole number, 1 to 12'],
  ])('%j is answered with the field and what is possible', (inputs, field, range) => {
    expect(judged(inputs, '2025-06-01')).toMatchObject({
      outcome: 'undecided',
      code: 'harness-validity.impossible-value',
      facts: { field, range },
    })
  })

  test('the sentences carry the dates', () => {
    const over = judged(label2025, '2026-01-01')
    expect(explainJudgement(over.code, over.facts)).toBe(
      'FIA 8853/98: last valid day Wed 31 December 2025, 1 day before Thu 1 January 2026.',
    )
    const near = judged(label2025, '2025-12-01')
    expect(explainJudgement(near.code, near.facts)).toBe('FIA 8853/98: valid to Wed 31 December 2025, 30 days left.')
  })
})
