import { describe, expect, test } from 'vitest'
import { paramsHash } from '@/lib/checklist/hash'
import { aBook, aCheck, aChecklistWith } from './a-checklist'

describe('a check with a list of places', () => {
  test('becomes one check per place, its id ending in the place', () => {
    const book = aBook()
    expect(book.checks.map((check) => [check.id, check.place])).toEqual([
      ['wheels.nuts.left', 'left'],
      ['wheels.nuts.right', 'right'],
      ['wheels.tread.left', 'left'],
      ['wheels.tread.right', 'right'],
      ['wheels.cap', 'left'],
      ['kit.shoes', 'desk'],
    ])
    expect(book.byId.get('wheels.nuts.right')?.place).toBe('right')
    expect(book.byId.has('wheels.nuts')).toBe(false)
  })

  test('reopens its own corner of another check per corner', () => {
    const book = aBook()
    expect(book.byId.get('wheels.tread.left')?.reopens).toEqual(['wheels.nuts.left'])
    expect(book.byId.get('wheels.tread.right')?.reopens).toEqual(['wheels.nuts.right'])
  })

  test('is reopened at the corner where the repair was made, when that is one of its corners', () => {
    expect(aBook().byId.get('wheels.cap')?.reopens).toEqual(['wheels.nuts.left'])
  })

  test('is reopened at the corner that the id names', () => {
    const book = aBook(aChecklistWith(aCheck('wheels.arch', { place: ['left', 'right'], reopens: ['wheels.nuts.right'] })))
    expect(book.byId.get('wheels.arch.left')?.reopens).toEqual(['wheels.nuts.right'])
  })

  test('is reopened at all its corners by a repair at none of them', () => {
    const json = aChecklistWith(aCheck('wheels.jack', { place: 'below', reopens: ['wheels.nuts'] }))
    const book = aBook({
      ...json,
      places: [...(json['places'] as object[]), { id: 'below', title: 'Below', subject: 'car', stand: 'Low' }],
    })
    expect(book.byId.get('wheels.jack')?.reopens).toEqual(['wheels.nuts.left', 'wheels.nuts.right'])
  })
})

describe('limits in force', () => {
  test('are the check’s own, overlaid key by key', () => {
    const check = aBook(undefined, { 'tyre-tread': { adviseBelowMm: 3 } }).byId.get('wheels.tread.left')
    expect(check?.params).toEqual({ failBelowMm: 1.6, adviseBelowMm: 3 })
    expect(check?.paramsHash).toBe(paramsHash('tyre-tread', { adviseBelowMm: 3, failBelowMm: 1.6 }))
  })

  test('have another hash when one figure changes, and the same at every corner', () => {
    const before = aBook()
    const after = aBook(undefined, { 'tyre-tread': { adviseBelowMm: 3 } })
    expect(after.byId.get('wheels.tread.left')?.paramsHash).not.toBe(before.byId.get('wheels.tread.left')?.paramsHash)
    expect(after.byId.get('wheels.tread.left')?.paramsHash).toBe(after.byId.get('wheels.tread.right')?.paramsHash)
  })

  test('of a check without a rule are none', () => {
    expect(aBook().byId.get('wheels.cap')).toMatchObject({ params: {}, paramsHash: null })
  })

  test('that no rule could judge by open no book', () => {
    expect(() => aBook(undefined, { 'tyre-tread': { failBelowMm: 9 } })).toThrow(/rules\.tyre-tread .*wheels\.tread/)
  })
})
