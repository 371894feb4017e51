import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { applicableChecks, askedChecks, doesNotApply } from '@/lib/checklist/applicable-checks'
import type { CarFacts } from '@/lib/checklist/car-facts'
import type { Checklist, JudgedKind } from '@/lib/checklist/checklist'
import { judgeCheck } from '@/lib/checklist/judge-check'
import { openBook } from '@/lib/checklist/open-book'
import { parseChecklist } from '@/lib/checklist/parse-checklist'
import { limitsProblems, parseLimits } from '@/lib/checklist/parse-limits'
import { answersOf, closingSentence, walkByPlace } from '@/lib/checklist/places'
import { civilDate } from '@/lib/rules/civil-date'
import { RULES } from '@/lib/rules/registry'
import { checklistJson } from './read-checklist-file'

function shipped() {
  const checklist = parseChecklist(checklistJson('closed-circuit/v1.json'))
  const limits = parseLimits(checklistJson('limits/track-day.json'))
  if (!checklist.ok) throw new Error(JSON.stringify(checklist.problems, null, 2))
  if (!limits.ok) throw new Error(JSON.stringify(limits.problems, null, 2))
  return { checklist: checklist.checklist, limits: limits.limits }
}

const { checklist, limits } = shipped()
const book = openBook(checklist, limits, { checklist: 'c'.repeat(64), limits: 'd'.repeat(64) })

const standardCar: CarFacts = {
  belts: 'standard',
  roof: 'closed',
  tyres: 'road',
  passengerSeat: 'used',
  spacers: false,
  cooling: 'water',
  coolers: 'as-made',
  breather: 'as-made',
}
const harnessCar: CarFacts = { ...standardCar, belts: 'harness', headRestraint: false, shoulderAnchor: 'wrapped' }
const lastDay = civilDate('2026-05-10')

/** Every combination of fact values of one subject. */
function everyCombination(subject: JudgedKind, list: Checklist): CarFacts[] {
  return list.facts
    .filter((fact) => fact.subject === subject)
    .reduce<CarFacts[]>((all, fact) => all.flatMap((facts) => fact.values.map(({ value }) => ({ ...facts, [fact.name]: value }))), [{}])
}

function checkOf(id: string) {
  const check = book.byId.get(id)
  if (check === undefined) throw new Error(`no check ${id}`)
  return check
}

test('the shipped checklist and limits parse without a problem, together too', () => {
  expect(limitsProblems(checklist, limits)).toEqual([])
})

test('each station holds at least eight checks', () => {
  for (const station of checklist.stations)
    expect(checklist.checks.filter((check) => check.station === station.id).length, station.id).toBeGreaterThanOrEqual(8)
})

describe('the walk of a standard road car', () => {
  const asked = askedChecks(book, 'car', standardCar, 'standard')

  test('takes at most 40 answers, a closing sentence being one', () => {
    const answers = answersOf(walkByPlace(book, asked))
    expect(answers).toBeLessThanOrEqual(40)
    expect(answers).toBeGreaterThan(20)
  })

  test('goes once round the car and leaves no check without its place', () => {
    const walk = walkByPlace(book, asked)
    expect(walk.map((each) => each.place.id)).toEqual([
      'cabin',
      'front-left',
      'bonnet',
      'front-right',
      'rear-right',
      'rear-left',
      'underneath',
    ])
    expect(walk.flatMap((each) => [...each.oneByOne, ...each.closing])).toHaveLength(asked.length)
  })

  test('asks its road belts and nothing of a harness; a harness car the other way round', () => {
    const road = asked.map((check) => check.id)
    const harness = askedChecks(book, 'car', harnessCar, 'standard').map((check) => check.id)
    expect(road).toEqual(expect.arrayContaining(['belts.retractor', 'belts.anchors', 'harness.buckle', 'harness.webbing']))
    expect(road.filter((id) => id.startsWith('harness.'))).toEqual(['harness.buckle', 'harness.webbing'])
    expect(harness).toEqual(expect.arrayContaining(['harness.label', 'harness.shoulder-angle', 'harness.wrapped', 'harness.anchors']))
    expect(harness).not.toContain('belts.retractor')
  })

  test('closes a corner with a sentence that names what was seen', () => {
    const corner = walkByPlace(book, asked).find((each) => each.place.id === 'rear-left')
    if (corner === undefined) throw new Error('the walk has a rear left corner')
    expect(closingSentence(corner.place, corner.closing)).toBe('Rear left: clearance, tyre pairs, tyre marking seen, nothing found')
  })
})

describe('every check', () => {
  test('is asked of some car or person, and where it has a condition, not of every one', () => {
    for (const subject of ['car', 'person'] as const) {
      const combinations = everyCombination(subject, checklist)
      for (const check of book.checks.filter((each) => each.subject === subject)) {
        expect(
          combinations.some((facts) => !doesNotApply(check, facts)),
          `${check.id} can be asked`,
        ).toBe(true)
        expect(
          combinations.some((facts) => doesNotApply(check, facts)),
          `${check.id} falls away only by its condition`,
        ).toBe(check.applies !== undefined)
      }
    }
  })

  test('with a condition says what it means when it does not apply', () => {
    for (const check of checklist.checks) expect(check.naMeans !== undefined, check.id).toBe(check.applies !== undefined)
  })

  test('ends its reasons with "Anything else I do not like" and offers others', () => {
    for (const check of checklist.checks) {
      expect(check.reasons.at(-1), check.id).toEqual({ id: 'other', text: 'Anything else I do not like' })
      expect(check.reasons.length, check.id).toBeGreaterThanOrEqual(3)
    }
  })

  test('names its grounds; a limit or figure has more than custom behind it', () => {
    for (const check of checklist.checks) {
      expect(check.source?.length, check.id).toBeGreaterThan(0)
      const hasFigure = check.rule !== undefined || /\d/.test(`${check.prompt} ${check.how}`)
      if (hasFigure)
        expect(
          check.source?.some((each) => each.confidence !== 'common practice'),
          check.id,
        ).toBe(true)
    }
  })

  test('that is perishable is asked at every depth', () => {
    for (const check of checklist.checks) if (!check.standing) expect(check.depth, check.id).toBe('look-over')
  })
})

