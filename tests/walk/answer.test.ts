import { expect, test } from 'vitest'
import { answerCheck, isRefusal, type Answer } from '@/lib/walk/answer'
import { civilDate } from '@/lib/rules/civil-date'
import { paddockCheck } from '../support/paddock-book'

const LAST_DAY = civilDate('2026-05-10')
const car = { car: 'e' }
const tread = (answer: Answer) => answerCheck(car, paddockCheck('wheels.tread'), answer, {}, LAST_DAY)
const depth = (depthMm: number) => ({ depthMm })

test.each([
  ['ok', 1.5, 'ok'],
  ['ok', 1.5, 'advisory'],
  ['ok', 1.9, 'ok'],
] as const)('[T1] an answer is never milder than the rule: %s at %s mm is refused as %s', (_, mm, say) => {
  const answer: Answer = say === 'ok' ? { say, values: depth(mm) } : { say, values: depth(mm), reason: 'other' }
  expect(tread(answer)).toMatchObject({ refused: 'milder-than-rule' })
})

test('a person may always be more severe than the rule', () => {
  expect(tread({ say: 'fail', values: depth(8), reason: 'other' })).toMatchObject({
    outcome: 'fail',
    reason: 'other',
    measured: { depthMm: 8 },
    judgement: { outcome: 'ok' },
  })
  expect(tread({ say: 'advisory', values: depth(8), reason: 'other' })).toMatchObject({ outcome: 'advisory' })
})

test('an answer the rule agrees with carries its values, its judgement and the limits it was made under', () => {
  expect(tread({ say: 'ok', values: depth(3) })).toMatchObject({
    kind: 'finding',
    outcome: 'ok',
    measured: { depthMm: 3 },
    judgement: { outcome: 'ok', code: expect.stringMatching(/^tyre-tread\./) },
    paramsHash: paddockCheck('wheels.tread').paramsHash,
  })
})

test('[F3] a missing value is never an ok, and never an advisory', () => {
  expect(tread({ say: 'ok', values: {} })).toMatchObject({ refused: 'value-missing' })
  expect(tread({ say: 'advisory', values: {}, reason: 'other' })).toMatchObject({ refused: 'value-missing' })
})

test('[F3] a measured check without a rule still wants something measured', () => {
  const { rule: _, ...unruled } = paddockCheck('wheels.tread')
  const check = { ...unruled, paramsHash: null }
  expect(answerCheck(car, check, { say: 'ok', values: {} }, {}, LAST_DAY)).toMatchObject({ refused: 'value-missing' })
  expect(answerCheck(car, check, { say: 'ok', values: depth(1) }, {}, LAST_DAY)).toMatchObject({ outcome: 'ok' })
})

test('a fail needs no value: what is wrong can be seen before it is measured', () => {
  expect(tread({ say: 'fail', values: {}, reason: 'other' })).toMatchObject({ outcome: 'fail', reason: 'other' })
})

test('could not see is an outcome, and carries no value that would look like a look', () => {
  const seen = tread({ say: 'could-not-see' })
  expect(seen).toMatchObject({ outcome: 'could-not-see' })
  expect(seen).not.toHaveProperty('measured')
  expect(seen).not.toHaveProperty('judgement')
})

test('put right here keeps the state met beside the state left, in one finding', () => {
  expect(tread({ say: 'put-right', found: { values: depth(1), reason: 'other' }, values: depth(6) })).toMatchObject({
    outcome: 'ok',
    measured: { depthMm: 6 },
    found: { outcome: 'fail', values: { depthMm: 1 }, reason: 'other' },
  })
})

test('put right to no better than the advisory band reads advisory', () => {
  expect(tread({ say: 'put-right', found: { values: depth(1), reason: 'other' }, values: depth(1.8) })).toMatchObject({
    outcome: 'advisory',
  })
})

test('what was not put right enough is not put right, and nothing measured anew is nothing seen', () => {
  const found = { values: depth(1), reason: 'other' }
  expect(isRefusal(tread({ say: 'put-right', found, values: depth(1.2) }))).toBe(true)
  expect(tread({ say: 'put-right', found, values: {} })).toMatchObject({ refused: 'value-missing' })
})

test('free text goes by its reference, never in the record', () => {
  const said = answerCheck(car, paddockCheck('brakes.pads'), { say: 'fail', values: {}, reason: 'other' }, {}, LAST_DAY, 'note:words')
  expect(said).toMatchObject({ notes: ['note:words'] })
})
