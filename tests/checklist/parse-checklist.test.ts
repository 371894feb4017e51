import { describe, expect, test } from 'vitest'
import { parseChecklist } from '@/lib/checklist/parse-checklist'
import { limitsProblems, parseLimits } from '@/lib/checklist/parse-limits'
import { aCheck, aChecklist, aChecklistWith } from './a-checklist'

function problemsOf(json: unknown) {
  const parsed = parseChecklist(json)
  return parsed.ok ? [] : parsed.problems
}

const number = (id: string, min: number, max: number) => ({ kind: 'number', id, label: 'A figure', unit: 'mm', min, max, decimals: 0 })
const fact = (name: string, subject = 'car', extra = {}) => ({
  name,
  subject,
  label: 'A fact',
  values: [
    { value: 'a', label: 'Aa' },
    { value: 'b', label: 'Bb' },
  ],
  ...extra,
})
const tread = (inputs: unknown, params: unknown = { failBelowMm: 1.6, adviseBelowMm: 2 }, measure: unknown[] = [number('least', 0, 20)]) =>
  aCheck('wheels.extra', { measure, rule: { name: 'tyre-tread', inputs, params } })
const hold = (changes: object) => ({ id: 'extra', text: 'Extra', subject: 'car', stations: [], checks: [], ...changes })
const withFact = (added: object) => ({ ...aChecklist(), facts: [...(aChecklist()['facts'] as object[]), added] })

test('a checklist that is right parses without a problem', () => {
  expect(problemsOf(aChecklist())).toEqual([])
})

