import { describe, expect, test } from 'vitest'
import { civilDate } from '@/lib/rules/civil-date'
import { explainJudgement } from '@/lib/rules/explain'
import { judge } from '@/lib/rules/judge'
import { LEAK_CLASS_DEFAULTS, leakClass } from '@/lib/rules/leak-class'

function judged(inputs: Record<string, unknown>, limits: Partial<typeof LEAK_CLASS_DEFAULTS> = {}) {
  return judge('leak-class', inputs, { ...LEAK_CLASS_DEFAULTS, ...limits }, civilDate('2026-05-09'))
}

/** wet, drops form, drops fall; each on nothing, then on the exhaust. */
const TABLE: Readonly<Record<string, string>> = {
  fuel: 'fail fail fail / fail fail fail',
  'brake-fluid': 'fail fail fail / fail fail fail',
  'clutch-fluid': 'fail fail fail / fail fail fail',
  'engine-oil': 'ok advisory fail / advisory fail fail',
  'gearbox-oil': 'ok advisory fail / advisory fail fail',
  'axle-oil': 'ok advisory fail / advisory fail fail',
  'steering-oil': 'ok advisory fail / advisory fail fail',
  coolant: 'advisory advisory fail / advisory fail fail',
  'damper-oil': 'ok advisory fail / advisory fail fail',
  'battery-electrolyte': 'fail fail fail / fail fail fail',
  'high-voltage-coolant': 'fail fail fail / fail fail fail',
  'washer-water': 'ok ok ok / ok ok ok',
  'air-con-water': 'ok ok ok / ok ok ok',
}

describe('leak-class', () => {
  test.each(Object.entries(TABLE))('%s: %s', (fluid, expected) => {
    const row = (reaches: string) =>
      ['wet', 'drops-form', 'drops-fall'].map((each) => judged({ fluid, leakClass: each, reaches }).outcome).join(' ')
    expect(`${row('nothing')} / ${row('exhaust')}`).toBe(expected)
    expect(row('tyre-or-brake')).toBe(row('exhaust'))
  })

  test('dry is ok without a fluid', () => {
    expect(judged({ leakClass: 'dry' }).outcome).toBe('ok')
  })

  test.each([
    [{}, 'leakClass'],
    [{ fluid: 'engine-oil', reaches: 'nothing' }, 'leakClass'],
    [{ leakClass: 'wet', reaches: 'nothing' }, 'fluid'],
    [{ leakClass: 'wet', fluid: 'engine-oil' }, 'reaches'],
    [{ leakClass: 'drops-form', fluid: 'coolant' }, 'reaches'],
  ])('%j is undecided for want of %s', (inputs, missing) => {
    expect(judged(inputs)).toMatchObject({ outcome: 'undecided', code: 'leak-class.missing', facts: { missing } })
  })

  test('what it gets onto is not asked where it changes nothing', () => {
    expect(judged({ fluid: 'fuel', leakClass: 'wet' }).outcome).toBe('fail')
    expect(judged({ fluid: 'engine-oil', leakClass: 'drops-fall' }).outcome).toBe('fail')
    expect(judged({ fluid: 'washer-water', leakClass: 'drops-fall' }).outcome).toBe('ok')
  })

  test('a fluid nobody could name is never an ok', () => {
    expect(judged({ fluid: 'not-known', leakClass: 'wet', reaches: 'nothing' }).outcome).toBe('undecided')
  })

  test.each(['fuel', 'hydraulic'])('no set of limits can loosen %s', (row) => {
    expect(leakClass.params.safeParse({ ...LEAK_CLASS_DEFAULTS, [row]: ['advisory', 'fail', 'fail'] }).success).toBe(false)
    expect(() => judged({ leakClass: 'dry' }, { [row]: ['ok', 'ok', 'ok'] })).toThrow('the limits do not fit the rule leak-class')
  })

  test('a limit changed in a set is the one that judges', () => {
    expect(judged({ fluid: 'engine-oil', leakClass: 'wet', reaches: 'nothing' }, { oil: ['fail', 'fail', 'fail'] }).outcome).toBe('fail')
  })

  test('the sentence says what, how far, onto what, and what it counts as', () => {
    const { code, facts } = judged({ fluid: 'engine-oil', leakClass: 'wet', reaches: 'exhaust' })
    expect(explainJudgement(code, facts)).toBe(
      'Engine oil: wet or stained, no drops, onto the exhaust, counted as “drops form and stay”; advisory, to be seen again after the first session.',
    )
  })
})
