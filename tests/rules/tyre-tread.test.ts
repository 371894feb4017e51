import { describe, expect, test } from 'vitest'
import { civilDate } from '@/lib/rules/civil-date'
import { explainJudgement } from '@/lib/rules/explain'
import { judge } from '@/lib/rules/judge'
import { TYRE_TREAD_DEFAULTS, tyreTread } from '@/lib/rules/tyre-tread'

function judged(inputs: Record<string, unknown>) {
  return judge('tyre-tread', inputs, TYRE_TREAD_DEFAULTS, civilDate('2026-05-09'))
}

describe('tyre-tread', () => {
  test.each([
    { leastMm: 1.59, innerEdgeMm: 3, outcome: 'fail', where: 'centre' },
    { leastMm: 1.6, innerEdgeMm: 3, outcome: 'advisory', where: 'centre' },
    { leastMm: 1.99, innerEdgeMm: 3, outcome: 'advisory', where: 'centre' },
    { leastMm: 2, innerEdgeMm: 3, outcome: 'ok', where: 'centre' },
    { leastMm: 4, innerEdgeMm: 1.5, outcome: 'fail', where: 'inner-edge' },
    { leastMm: 4, innerEdgeMm: 1.6, outcome: 'advisory', where: 'inner-edge' },
    { leastMm: 4, innerEdgeMm: 2, outcome: 'ok', where: 'inner-edge' },
    { leastMm: 3, innerEdgeMm: 3, outcome: 'ok', where: 'centre' },
    { leastMm: 0, innerEdgeMm: 0, outcome: 'fail', where: 'centre' },
  ])('$leastMm mm and $innerEdgeMm mm at the inner edge: $outcome, decided at the $where', ({ outcome, where, ...inputs }) => {
    expect(judged(inputs)).toMatchObject({ outcome, facts: { where, treadMm: Math.min(inputs.leastMm, inputs.innerEdgeMm) } })
  })

  test('0.9 mm is said to be 0.7 mm under 1.6 mm, and where', () => {
    const { code, facts } = judged({ leastMm: 3, innerEdgeMm: 0.9 })
    expect(explainJudgement(code, facts)).toBe('0.9 mm at the inner edge is 0.7 mm under 1.6 mm.')
  })

  test.each([
    [{}, 'leastMm'],
    [{ leastMm: 5 }, 'innerEdgeMm'],
    [{ innerEdgeMm: 5 }, 'leastMm'],
    [{ leastMm: 1.8 }, 'innerEdgeMm'],
  ])('%j is undecided for want of %s', (inputs, missing) => {
    expect(judged(inputs)).toMatchObject({ outcome: 'undecided', code: 'tyre-tread.missing', facts: { missing } })
  })

  test('one reading under the limit fails without the other', () => {
    expect(judged({ leastMm: 1.2 }).outcome).toBe('fail')
    expect(judged({ innerEdgeMm: 1.2 }).outcome).toBe('fail')
  })

  test.each([-0.1, 20.1, Infinity, '3'])('%s mm is not possible', (leastMm) => {
    expect(judged({ leastMm, innerEdgeMm: 3 })).toMatchObject({
      outcome: 'undecided',
      code: 'tyre-tread.impossible-value',
      facts: { field: 'leastMm', range: '0 to 20 mm' },
    })
  })

  test('an advisory limit under the fail limit is refused', () => {
    expect(tyreTread.params.safeParse({ failBelowMm: 2, adviseBelowMm: 1.6 }).success).toBe(false)
  })
})