test('every fact is read by a condition or a rule: nobody is asked for nothing', () => {
  const used = JSON.stringify([
    checklist.checks.map((check) => [check.applies, check.rule?.inputs]),
    checklist.facts.map((fact) => fact.applies),
  ])
  for (const fact of checklist.facts) expect(used, fact.name).toContain(`"fact":"${fact.name}"`)
})

test('every rule is used, and the limits name its every figure', () => {
  const used = new Set(checklist.checks.flatMap((check) => (check.rule ? [check.rule.name] : [])))
  expect([...used].sort()).toEqual([...RULES.keys()].sort())
  for (const rule of RULES.values())
    expect(Object.keys(limits.rules[rule.name] ?? {}).sort(), rule.name).toEqual(Object.keys(rule.defaults as object).sort())
})

test('tyres and tread are asked again in the wet, the passenger’s belts when one is added', () => {
  expect(checklist.checks.filter((check) => check.tags?.includes('wet')).map((check) => check.id)).toEqual(['tyres.tread', 'tyres.slicks'])
  expect(checklist.checks.filter((check) => check.tags?.includes('passenger')).map((check) => check.id)).toEqual(['belts.passenger'])
})

describe('what is not known', () => {
  const combinations = everyCombination('car', checklist)

  test('never takes a check away: with fewer facts at least the same checks are asked', () => {
    const names = checklist.facts.map((fact) => fact.name)
    fc.assert(
      fc.property(
        fc.constantFrom(...combinations),
        fc.subarray(names),
        fc.constantFrom('look-over', 'standard', 'full'),
        (all, hidden, depth) => {
          const fewer = Object.fromEntries(Object.entries(all).filter(([name]) => !hidden.includes(name)))
          const asked = new Set(askedChecks(book, 'car', fewer, depth).map((check) => check.id))
          for (const check of askedChecks(book, 'car', all, depth)) expect(asked.has(check.id), check.id).toBe(true)
        },
      ),
      { numRuns: 300, seed: 20260509 },
    )
  })

  test('nor does a value that nobody declared', () => {
    const asked = (facts: CarFacts) => applicableChecks(book, 'car', facts).map((check) => check.id)
    expect(asked({ ...standardCar, belts: 'rope' })).toEqual(asked({ ...standardCar, belts: null }))
  })

  test('is judged undecided, never ok', () => {
    for (const check of book.checks.filter((each) => each.rule !== undefined))
      expect(judgeCheck(check, undefined, {}, lastDay)?.outcome, check.id).toBe('undecided')
  })
})

describe('values are judged by the check’s rule under the limits in force', () => {
  test.each([
    ['harness.shoulder-angle', { runMm: 250, dropMm: 300 }, 'fail'],
    ['harness.shoulder-angle', { runMm: 600, dropMm: 100 }, 'ok'],
    ['harness.label', { standard: 'fia-8853-2016', labelYear: 2025, labelsComplete: 'yes', labelsSameNumber: 'yes' }, 'fail'],
    ['harness.label', { standard: 'fia-8853-2016', labelYear: 2028, labelsComplete: 'yes', labelsSameNumber: 'yes' }, 'ok'],
    ['tyres.tread.front-left', { leastMm: 1.5, innerEdgeMm: 3 }, 'fail'],
    ['tyres.tread.rear-right', { leastMm: 1.6, innerEdgeMm: 3 }, 'advisory'],
    ['tyres.date-code.rear-left', { dateCode: '0716' }, 'fail'],
    ['engine.leaks.bonnet', { fluid: 'fuel', leakClass: 'wet', reaches: 'nothing' }, 'fail'],
    ['engine.leaks.underneath', { fluid: 'engine-oil', leakClass: 'drops-form', reaches: 'nothing' }, 'advisory'],
  ])('%s %j is %s', (id, measured, outcome) => {
    expect(judgeCheck(checkOf(id), measured, harnessCar, lastDay)?.outcome).toBe(outcome)
  })

  test('a helmet by what the person rides in: an open face is not for an open car', () => {
    const measured = { label: 'ece-22.06-j', secondLabel: 'none', face: 'open', madeYear: 2025, madeMonth: 3, impact: 'no' }
    expect(judgeCheck(checkOf('helmet.label'), measured, { openCar: true }, lastDay)?.outcome).toBe('fail')
    expect(judgeCheck(checkOf('helmet.label'), measured, { openCar: false }, lastDay)?.outcome).not.toBe('fail')
  })

  test('an emptied field is a missing one', () => {
    expect(judgeCheck(checkOf('tyres.date-code.front-left'), { dateCode: '' }, {}, lastDay)?.outcome).toBe('undecided')
  })

  test('a check without a rule is not judged', () => {
    expect(judgeCheck(checkOf('wheels.nuts.front-left'), undefined, {}, lastDay)).toBeNull()
  })
})
