import fc from 'fast-check'
import { expect, test } from 'vitest'
import { packBase40 } from '@/lib/pass/base40'
import { passNumber, plateTail, showTail } from '@/lib/pass/plate-tail'

test.each([
  ['GF90 VGN', '90VGN'],
  ['gf90vgn', '90VGN'],
  ['M-LW 47', 'MLW47'],
  ['A.B/C-1', 'ABC1'],
  ['KÖ LW 7', 'OLW7', 'KOLW7'],
  ['7', '7'],
  ['', ''],
  ['Ж 123', '123'],
])('the tail of %j ends in %j', (plate, ending, whole = ending) => {
  expect(plateTail(plate)).toBe(whole)
})

test('any plate gives a tail of at most five letters and digits that a token can carry', () => {
  fc.assert(
    fc.property(fc.string({ unit: 'binary', maxLength: 20 }), (plate) => {
      expect(plateTail(plate)).toMatch(/^[A-Z0-9]{0,5}$/)
      expect(() => packBase40(plateTail(plate))).not.toThrow()
    }),
  )
})

test('a tail is shown with what is left out before it', () => {
  expect([showTail('90VGN'), showTail('')]).toEqual(['…90VGN', ''])
})

test('a number keeps its noughts and loses its spaces', () => {
  expect(['007', ' 47 a', '№ 12'].map(passNumber)).toEqual(['007', '47A', '12'])
})
