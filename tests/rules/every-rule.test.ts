import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { addDays, civilDate, fromDayNumber, type CivilDate } from '@/lib/rules/civil-date'
import { explainJudgement } from '@/lib/rules/explain'
import { judge } from '@/lib/rules/judge'
import type { Judgement } from '@/lib/rules/judgement'
import { findRule, RULES } from '@/lib/rules/registry'
import { FLUID_IDS } from '@/lib/rules/tables/leak-fluids'
import { HARNESS_STANDARD_IDS } from '@/lib/rules/tables/harness-standards'
import { HELMET_STANDARD_IDS } from '@/lib/rules/tables/helmet-standards'

const ON = civilDate('2026-05-09')
const NAMES = [...RULES.keys()]
const someDay = fc.integer({ min: 10_957, max: 36_000 }).map(fromDayNumber)

/** Values that a field of some rule would read, and values that none would. */
const anyValue = fc.oneof(
  {
    weight: 4,
    arbitrary: fc.constantFrom('fia-8853-98', 'sfi-16.1', 'un-r16', 'snell-sa2015', 'ece-22.05-j', 'fia-8858', 'fuel', 'engine-oil'),
  },
  {
    weight: 4,
    arbitrary: fc.constantFrom('wet', 'dry', 'drops-fall', 'exhaust', 'nothing', 'open', 'full', 'yes', 'no', '0720', '317', 'O720'),
  },
  { weight: 3, arbitrary: fc.boolean() },
  { weight: 3, arbitrary: fc.integer({ min: -10, max: 2100 }) },
  { weight: 2, arbitrary: fc.double() },
  { weight: 3, arbitrary: fc.jsonValue() },
  { weight: 1, arbitrary: fc.string({ unit: 'binary' }) },
)
const inputsOf = (name: string) => {
  const shape = (findRule(name)?.inputs as unknown as { shape: object }).shape
  const fields = Object.keys(shape)
  return fc.oneof(
    fc.jsonValue(),
    fc.record(Object.fromEntries(fields.map((each) => [each, anyValue])), { requiredKeys: [] }),
    fc.dictionary(fc.oneof(fc.constantFrom(...fields), fc.constantFrom('__proto__', 'constructor', 'toString')), anyValue),
  )
}
const judgedByDefaults = (name: string, inputs: unknown, on: CivilDate) => judge(name, inputs, findRule(name)?.defaults, on)

