import { expect, test } from 'vitest'
import { aState, asked, aWalk } from './a-walk'

test('no-go items come first, then what is measured; the rest is left for the closing sentence', () => {
  expect(asked(aWalk(), 'front')).toEqual(['brakes.pads', 'wheels.nuts.front', 'wheels.tread', '(seat.mounts)', '(body.mirror)'])
})

test('places come in the order of the checklist, and one where nothing is asked is left out', () => {
  expect(aWalk().map(({ place }) => place.id)).toEqual(['front', 'rear'])
})

test('a check nobody has answered is a hole; an optional one is a hole that keeps nothing from passing', () => {
  const [front] = aWalk([aState('brakes.pads', 'ok'), aState('wheels.tread', 'fail')])
  expect(front).toMatchObject({ unanswered: 3, missing: 2, worst: 'fail' })
})

test('what a hold or a repair asks to see again is a hole although it stands at ok, and says so', () => {
  const [front] = aWalk([aState('seat.mounts', 'ok', { unanswered: ['hold'] }), aState('brakes.pads', 'ok')])
  expect(front).toMatchObject({ unanswered: 4, seeAgain: 1 })
  expect(front?.together[0]).toMatchObject({ answered: false, seeAgain: true })
})

test('two looks that differ are no answer, however mild the one that stands', () => {
  const [front] = aWalk([aState('brakes.pads', 'advisory', { disagreement: true })])
  expect(front?.oneByOne[0]?.answered).toBe(false)
})

test('undecided is no answer; could not see is one, and is the worst of its place after a fail', () => {
  const [front] = aWalk([aState('wheels.tread', 'undecided'), aState('brakes.pads', 'could-not-see'), aState('seat.mounts', 'advisory')])
  expect(front?.oneByOne.map(({ check, answered }) => [check.id, answered])).toContainEqual(['wheels.tread', false])
  expect(front?.oneByOne.map(({ check, answered }) => [check.id, answered])).toContainEqual(['brakes.pads', true])
  expect(front?.worst).toBe('could-not-see')
})

test('what stands otherwise than ok is answered by itself: a closing sentence says “nothing found”', () => {
  expect(asked(aWalk([aState('seat.mounts', 'fail')]), 'front')).toContain('seat.mounts')
})

test('a check that this depth does not ask is part of the walk once a hold requires it', () => {
  expect(asked(aWalk(), 'front')).not.toContain('(body.undertray)')
  expect(asked(aWalk([aState('body.undertray', 'not-seen', { unanswered: ['hold'] })]), 'front')).toContain('(body.undertray)')
})

test('what was answered before a fact was corrected is no hole that can never be closed', () => {
  const seenBefore = aState('cage.feet', 'does-not-apply', { heads: [{} as never], required: false })
  expect(asked(aWalk([seenBefore]), 'front').join()).not.toContain('cage.feet')
})

test('[F12] a fail stands on a check that no longer applies, and is still shown', () => {
  expect(asked(aWalk([aState('cage.feet', 'fail', { heads: [{} as never] })]), 'front')).toContain('cage.feet')
})