describe('each thing that can be wrong is named with its path', () => {
  // The extra check is the fifth: checks[4].
  test.each<[string, unknown, string, RegExp]>([
    ['an unknown station', aChecklistWith(aCheck('a.b', { station: 'none' })), 'checks[4].station', /no station none/],
    ['a station of another subject', aChecklistWith(aCheck('a.b', { station: 'kit' })), 'checks[4].station', /about a person/],
    ['an unknown place', aChecklistWith(aCheck('a.b', { place: 'none' })), 'checks[4].place', /no place none/],
    ['an unknown corner', aChecklistWith(aCheck('a.b', { place: ['left', 'none'] })), 'checks[4].place[1]', /no place none/],
    ['a place of another subject', aChecklistWith(aCheck('a.b', { place: 'desk' })), 'checks[4].place', /about a person/],
    ['a corner named twice', aChecklistWith(aCheck('a.b', { place: ['left', 'left'] })), 'checks[4].place', /named twice/],
    ['a check id used twice', aChecklistWith(aCheck('wheels.cap')), 'checks[4].id', /wheels\.cap is used twice/],
    ['an id that meets that of a corner', aChecklistWith(aCheck('wheels.nuts.left')), 'checks[4].id', /wheels\.nuts\.left is used twice/],
    ['a fact named twice', withFact(fact('belts')), 'facts[3].name', /belts is used twice/],
    [
      'a measure id used twice',
      aChecklistWith(aCheck('a.b', { measure: [number('x', 0, 1), number('x', 0, 1)] })),
      'checks[4].measure[1].id',
      /twice/,
    ],
    [
      'a reason id used twice',
      aChecklistWith(aCheck('a.b', { reasons: ['other', 'worn', 'worn'].map((id) => ({ id, text: 'A reason' })) })),
      'checks[4].reasons[2].id',
      /worn is used twice/,
    ],
    [
      'an option id used twice',
      aChecklistWith(
        aCheck('a.b', { measure: [{ kind: 'choice', id: 'c', label: 'Cc', options: ['x', 'x'].map((id) => ({ id, label: 'Xx' })) }] }),
      ),
      'checks[4].measure[0].options[1].id',
      /x is used twice/,
    ],
    [
      'a check that reopens nothing known',
      aChecklistWith(aCheck('a.b', { reopens: ['a.none'] })),
      'checks[4].reopens[0]',
      /no check a\.none/,
    ],
    ['a check that reopens itself', aChecklistWith(aCheck('a.b', { reopens: ['a.b'] })), 'checks[4].reopens[0]', /itself/],
    [
      'a corner that reopens its own',
      aChecklistWith(aCheck('a.b', { place: ['left', 'right'], reopens: ['a.b.left'] })),
      'checks[4].reopens[0]',
      /itself/,
    ],
    [
      'a check that reopens a person’s',
      aChecklistWith(aCheck('a.b', { reopens: ['kit.shoes'] })),
      'checks[4].reopens[0]',
      /about a person/,
    ],
    [
      'a condition on an unknown fact',
      aChecklistWith(aCheck('a.b', { applies: { fact: 'cage', is: 'full' } })),
      'checks[4].applies',
      /no fact cage/,
    ],
    [
      'a condition, deep inside, on a value not in the list',
      aChecklistWith(aCheck('a.b', { applies: { all: [{ not: { any: [{ fact: 'belts', in: ['standard', 'rope'] }] } }] } })),
      'checks[4].applies.all[0].not.any[0]',
      /no value "rope"/,
    ],
    [
      'a condition on a fact of another subject',
      aChecklistWith(aCheck('a.b', { applies: { fact: 'openCar', is: true } })),
      'checks[4].applies',
      /about a person/,
    ],
    [
      'a number asked of words',
      aChecklistWith(aCheck('a.b', { applies: { fact: 'belts', atLeast: 2 } })),
      'checks[4].applies',
      /no number/,
    ],
    [
      'a fact asked on an unknown fact',
      withFact(fact('extra', 'car', { applies: { fact: 'cage', is: 'full' } })),
      'facts[3].applies',
      /no fact cage/,
    ],
    [
      'a no-go item that is not required',
      aChecklistWith(aCheck('a.b', { critical: true, required: false })),
      'checks[4].required',
      /must be required/,
    ],
    [
      'a check without the reason "other"',
      aChecklistWith(aCheck('a.b', { reasons: [{ id: 'worn', text: 'Worn' }] })),
      'checks[4].reasons',
      /"other"/,
    ],
    ['a range turned round', aChecklistWith(aCheck('a.b', { measure: [number('x', 5, 5)] })), 'checks[4].measure[0].min', /not below/],
    ['an unknown rule', aChecklistWith(aCheck('a.b', { rule: { name: 'none', inputs: {} } })), 'checks[4].rule.name', /no rule none/],
    ['an unknown rule input', aChecklistWith(tread({ depth: { measure: 'least' } })), 'checks[4].rule.inputs.depth', /no input depth/],
    ['an unknown measure', aChecklistWith(tread({ leastMm: { measure: 'most' } })), 'checks[4].rule.inputs.leastMm', /measures no most/],
    [
      'an input from an unknown fact',
      aChecklistWith(tread({ leastMm: { fact: 'cage' } })),
      'checks[4].rule.inputs.leastMm',
      /no fact cage/,
    ],
    [
      'an input from another subject’s fact',
      aChecklistWith(tread({ leastMm: { fact: 'openCar' } })),
      'checks[4].rule.inputs.leastMm',
      /about a person/,
    ],
    [
      'a fact value the rule cannot read',
      aChecklistWith(tread({ leastMm: { fact: 'belts' } })),
      'checks[4].rule.inputs.leastMm',
      /cannot read "standard", "harness"/,
    ],
    [
      'a range the rule cannot read',
      aChecklistWith(tread({ leastMm: { measure: 'least' } }, undefined, [number('least', 0, 900)])),
      'checks[4].rule.inputs.leastMm',
      /cannot read 900/,
    ],
    [
      'limits that the rule does not take',
      aChecklistWith(tread({ leastMm: { measure: 'least' } }, { failBelowMm: 'deep', adviseBelowMm: 2 })),
      'checks[4].rule.params.failBelowMm',
      /number/,
    ],
    [
      'a limit left out',
      aChecklistWith(tread({ leastMm: { measure: 'least' } }, { failBelowMm: 1.6 })),
      'checks[4].rule.params.adviseBelowMm',
      /missing/,
    ],
    [
      'a hold on an unknown station',
      aChecklist({ holdReasons: [hold({ stations: ['none'] })] }),
      'holdReasons[0].stations[0]',
      /no station none/,
    ],
    [
      'a hold of a car on a person’s station',
      aChecklist({ holdReasons: [hold({ stations: ['kit'] })] }),
      'holdReasons[0].stations[0]',
      /about a person/,
    ],
    [
      'a hold on an unknown check',
      aChecklist({ holdReasons: [hold({ checks: ['a.none'] })] }),
      'holdReasons[0].checks[0]',
      /no check a\.none/,
    ],
    [
      'a hold on a check per corner without its corner',
      aChecklist({ holdReasons: [hold({ checks: ['wheels.nuts'] })] }),
      'holdReasons[0].checks[0]',
      /each corner/,
    ],
    [
      'a hold of a car on a person’s check',
      aChecklist({ holdReasons: [hold({ checks: ['kit.shoes'] })] }),
      'holdReasons[0].checks[0]',
      /about a person/,
    ],
    ['a field nobody knows', aChecklistWith(aCheck('a.b', { colour: 'red' })), 'checks[4]', /colour/],
    ['an id without its dot', aChecklistWith(aCheck('nuts')), 'checks[4].id', /not written/],
    ['an unknown depth', aChecklistWith(aCheck('a.b', { depth: 'deep' })), 'checks[4].depth', /look-over, standard, full/],
  ])('%s', (_what, json, path, words) => {
    expect(problemsOf(json)).toEqual([{ path, problem: expect.stringMatching(words) }])
  })
})

