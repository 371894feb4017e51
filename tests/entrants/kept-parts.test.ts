import { describe, expect, test } from 'vitest'
import { NOTHING_DECLARED } from '@/lib/contracts/declaration'
import { changedParts, reopenedBy } from '@/lib/entrants/changed-parts'
import { cleanParts, factsToKeep, partsKept } from '@/lib/entrants/kept-parts'
import { CHECKS, FACTS, IDA } from './the-book'

const HELMET = `helmet.label@${IDA}`
const parts = {
  ...NOTHING_DECLARED,
  facts: { belts: 'harness', roof: 'open' },
  answers: {
    'harness.label': { standard: 'fia-8853-2016', labelYear: 2028 },
    'tyres.date-code.rear-left': { dateCode: '2024' },
    'tyres.tread.rear-left': { leastMm: 5.5 },
    [HELMET]: { impact: 'no' },
  },
}

describe('what is kept of a car for next time', () => {
  test('facts and labels come back as they were; tread, which wears, and the kit, which is a person’s, do not', () => {
    const back = partsKept(factsToKeep(parts, CHECKS), FACTS, CHECKS)

    expect(back.facts).toEqual(parts.facts)
    expect(Object.keys(back.answers)).toEqual(['harness.label', 'tyres.date-code.rear-left'])
    expect(back.answers['harness.label']).toEqual(parts.answers['harness.label'])
  })

  test('what another checklist kept and this one does not know is left out, not misread', () => {
    const back = partsKept(
      { belts: 'string', wings: true, 'harness.label/labelYear': 1066, 'harness.label/colour': 'red', 'gone.check/x': 1 },
      FACTS,
      CHECKS,
    )

    expect([back.facts, back.answers]).toEqual([{}, {}])
  })
})

describe('a declaration is cleaned before it is kept', () => {
  test.each([
    ['a car’s check said of a person', { [`harness.label@${IDA}`]: { labelYear: 2028 } }, {}],
    ['a person’s check said of the car', { 'helmet.label': { impact: 'no' } }, {}],
    ['the kit of somebody else', { 'helmet.label@019a2303-0192-7bb3-8a50-000000000000': { impact: 'no' } }, {}],
    ['a number as a text', { 'harness.label': { labelYear: '2028' } }, {}],
    [
      'a number that cannot be',
      { 'tyres.tread.rear-left': { leastMm: -1, innerEdgeMm: 4 } },
      { 'tyres.tread.rear-left': { innerEdgeMm: 4 } },
    ],
    ['a choice that is not on the list', { 'harness.label': { standard: 'home-made' } }, {}],
    ['an empty text', { 'tyres.date-code.rear-left': { dateCode: '' } }, {}],
    ['one’s own kit', { [HELMET]: { impact: 'no' } }, { [HELMET]: { impact: 'no' } }],
  ])('%s', (_, answers, kept) => {
    expect(cleanParts({ ...NOTHING_DECLARED, answers }, FACTS, CHECKS, [IDA]).answers).toEqual(kept)
  })
})

describe('what a later version says otherwise', () => {
  test('what was said before and is said otherwise has changed; what was not said is new', () => {
    const now = { ...parts, facts: { ...parts.facts, tyres: 'slick', roof: 'closed' }, answers: { ...parts.answers, 'harness.label': { standard: 'fia-8853-2016', labelYear: 2030 }, 'belts.anchors': { so: 'yes' } } } // prettier-ignore

    expect(changedParts(parts, now)).toEqual({ facts: ['roof'], answers: ['harness.label'] })
    expect(changedParts(parts, parts)).toEqual({ facts: [], answers: [] })
  })

  test('an answer that was taken back has changed', () => {
    expect(changedParts(parts, NOTHING_DECLARED).answers).toEqual(Object.keys(parts.answers))
  })

  test('the bay sees again what changed and what a change there disturbs', () => {
    const again = reopenedBy({ facts: [], answers: ['harness.label'] }, CHECKS).map(({ id }) => id)

    expect(again).toContain('harness.label')
    expect(again).toEqual(expect.arrayContaining(['harness.anchors']))
    expect(again).not.toContain('tyres.date-code.rear-left')
  })
})
