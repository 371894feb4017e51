import { describe, expect, test } from 'vitest'
import { civilDate } from '@/lib/rules/civil-date'
import { explainJudgement } from '@/lib/rules/explain'
import { judge } from '@/lib/rules/judge'
import { TYRE_AGE_DEFAULTS } from '@/lib/rules/tyre-age'
import { readTyreDateCode } from '@/lib/rules/tyre-date-code'
import { tyreWeekStart } from '@/lib/rules/tyre-week'

const DECEMBER = '2026-12-01'

function judged(dateCode: unknown, on = DECEMBER, limits = TYRE_AGE_DEFAULTS) {
  return judge('tyre-age', { dateCode }, limits, civilDate(on))
}

describe('tyre-age', () => {
  test.each([
    ['0720', 'advisory', 6],
    ['4816', 'fail', 10],
    ['4916', 'advisory', 9],
    ['5220', 'ok', 5],
    ['0722', 'ok', 4],
    ['5323', 'ok', 2],
    ['0109', 'fail', 17],
  ])('%s is %s at %i years', (dateCode, outcome, ageYears) => {
    expect(judged(dateCode)).toMatchObject({ outcome, facts: { ageYears } })
  })

  test('the limit falls on the anniversary of the week’s Sunday', () => {
    expect(tyreWeekStart(2020, 7)).toBe('2020-02-16')
    expect(judged('0720', '2026-02-15').outcome).toBe('ok')
    expect(judged('0720', '2026-02-16').outcome).toBe('advisory')
    expect(judged('0720', '2030-02-15').outcome).toBe('advisory')
    expect(judged('0720', '2030-02-16').outcome).toBe('fail')
  })

  test.each([
    '0720',
    ' 07 20 ',
    '07-20',
    '07–20',
    'DOT U2LL LMLR 0720',
    'dot u2ll lmlr 0720',
    'U2LLLMLR0720',
    'DOT 1A2 BCDEFH 0720',
    'DOT U2LL 0720',
    'DOT U2L 0720',
    'DOT-U2-LL-LM-0720',
  ])('%j reads as week 07 of 2020', (text) => {
    expect(readTyreDateCode(text)).toEqual({ kind: 'week', week: 7, year: 2020, start: '2020-02-16' })
  })

  test.each(['317', 'DOT U2 LL LMR 317', 'DOT U2 LL 317'])('%j is older than 2000 and fails whatever its decade', (dateCode) => {
    expect(judged(dateCode)).toMatchObject({ outcome: 'fail', code: 'tyre-age.before-2000', facts: { week: 31, atLeastYears: 26 } })
  })

  test.each([
    ['O720', '0720'],
    ['072O', '0720'],
    ['I722', '1722'],
    ['S220', '5220'],
    ['DOT UZLL LMLR 07Z0', 'U2LLLMLR0720'],
  ])('%s has a letter no marking uses: refused, with %s named', (dateCode, suggestion) => {
    const { outcome, code, facts } = judged(dateCode)
    expect({ outcome, code, suggestion: facts.suggestion }).toEqual({
      outcome: 'undecided',
      code: 'tyre-age.letters-never-used',
      suggestion,
    })
    expect(explainJudgement(code, facts)).toContain(`Did you mean ${suggestion}?`)
  })

  test('a letter that reads as nothing either way gets no suggestion', () => {
    expect(judged('GOOD').facts).toMatchObject({ suggestion: null })
  })

  test.each([
    ['0022', 'tyre-age.no-such-week'],
    ['5422', 'tyre-age.no-such-week'],
    ['5322', 'tyre-age.no-such-week'],
    ['003', 'tyre-age.no-such-week'],
    ['4926', 'tyre-age.in-the-future'],
    ['0199', 'tyre-age.in-the-future'],
    ['07/20', 'tyre-age.unreadable'],
    ['7', 'tyre-age.unreadable'],
    ['07202', 'tyre-age.unreadable'],
    ['07A0', 'tyre-age.unreadable'],
    ['DOT U2LL LMLR', 'tyre-age.no-date'],
    ['U2LLLMLR07201999', 'tyre-age.unreadable'],
    ['', 'tyre-age.missing'],
    ['   ', 'tyre-age.missing'],
    [undefined, 'tyre-age.missing'],
    [null, 'tyre-age.missing'],
    [720, 'tyre-age.impossible-value'],
    ['0'.repeat(41), 'tyre-age.impossible-value'],
  ])('%j is undecided: %s', (dateCode, code) => {
    expect(judged(dateCode)).toMatchObject({ outcome: 'undecided', code })
  })

  test('a week that begins on the event’s day is not in the future', () => {
    expect(tyreWeekStart(2026, 48)).toBe('2026-11-29')
    expect(judged('4826', '2026-11-29').outcome).toBe('ok')
    expect(judged('4826', '2026-11-28').code).toBe('tyre-age.in-the-future')
  })

  test('the sentence names week, year, age and limit', () => {
    const { code, facts } = judged('0720')
    expect(explainJudgement(code, facts)).toBe('Made week 07 of 2020, 6 years old; advisory from 6.')
  })
})