test('all problems come at once, those of shape and those of reference, and a broken entry is not also called missing', () => {
  const json = aChecklist({
    stations: [
      { id: 'wheels', title: 'Wheels', short: 'Wheels', subject: 'lorry' },
      { id: 'kit', title: 'Kit', short: 'Kit', subject: 'person' },
    ],
    holdReasons: [hold({ stations: ['wheels', 'none'] })],
  })
  expect(problemsOf(json).map((each) => each.path)).toEqual(['stations[0].subject', 'holdReasons[0].stations[1]'])
})

test.each([null, 7, 'text', [], {}])('what is no checklist at all is answered with problems: %j', (json) => {
  expect(problemsOf(json).length).toBeGreaterThan(0)
})

describe('limits', () => {
  const limits = (rules: unknown) => ({ id: 'day', version: 1, title: 'A day', rules })

  test('a set that changes one figure of a rule parses', () => {
    expect(parseLimits(limits({ 'tyre-tread': { failBelowMm: 1.8 } })).ok).toBe(true)
  })

  test.each<[string, unknown, string]>([
    ['an unknown rule', { none: {} }, 'rules.none'],
    ['a limit the rule has not', { 'tyre-tread': { failBelowInch: 1 } }, 'rules.tyre-tread'],
    ['a limit of the wrong kind', { 'tyre-tread': { failBelowMm: 'deep' } }, 'rules.tyre-tread.failBelowMm'],
    ['limits that cross', { 'tyre-tread': { failBelowMm: 3 } }, 'rules.tyre-tread'],
    ['fuel leaks allowed', { 'leak-class': { fuel: ['advisory', 'fail', 'fail'] } }, 'rules.leak-class.fuel'],
  ])('%s is refused with its path', (_what, rules, path) => {
    const parsed = parseLimits(limits(rules))
    expect(parsed.ok ? [] : parsed.problems.map((each) => each.path)).toEqual([path])
  })

  test('limits that cross with what the checklist itself sets are found before the two are used together', () => {
    const checklist = parseChecklist(aChecklist())
    const day = parseLimits(limits({ 'tyre-tread': { failBelowMm: 1.8 } }))
    if (!checklist.ok || !day.ok) throw new Error('both are right by themselves')
    expect(limitsProblems(checklist.checklist, day.limits)).toEqual([])
    const own = {
      ...checklist.checklist,
      checks: checklist.checklist.checks.map((check) =>
        check.rule ? { ...check, rule: { ...check.rule, params: { failBelowMm: 1, adviseBelowMm: 1.5 } } } : check,
      ),
    }
    expect(limitsProblems(own, day.limits).map((each) => each.path)).toEqual(['rules.tyre-tread'])
  })
})
