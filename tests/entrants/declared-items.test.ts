import { describe, expect, test } from 'vitest'
import { askedAtHome, declaredKey, readDeclaredKey } from '@/lib/checklist/declarable'
import { preCheck, worstPreCheck } from '@/lib/checklist/pre-check'
import { NOTHING_DECLARED } from '@/lib/contracts/declaration'
import { declaredItems, personFacts, sumOf } from '@/lib/entrants/declared-items'
import { fieldsAsked } from '@/lib/entrants/fields-asked'
import { BOOK, CHECKS, IDA, SUNDAY } from './the-book'

const check = (id: string) => BOOK.byId.get(id)!
const items = (facts: object, answers: object = {}) =>
  declaredItems(CHECKS, { ...NOTHING_DECLARED, facts, answers } as typeof NOTHING_DECLARED, [IDA], SUNDAY)
const keys = (facts: object) => items(facts).map(({ key }) => key)

describe('what an entrant is asked at home', () => {
  test.each([
    ['harness.label', 'label'],
    ['tyres.date-code.rear-left', 'label'],
    ['tyres.tread.front-left', 'label'],
    ['helmet.label', 'label'],
    ['belts.anchors', 'statement'],
    // What needs the trade's eye or an instrument at the car.
    ['engine.leaks.bonnet', null],
    ['harness.shoulder-angle', null],
    ['wheels.nuts.front-left', null],
    ['helmet.shell', null],
  ])('%s: %s', (id, asked) => {
    expect(askedAtHome(check(id))).toBe(asked)
  })

  test('only what applies is asked: road belts have no harness label, a harness no road belt', () => {
    expect(keys({ belts: 'standard' })).not.toContain('harness.label')
    expect(keys({ belts: 'harness' })).toContain('harness.label')
    expect(keys({ belts: 'harness' })).not.toContain('belts.anchors')
  })

  test('a fact that is not known asks everything that may hang on it', () => {
    expect(keys({})).toEqual(expect.arrayContaining(['harness.label', 'belts.anchors', declaredKey('helmet.label', IDA)]))
  })

  test('of a belt’s label only the one date is asked that it carries', () => {
    const asked = (standard: string) => fieldsAsked(check('harness.label'), { standard }).map(({ id }) => id)
    expect(asked('fia-8853-2016')).toEqual(['standard', 'labelYear', 'labelsComplete', 'labelsSameNumber'])
    expect(asked('sfi-16.1')).toEqual(['standard', 'madeYear', 'madeMonth', 'labelsComplete', 'labelsSameNumber'])
    expect(asked('')).toEqual(['standard', 'labelsComplete', 'labelsSameNumber'])
  })

  test.each([
    [
      { roof: 'open', belts: 'harness', headRestraint: true },
      { openCar: true, headRestraintWorn: true },
    ],
    [
      { roof: 'closed', belts: 'standard', headRestraint: true },
      { openCar: false, headRestraintWorn: false },
    ],
    [{}, {}],
  ])('a car of %j says %j of who sits in it', (car, person) => {
    expect(personFacts(car)).toEqual(person)
  })
})

describe('the pre-check', () => {
  const label = (labelYear?: number) => ({
    standard: 'fia-8853-2016',
    labelYear: labelYear ?? null,
    labelsComplete: 'yes',
    labelsSameNumber: 'yes',
  })

  test.each([
    ['harness.label', label(2028), 'would be passed'],
    ['harness.label', label(2025), 'would not be passed'],
    ['harness.label', label(), 'not answered'],
    ['harness.label', {}, 'not answered'],
    ['tyres.date-code.rear-left', { dateCode: '0119' }, 'will be looked at'],
    ['tyres.date-code.rear-left', { dateCode: '0110' }, 'would not be passed'],
    ['tyres.tread.rear-left', { leastMm: 5.5 }, 'not answered'],
    ['belts.anchors', { so: 'yes' }, 'would be passed'],
    ['belts.anchors', { so: 'no' }, 'would not be passed'],
    ['belts.anchors', {}, 'not answered'],
    ['belts.anchors', { so: 'perhaps' }, 'not answered'],
  ])('%s with %j: %s', (id, values, says) => {
    expect(preCheck(check(id), values, {}, SUNDAY).preCheck).toBe(says)
  })

  test('the worst stands, and of nothing at all nothing is passed', () => {
    expect(worstPreCheck(['would be passed', 'not answered', 'will be looked at'])).toBe('not answered')
    expect(worstPreCheck(['would be passed', 'would not be passed', 'not answered'])).toBe('would not be passed')
    expect(worstPreCheck([])).toBe('not answered')
  })

  test('a statement nobody answered keeps nothing open; a no to one does not pass', () => {
    const facts = { belts: 'standard', roof: 'closed', tyres: 'slick' }
    const tyres = ['front-left', 'front-right', 'rear-right', 'rear-left'].map((at) => [`tyres.date-code.${at}`, { dateCode: '2024' }])
    const helmet = { label: 'snell-sa2020', secondLabel: 'none', face: 'full', madeYear: 2024, madeMonth: 1, impact: 'no' }
    const answers = { ...Object.fromEntries(tyres), [declaredKey('helmet.label', IDA)]: helmet }

    expect(sumOf(items(facts, answers))).toEqual({ says: 'would be passed', answered: 5, asked: 5 })
    expect(sumOf(items(facts, { ...answers, 'belts.anchors': { so: 'no' } }))).toEqual({
      says: 'would not be passed',
      answered: 6,
      asked: 6,
    })
    expect(sumOf(items(facts)).says).toBe('not answered')
  })
})

test.each([
  ['harness.label', null],
  ['helmet.label', IDA],
])('the key of %s and %s is read back', (id, person) => {
  expect(readDeclaredKey(declaredKey(id, person))).toEqual({ check: id, person })
})