describe.each(NAMES)('%s', (name) => {
  const rule = RULES.get(name)!

  test('takes its own track-day limits, and refuses an unknown or a missing one', () => {
    const defaults = rule.defaults as Record<string, unknown>
    expect(rule.params.safeParse(defaults).success).toBe(true)
    expect(rule.params.safeParse({ ...defaults, loosenedDeg: 90 }).success).toBe(false)
    for (const key of Object.keys(defaults)) {
      const rest = Object.fromEntries(Object.entries(defaults).filter(([each]) => each !== key))
      expect(rule.params.safeParse(rest).success, key).toBe(false)
    }
  })

  test('names its grounds', () => {
    expect(rule.source.length).toBeGreaterThan(0)
    expect(new Set(rule.source.map((each) => each.id)).size).toBe(rule.source.length)
  })

  test.each([[{}], [null], [undefined], ['text'], [7], [[]], [{ unknown: 1 }]])('%j is never ok', (inputs) => {
    expect(judgedByDefaults(name, inputs, ON).outcome).toBe('undecided')
  })

  test('never throws, and says in words and in figures a record can hold what it decided', () => {
    fc.assert(
      fc.property(inputsOf(name), someDay, (inputs, on) => {
        const { code, facts } = judgedByDefaults(name, inputs, on)
        expect(code).toMatch(/^[a-z0-9-]+\.[a-z0-9-]+$/)
        expect(code.length).toBeLessThanOrEqual(80)
        const sentence = explainJudgement(code, facts)
        expect(sentence).toMatch(/\.$|\?$/)
        expect(sentence).not.toMatch(/undefined|null|NaN|does not know|\[object/)
        for (const [key, value] of Object.entries(facts)) {
          expect(key.length).toBeLessThanOrEqual(60)
          expect(value === null || ['string', 'number', 'boolean'].includes(typeof value)).toBe(true)
          if (typeof value === 'number') expect(Number.isFinite(value)).toBe(true)
          if (typeof value === 'string') expect(value.length).toBeLessThanOrEqual(200)
        }
      }),
      { numRuns: 400 },
    )
  })

  test('a judgement of another version is named, not invented', () => {
    expect(explainJudgement(`${name}.from-tomorrow`, {})).toBe(`Not judged here: this version does not know ${name}.from-tomorrow.`)
  })
})

/** Inputs each rule's schema accepts. */
function goodInputs(name: string): fc.Arbitrary<Record<string, unknown>> {
  const year = fc.integer({ min: 2000, max: 2045 })
  const month = fc.integer({ min: 1, max: 12 })
  const length = fc.integer({ min: 0, max: 1500 })
  const shapes: Record<string, Record<string, fc.Arbitrary<unknown>>> = {
    'harness-validity': {
      standard: fc.constantFrom(...HARNESS_STANDARD_IDS),
      labelYear: year,
      madeYear: year,
      madeMonth: month,
      labelsComplete: fc.boolean(),
      labelsSameNumber: fc.boolean(),
    },
    'shoulder-angle': { runMm: length, dropMm: fc.integer({ min: -400, max: 1500 }), headRestraint: fc.boolean() },
    'helmet-standard': {
      label: fc.constantFrom(...HELMET_STANDARD_IDS),
      secondLabel: fc.constantFrom('none', ...HELMET_STANDARD_IDS),
      face: fc.constantFrom('full', 'open', 'motocross'),
      openCar: fc.boolean(),
      madeYear: year,
      madeMonth: month,
      impact: fc.boolean(),
    },
    'tyre-age': {
      dateCode: fc.oneof(
        fc.integer({ min: 0, max: 9999 }).map((n) => String(n).padStart(4, '0')),
        fc.constantFrom('317', 'O720'),
      ),
    },
    'tyre-tread': {
      leastMm: fc.integer({ min: 0, max: 80 }).map((n) => n / 10),
      innerEdgeMm: fc.integer({ min: 0, max: 80 }).map((n) => n / 10),
    },
    'leak-class': {
      fluid: fc.constantFrom(...FLUID_IDS),
      leakClass: fc.constantFrom('dry', 'wet', 'drops-form', 'drops-fall'),
      reaches: fc.constantFrom('nothing', 'exhaust', 'tyre-or-brake'),
    },
  }
  return fc.record(shapes[name] ?? {})
}

const RANK: Readonly<Record<Judgement['outcome'], number>> = { ok: 0, advisory: 1, undecided: 1, fail: 2 }
const rank = (judgement: Judgement) => RANK[judgement.outcome]

describe('more of the same is never milder', () => {
  test.each(['harness-validity', 'helmet-standard', 'tyre-age'])(
    '%s: what has failed on a day fails on every later day, and what was noted is never ok',
    (name) => {
      fc.assert(
        fc.property(goodInputs(name), someDay, fc.integer({ min: 1, max: 5_000 }), (inputs, on, later) => {
          const today = judgedByDefaults(name, inputs, on)
          const afterwards = judgedByDefaults(name, inputs, addDays(on, later))
          if (today.outcome !== 'undecided') expect(rank(afterwards)).toBeGreaterThanOrEqual(rank(today))
        }),
        { numRuns: 1500 },
      )
    },
  )

  test('shoulder-angle: more drop over the same run, from level down', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 1500 }),
        fc.nat(1400),
        fc.integer({ min: 1, max: 100 }),
        fc.boolean(),
        (runMm, dropMm, more, headRestraint) => {
          const level = judgedByDefaults('shoulder-angle', { runMm, dropMm, headRestraint }, ON)
          const steeper = judgedByDefaults('shoulder-angle', { runMm, dropMm: dropMm + more, headRestraint }, ON)
          expect(rank(steeper)).toBeGreaterThanOrEqual(rank(level))
        },
      ),
    )
  })

  test('shoulder-angle: a head restraint asks more, never less', () => {
    fc.assert(
      fc.property(goodInputs('shoulder-angle'), (inputs) => {
        const [without, worn] = [false, true].map((headRestraint) =>
          rank(judgedByDefaults('shoulder-angle', { ...inputs, headRestraint }, ON)),
        )
        expect(worn).toBeGreaterThanOrEqual(without!)
      }),
    )
  })

  test.each(['shoulder-angle', 'tyre-tread', 'leak-class'])('%s: an ok given without an answer is an ok whatever the answer', (name) => {
    fc.assert(
      fc.property(goodInputs(name), fc.nat(2), (inputs, index) => {
        const left = Object.keys(inputs)[index]
        const fewer = Object.fromEntries(Object.entries(inputs).filter(([key]) => key !== left))
        if (judgedByDefaults(name, fewer, ON).outcome !== 'ok') return
        expect(['ok', 'undecided']).toContain(judgedByDefaults(name, inputs, ON).outcome)
      }),
      { numRuns: 1000 },
    )
  })

  test('tyre-tread: less tread', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 80 }), fc.integer({ min: 0, max: 80 }), (tenths, other) => {
        const deeper = judgedByDefaults('tyre-tread', { leastMm: tenths / 10, innerEdgeMm: other / 10 }, ON)
        const shallower = judgedByDefaults('tyre-tread', { leastMm: (tenths - 1) / 10, innerEdgeMm: other / 10 }, ON)
        expect(rank(shallower)).toBeGreaterThanOrEqual(rank(deeper))
      }),
    )
  })

  test.each(FLUID_IDS)('leak-class: %s going further, or reaching something', (fluid) => {
    const along = ['dry', 'wet', 'drops-form', 'drops-fall'].map((each) =>
      rank(judgedByDefaults('leak-class', { fluid, leakClass: each, reaches: 'nothing' }, ON)),
    )
    const onto = ['dry', 'wet', 'drops-form', 'drops-fall'].map((each) =>
      rank(judgedByDefaults('leak-class', { fluid, leakClass: each, reaches: 'exhaust' }, ON)),
    )
    expect(along).toEqual([...along].sort((a, b) => a - b))
    expect(onto.every((each, index) => each >= along[index]!)).toBe(true)
  })
})

describe('judge', () => {
  test('a rule this build does not know is undecided', () => {
    const { outcome, code, facts } = judge('pad-thickness', { leastMm: 4 }, {}, ON)
    expect(outcome).toBe('undecided')
    expect(explainJudgement(code, facts)).toBe('Not judged here: this version does not know pad-thickness.unknown-rule.')
  })

  test('limits that do not fit are a fault of ours and say so', () => {
    expect(() => judge('tyre-tread', {}, { failBelowMm: 1.6 }, ON)).toThrow('the limits do not fit the rule tyre-tread: adviseBelowMm')
  })

  test('the sentence for what is missing or impossible names the thing and the range', () => {
    expect(explainJudgement('tyre-tread.missing', { missing: 'innerEdgeMm' })).toBe('Not judged: the depth at the inner edge is missing.')
    const { code, facts } = judgedByDefaults('tyre-tread', { leastMm: 45, innerEdgeMm: 3 }, ON)
    expect(explainJudgement(code, facts)).toBe('Not judged: 45 is not possible for the least tread depth (0 to 20 mm).')
  })
})
