import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { applicableChecks, askedChecks } from '@/lib/checklist/applicable-checks'
import type { CarFacts } from '@/lib/checklist/car-facts'
import type { Depth } from '@/lib/checklist/checklist'
import { judgeCheck } from '@/lib/checklist/judge-check'
import { openCheckedBook } from '@/lib/checklist/open-checked-book'
import { parseChecklist } from '@/lib/checklist/parse-checklist'
import { parseLimits } from '@/lib/checklist/parse-limits'
import { answersOf, closingSentence, walkByPlace } from '@/lib/checklist/places'
import { civilDate } from '@/lib/rules/civil-date'
import { checklistJson } from './read-checklist-file'

function shipped() {
  const checklist = parseChecklist(checklistJson('closed-circuit/v2.json'))
  const limits = parseLimits(checklistJson('limits/track-day.json'))
  if (!checklist.ok) throw new Error(JSON.stringify(checklist.problems, null, 2))
  if (!limits.ok) throw new Error(JSON.stringify(limits.problems, null, 2))
  return openCheckedBook(checklist.checklist, limits.limits, { checklist: 'c'.repeat(64), limits: 'd'.repeat(64) })
}

const book = shipped()
const { checklist } = book
const v1 = parseChecklist(checklistJson('closed-circuit/v1.json'))

const ROAD_CAR: CarFacts = {
  belts: 'standard',
  roof: 'closed',
  build: 'standard',
  tyres: 'road',
  passengerSeat: 'used',
  spacers: false,
  cooling: 'water',
  coolers: 'as-made',
  breather: 'as-made',
}
const CAGED_CAR: CarFacts = {
  ...ROAD_CAR,
  belts: 'harness',
  headRestraint: true,
  shoulderAnchor: 'wrapped',
  build: 'changed',
  seat: 'bucket',
  cage: 'full',
  bare: true,
  batteryMoved: true,
  cutOff: true,
  extinguisher: 'plumbed',
  wing: true,
}

const walk = (facts: CarFacts, depth: Depth) => walkByPlace(book, askedChecks(book, 'car', facts, depth))
const ids = (subject: 'car' | 'person' | 'fit', facts: CarFacts) => applicableChecks(book, subject, facts).map(({ id }) => id)

test.each(['seat', 'harness', 'cage', 'helmet-kit', 'engine-bay', 'wheels-tyres', 'cabin', 'battery-fire', 'body', 'sign-on', 'fit'])(
  'the station %s is there at full length',
  (station) => {
    expect(checklist.checks.filter((check) => check.station === station).length).toBeGreaterThanOrEqual(8)
  },
)

describe('how many answers a walk takes', () => {
  test('a standard road car: at most 40, a closing sentence being one', () => {
    expect(answersOf(walk(ROAD_CAR, 'standard'))).toBeLessThanOrEqual(40)
    expect(answersOf(walk(ROAD_CAR, 'standard'))).toBeGreaterThan(25)
  })

  test('a caged one takes more, and each place still closes with one sentence', () => {
    expect(answersOf(walk(CAGED_CAR, 'standard'))).toBeGreaterThan(answersOf(walk(ROAD_CAR, 'standard')))
    expect(answersOf(walk(CAGED_CAR, 'full'))).toBeLessThanOrEqual(55)
  })

  test('of a road car the walk is one lap, then tail and underneath; nobody looks for a cage', () => {
    expect(walk(ROAD_CAR, 'standard').map(({ place }) => place.id)).toEqual([
      'cabin',
      'front-left',
      'bonnet',
      'front-right',
      'rear-right',
      'rear-left',
      'tail',
      'underneath',
    ])
    const tail = walk(ROAD_CAR, 'standard').find(({ place }) => place.id === 'tail')
    if (tail === undefined) throw new Error('the walk has a tail')
    expect(closingSentence(tail.place, tail.closing)).toBe(
      'Tail: boot, brake lights, panels, towing eyes, tail and doors, numbers seen, nothing found',
    )
  })
})

describe('what applies', () => {
  test('a car as the maker built it is asked nothing of cage, bucket seat, cut-off or wing', () => {
    const asked = ids('car', ROAD_CAR)
    for (const part of ['cage.', 'seat.fixings', 'battery.cut-off', 'battery.extinguisher', 'body.wing'])
      expect(
        asked.filter((id) => id.startsWith(part)),
        part,
      ).toEqual([])
    expect(asked).toContain('seat.still')
  })

  test('a fit matters where there is a harness, a cage or no roof; in a closed road car nobody is asked for one', () => {
    expect(ids('fit', ROAD_CAR)).toEqual([])
    expect(ids('fit', { ...ROAD_CAR, roof: 'open' })).toEqual(['fit.head-line', 'fit.pedals', 'fit.release', 'fit.open-car', 'fit.support'])
    expect(ids('fit', CAGED_CAR)).toEqual(expect.arrayContaining(['fit.head-line', 'fit.belts', 'fit.padding', 'fit.head-restraint']))
  })

  test('consent is asked of who is under age, and of who nobody knows about', () => {
    expect(ids('person', { minor: false })).not.toContain('sign-on.consent')
    expect(ids('person', { minor: true })).toContain('sign-on.consent')
    expect(ids('person', {})).toContain('sign-on.consent')
  })

  test('the wet asks for tread, slicks, brake and rain lights and wipers again', () => {
    expect(checklist.checks.filter(({ tags }) => tags?.includes('wet')).map(({ id }) => id)).toEqual(
      expect.arrayContaining(['tyres.tread', 'tyres.slicks', 'battery.brake-lights', 'cabin.view']),
    )
  })

  test('what is not known never takes a check away', () => {
    const names = Object.keys(CAGED_CAR)
    fc.assert(
      fc.property(fc.constantFrom(ROAD_CAR, CAGED_CAR), fc.subarray(names), fc.constantFrom('car', 'fit'), (all, hidden, subject) => {
        const fewer = Object.fromEntries(Object.entries(all).filter(([name]) => !hidden.includes(name)))
        const asked = new Set(ids(subject, fewer))
        for (const id of ids(subject, all)) expect(asked.has(id), id).toBe(true)
      }),
      { numRuns: 300, seed: 20260509 },
    )
  })
})

describe('every check', () => {
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
      const confidences = check.source?.map(({ confidence }) => confidence) ?? []
      if (hasFigure)
        expect(
          confidences.some((each) => each !== 'common practice'),
          check.id,
        ).toBe(true)
    }
  })

  test('that is perishable is asked at every depth', () => {
    for (const check of checklist.checks) if (!check.standing) expect(check.depth, check.id).toBe('look-over')
  })

  test('with a rule is undecided while nothing was measured, never ok', () => {
    for (const check of book.checks.filter(({ rule }) => rule !== undefined))
      expect(judgeCheck(check, undefined, {}, civilDate('2026-05-10'))?.outcome, check.id).toBe('undecided')
  })

  test('of the first version keeps its id; the open face moved to the fit', () => {
    if (!v1.ok) throw new Error('the first version does not parse')
    const now = new Set(checklist.checks.map(({ id }) => id))
    expect(v1.checklist.checks.map(({ id }) => id).filter((id) => !now.has(id))).toEqual(['helmet.open-car'])
  })
})

test('every fact is read by a condition or a rule: nobody is asked for nothing', () => {
  const used = JSON.stringify([
    checklist.checks.map((check) => [check.applies, check.rule?.inputs]),
    checklist.facts.map(({ applies }) => applies),
  ])
  for (const fact of checklist.facts) expect(used, fact.name).toContain(`"fact":"${fact.name}"`)
})
