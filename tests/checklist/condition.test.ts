import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { applicableChecks, askedChecks, doesNotApply } from '@/lib/checklist/applicable-checks'
import type { CarFacts } from '@/lib/checklist/car-facts'
import type { Condition } from '@/lib/checklist/condition'
import { evaluateCondition } from '@/lib/checklist/condition'
import { aBook, aCheck, aChecklistWith } from './a-checklist'

const T: Condition = { fact: 'yes', is: true }
const F: Condition = { fact: 'no', is: true }
const U: Condition = { fact: 'nobody-said', is: true }
const facts: CarFacts = { yes: true, no: false, nothing: null, seats: 2, roof: 'open' }

describe('conditions', () => {
  test.each<[string, Condition, boolean | 'unknown']>([
    ['a fact with that value', T, true],
    ['a fact with another value', F, false],
    ['a fact nobody gave', U, 'unknown'],
    ['a fact given as null', { fact: 'nothing', is: true }, 'unknown'],
    ['one of a list', { fact: 'roof', in: ['open', 'closed'] }, true],
    ['none of a list', { fact: 'roof', in: ['closed'] }, false],
    ['at least, on the figure', { fact: 'seats', atLeast: 2 }, true],
    ['at least, below it', { fact: 'seats', atLeast: 3 }, false],
    ['at least, of an unknown', { fact: 'doors', atLeast: 3 }, 'unknown'],
    ['all: true, true', { all: [T, T] }, true],
    ['all: true, false', { all: [T, F] }, false],
    ['all: true, unknown', { all: [T, U] }, 'unknown'],
    ['all: false, unknown', { all: [U, F] }, false],
    ['all: unknown, unknown', { all: [U, U] }, 'unknown'],
    ['any: false, false', { any: [F, F] }, false],
    ['any: true, unknown', { any: [U, T] }, true],
    ['any: false, unknown', { any: [F, U] }, 'unknown'],
    ['any: unknown, unknown', { any: [U, U] }, 'unknown'],
    ['not true', { not: T }, false],
    ['not false', { not: F }, true],
    ['not unknown', { not: U }, 'unknown'],
    ['a value that is not declared', { fact: 'roof', is: 'closed', among: ['closed', 'targa'] }, 'unknown'],
    ['not, of a value that is not declared', { not: { fact: 'roof', is: 'closed', among: ['closed', 'targa'] } }, 'unknown'],
  ])('%s', (_what, condition, expected) => {
    expect(evaluateCondition(condition, facts)).toBe(expected)
  })

  const names = ['belts', 'roof', 'tyres'] as const
  const value = fc.constantFrom('a', 'b', 'c')
  const tree = fc.letrec<{ node: Condition }>((tie) => ({
    node: fc.oneof(
      { maxDepth: 4 },
      fc.record({ fact: fc.constantFrom(...names), is: value }),
      fc.record({ fact: fc.constantFrom(...names), in: fc.array(value, { minLength: 1, maxLength: 2 }) }),
      fc.record({ all: fc.array(tie('node'), { minLength: 1, maxLength: 3 }) }),
      fc.record({ any: fc.array(tie('node'), { minLength: 1, maxLength: 3 }) }),
      fc.record({ not: tie('node') }),
    ),
  })).node
  const allFacts = fc.record({ belts: value, roof: value, tyres: value })
  const kept = fc.subarray([...names])

  test('a fact taken away leaves the answer or makes it unknown: it never turns it round', () => {
    fc.assert(
      fc.property(tree, allFacts, kept, (condition, all, keep) => {
        const fewer = Object.fromEntries(keep.map((name) => [name, all[name]]))
        expect([evaluateCondition(condition, all), 'unknown']).toContain(evaluateCondition(condition, fewer))
      }),
      { numRuns: 500, seed: 20260509 },
    )
  })
})

describe('which checks are asked', () => {
  const book = aBook(
    aChecklistWith(
      aCheck('wheels.harness', { applies: { fact: 'belts', is: 'harness' } }),
      aCheck('wheels.road', { applies: { not: { fact: 'belts', is: 'harness' } } }),
      aCheck('wheels.deep', { depth: 'full' }),
    ),
  )
  const ids = (checks: readonly { readonly id: string }[]) => checks.map((check) => check.id)

  test('a condition that is false takes its check away', () => {
    const harness = ids(applicableChecks(book, 'car', { belts: 'harness' }))
    expect(harness).toContain('wheels.harness')
    expect(harness).not.toContain('wheels.road')
  })

  test.each([{}, { belts: null }, { belts: 'rope' }])('with %j both checks stay: what is not known never takes one away', (known) => {
    expect(ids(applicableChecks(book, 'car', known))).toEqual(expect.arrayContaining(['wheels.harness', 'wheels.road']))
  })

  test('a person is asked a person’s checks only', () => {
    expect(ids(applicableChecks(book, 'person', {}))).toEqual(['kit.shoes'])
  })

  test('each depth asks all that the ones before it ask', () => {
    const at = (depth: 'look-over' | 'standard' | 'full') => ids(askedChecks(book, 'car', {}, depth))
    expect(at('look-over')).not.toContain('wheels.cap')
    expect(at('standard')).toEqual(expect.arrayContaining([...at('look-over'), 'wheels.cap']))
    expect(at('standard')).not.toContain('wheels.deep')
    expect(at('full')).toEqual(expect.arrayContaining([...at('standard'), 'wheels.deep']))
  })

  test('a check without a condition always applies', () => {
    expect(doesNotApply({}, { belts: 'harness' })).toBe(false)
  })
})
