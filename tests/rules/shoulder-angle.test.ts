import { describe, expect, test } from 'vitest'
import { civilDate } from '@/lib/rules/civil-date'
import { explainJudgement } from '@/lib/rules/explain'
import { judge } from '@/lib/rules/judge'
import { SHOULDER_ANGLE_DEFAULTS, shoulderAngle } from '@/lib/rules/shoulder-angle'

const ON = civilDate('2026-05-09')

function judged(inputs: Record<string, unknown>, limits: Partial<typeof SHOULDER_ANGLE_DEFAULTS> = {}) {
  return judge('shoulder-angle', inputs, { ...SHOULDER_ANGLE_DEFAULTS, ...limits }, ON)
}

describe('shoulder-angle', () => {
  test.each([
    { runMm: 600, dropMm: 100, headRestraint: false, outcome: 'ok', angleDeg: 9.5 },
    { runMm: 600, dropMm: 0, headRestraint: true, outcome: 'ok', angleDeg: 0 },
    { runMm: 400, dropMm: 150, headRestraint: false, outcome: 'advisory', angleDeg: 20.6 },
    { runMm: 400, dropMm: 150, headRestraint: true, outcome: 'fail', angleDeg: 20.6 },
    { runMm: 250, dropMm: 300, headRestraint: false, outcome: 'fail', angleDeg: 50.2 },
    { runMm: 500, dropMm: -50, headRestraint: false, outcome: 'advisory', angleDeg: -5.7 },
    { runMm: 500, dropMm: -50, headRestraint: true, outcome: 'fail', angleDeg: -5.7 },
    { runMm: 500, dropMm: -100, headRestraint: false, outcome: 'fail', angleDeg: -11.3 },
    { runMm: 0, dropMm: 200, headRestraint: false, outcome: 'fail', angleDeg: 90 },
  ])('$runMm mm run and $dropMm mm drop, head restraint $headRestraint: $outcome', ({ outcome, angleDeg, ...inputs }) => {
    expect(judged(inputs)).toMatchObject({ outcome, facts: { angleDeg } })
  })

  test.each([1, 7, 100, 299.9, 300, 1234.5])(
    'exactly 45° from %f mm is within the limit, and a hundredth of a millimetre more is not',
    (length) => {
      expect(judged({ runMm: length, dropMm: length, headRestraint: false }).outcome).toBe('advisory')
      expect(judged({ runMm: length, dropMm: length + 0.01, headRestraint: false }).outcome).toBe('fail')
    },
  )

  test('each limit is inclusive', () => {
    const drop = (angleDeg: number) => 1000 * Math.tan((angleDeg * Math.PI) / 180)
    const at = (angleDeg: number, headRestraint: boolean) => judged({ runMm: 1000, dropMm: drop(angleDeg), headRestraint }).outcome
    expect([at(20, false), at(20, true), at(20.001, false), at(20.001, true)]).toEqual(['ok', 'ok', 'advisory', 'fail'])
    expect([at(0, false), at(0, true), at(-0.001, false), at(-0.001, true)]).toEqual(['ok', 'ok', 'advisory', 'fail'])
    expect([at(-10, false), at(-10.001, false)]).toEqual(['advisory', 'fail'])
  })

  test('rounding in the arithmetic never pushes a strap on the limit over it, whatever the limit', () => {
    const whole = Array.from({ length: 79 }, (_, index) => index + 1)
    const over = whole.filter((limit) => {
      const dropMm = 1000 * Math.tan((limit * Math.PI) / 180)
      const limits = { failAboveDeg: limit, adviseAboveDeg: limit, failAboveWithHeadRestraintDeg: limit }
      return dropMm <= 3000 && judged({ runMm: 1000, dropMm, headRestraint: false }, limits).outcome !== 'ok'
    })
    expect(over).toEqual([])
  })

  test('50.2° is said to be 5.2° over the limit', () => {
    const { code, facts } = judged({ runMm: 250, dropMm: 300, headRestraint: false })
    expect(code).toBe('shoulder-angle.over-limit')
    expect(explainJudgement(code, facts)).toBe('50.2° is 5.2° over the limit of 45°.')
  })

  test('an angle a hair over the limit is never shown as the limit itself', () => {
    const { outcome, code, facts } = judged({ runMm: 300, dropMm: 300.2, headRestraint: false })
    expect(outcome).toBe('fail')
    expect(explainJudgement(code, facts)).toBe('45.02° is 0.02° over the limit of 45°.')
  })

  test.each([
    [{ dropMm: 300, headRestraint: false }, 'runMm'],
    [{ runMm: 250, headRestraint: false }, 'dropMm'],
    [{ runMm: 400, dropMm: 150 }, 'headRestraint'],
    [{ runMm: 500, dropMm: -50 }, 'headRestraint'],
    [{ runMm: null, dropMm: 300, headRestraint: false }, 'runMm'],
  ])('%j is undecided for want of %s', (inputs, missing) => {
    expect(judged(inputs)).toMatchObject({ outcome: 'undecided', code: 'shoulder-angle.missing', facts: { missing } })
  })

  test('a head restraint is not asked about where it changes nothing', () => {
    expect(judged({ runMm: 600, dropMm: 100 }).outcome).toBe('ok')
    expect(judged({ runMm: 250, dropMm: 300 }).outcome).toBe('fail')
  })

  test('no run and no drop is no angle', () => {
    expect(judged({ runMm: 0, dropMm: 0, headRestraint: false }).outcome).toBe('undecided')
  })

  test.each([
    [{ runMm: -1, dropMm: 0 }, 'runMm', '0 to 3000 mm'],
    [{ runMm: 100, dropMm: 4000 }, 'dropMm', '-1500 to 3000 mm'],
    [{ runMm: '250', dropMm: 300 }, 'runMm', '0 to 3000 mm'],
    [{ runMm: NaN, dropMm: 300 }, 'runMm', '0 to 3000 mm'],
    [{ runMm: 250, dropMm: 300, headRestraint: 'perhaps' }, 'headRestraint', 'yes or no'],
  ])('%j is answered with the field and what is possible', (inputs, field, range) => {
    expect(judged(inputs)).toMatchObject({ outcome: 'undecided', code: 'shoulder-angle.impossible-value', facts: { field, range } })
  })

  test('"yes" and "no" of a choice mean true and false', () => {
    expect(judged({ runMm: 400, dropMm: 150, headRestraint: 'yes' })).toEqual(judged({ runMm: 400, dropMm: 150, headRestraint: true }))
    expect(judged({ runMm: 400, dropMm: 150, headRestraint: 'no' })).toEqual(judged({ runMm: 400, dropMm: 150, headRestraint: false }))
  })

  test('limits out of order are refused', () => {
    expect(shoulderAngle.params.safeParse({ ...SHOULDER_ANGLE_DEFAULTS, adviseAboveDeg: 50 }).success).toBe(false)
    expect(shoulderAngle.params.safeParse({ ...SHOULDER_ANGLE_DEFAULTS, failAboveWithHeadRestraintDeg: 60 }).success).toBe(false)
  })
})
