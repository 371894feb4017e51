import { expect, test } from 'vitest'
import { nextStop, resumeStop, stopAfter } from '@/lib/walk/next-stop'
import { aState, aWalk } from './a-walk'

const ok = (...checks: readonly string[]) => checks.map((check) => aState(check, 'ok'))
const FRONT = ['brakes.pads', 'wheels.nuts.front', 'wheels.tread', 'seat.mounts', 'body.mirror']

test('a walk begins at its first hole', () => {
  expect(nextStop(aWalk(), null)).toEqual({ place: 'front', check: 'brakes.pads' })
  expect(nextStop(aWalk(ok('brakes.pads')), null)).toEqual({ place: 'front', check: 'wheels.nuts.front' })
})

test('after the last check of a place comes its closing sentence, then the next place', () => {
  expect(nextStop(aWalk(), { place: 'front', check: 'wheels.tread' })).toEqual({ place: 'front', check: null })
  expect(nextStop(aWalk(), { place: 'front', check: null })).toEqual({ place: 'rear', check: 'wheels.nuts.rear' })
})

test('a skipped check is met again: the walk goes once round', () => {
  const plan = aWalk(ok('wheels.nuts.front', 'wheels.tread', 'seat.mounts', 'body.mirror', 'wheels.nuts.rear'))
  expect(nextStop(plan, { place: 'rear', check: 'wheels.nuts.rear' })).toEqual({ place: 'front', check: 'brakes.pads' })
})

test('a walk in which all is answered leads nowhere', () => {
  expect(nextStop(aWalk(ok(...FRONT, 'wheels.nuts.rear')), { place: 'front', check: null })).toBeNull()
  expect(resumeStop(aWalk(ok(...FRONT, 'wheels.nuts.rear')), { place: 'front', check: null })).toBeNull()
})

test('what is left at a place comes before the next place', () => {
  expect(stopAfter(aWalk(ok('seat.mounts', 'body.mirror')), { place: 'front', check: null })).toEqual({
    place: 'front',
    check: 'brakes.pads',
  })
  expect(stopAfter(aWalk(ok(...FRONT)), { place: 'front', check: null })).toEqual({ place: 'rear', check: 'wheels.nuts.rear' })
})

test('one of the rest, answered by itself, leads back to the rest', () => {
  expect(stopAfter(aWalk(ok('seat.mounts')), { place: 'front', check: 'seat.mounts' })).toEqual({ place: 'front', check: null })
})

test('an interrupted walk goes on at the very check it was left at, not after it', () => {
  const left = { place: 'front', check: 'wheels.tread' }
  expect(resumeStop(aWalk(), left)).toEqual(left)
  expect(resumeStop(aWalk(), { place: 'front', check: null })).toEqual({ place: 'front', check: null })
})

test('a walk left at a check that has since been answered goes on behind it', () => {
  expect(resumeStop(aWalk(ok('brakes.pads')), { place: 'front', check: 'brakes.pads' })).toEqual({
    place: 'front',
    check: 'wheels.nuts.front',
  })
})

test('a walk left at a check that is no longer asked goes on at that place', () => {
  expect(resumeStop(aWalk(), { place: 'rear', check: 'gone' })).toEqual({ place: 'rear', check: 'wheels.nuts.rear' })
})
