import { expect, test } from 'vitest'
import { applicableChecks } from '@/lib/checklist/applicable-checks'
import { answersOf, closingSentence, walkByPlace } from '@/lib/checklist/places'
import { aBook, aCheck, aChecklistWith } from './a-checklist'

const book = aBook(
  aChecklistWith(
    aCheck('wheels.hose', { place: ['left', 'right'], short: 'hose' }),
    aCheck('wheels.disc', { place: 'left', critical: true }),
  ),
)
const walk = walkByPlace(book, applicableChecks(book, 'car', {}))

test('checks stand by place in the order of the walk, and places where nothing is asked are left out', () => {
  expect(walk.map((each) => each.place.id)).toEqual(['left', 'right'])
})

test('no-go items come first, then what is measured, and the rest closes the place', () => {
  expect(walk[0]?.oneByOne.map((check) => check.id)).toEqual(['wheels.nuts.left', 'wheels.disc', 'wheels.tread.left'])
  expect(walk[0]?.closing.map((check) => check.id)).toEqual(['wheels.cap', 'wheels.hose.left'])
})

test('the closing sentence names what was seen and nothing else', () => {
  expect(closingSentence({ title: 'Front left' }, walk[0]?.closing ?? [])).toBe('Front left: caps, hose seen, nothing found')
  expect(closingSentence({ title: 'Front left' }, [])).toBe('')
})

test('a closing sentence counts as one answer', () => {
  expect(answersOf(walk)).toBe(3 + 1 + 2 + 1)
})
