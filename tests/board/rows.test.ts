import { describe, expect, test } from 'vitest'
import { compareNumbers } from '@/lib/board/compare-numbers'
import { filterRows } from '@/lib/board/filter-rows'
import { compareRows, type EntryColumn } from '@/lib/board/sort-rows'
import { aRow } from './a-board-row'

const numbersOf = (rows: readonly { readonly number: string }[]) => rows.map(({ number }) => number)

test('numbers stand in the order people count them, and 007 beside 7 without being it', () => {
  expect(['103', '47', '7', 'X1', '007', '9A', '9'].toSorted(compareNumbers)).toEqual(['007', '7', '9', '9A', '47', '103', 'X1'])
})

describe('finding on the board', () => {
  const rows = [
    aRow('47', { plate: 'GF90 VGN', model: 'Halden 1.6 hatch', drivers: ['Léna Penhale'] }),
    aRow('147', { plate: 'NJ63 XSK', model: 'Tessier Petite', drivers: ['Marek Falkner'], verdict: 'passed' }),
    aRow('470', { plate: 'WE21 MER', model: 'Corvane S2', drivers: [], needs: [{ kind: 'held', words: 'Held: contact' }] }),
  ]

  test.each([
    ['47', ['47', '470'], 'a number is found by its beginning'],
    ['gf90vgn', ['47'], 'a plate without its space'],
    ['j63 x', ['147'], 'a part of a plate'],
    ['lena', ['47'], 'a name without its accent'],
    ['CORVANE', ['470'], 'a car in any case'],
    ['  ', ['47', '147', '470'], 'spaces look for nothing'],
    ['nobody', [], 'what is not there finds nothing'],
  ])('%j finds %j: %s', (text, found) => {
    expect(numbersOf(filterRows(rows, { text, show: 'all' }))).toEqual(found)
  })

  test('one verdict, or who needs somebody, is shown alone', () => {
    expect(numbersOf(filterRows(rows, { text: '', show: 'passed' }))).toEqual(['147'])
    expect(numbersOf(filterRows(rows, { text: '', show: 'needs-somebody' }))).toEqual(['470'])
    expect(numbersOf(filterRows(rows, { text: '14', show: 'needs-somebody' }))).toEqual([])
  })
})

describe('sorting entries', () => {
  const rows = [
    aRow('9', { group: 'b', verdict: 'held', drivers: ['Örn Ward'], colour: 'red' }),
    aRow('10', { group: 'a', verdict: 'passed', drivers: ['Abel Fenn'], colour: 'Blue' }),
    aRow('2', { group: 'b', verdict: 'passed', drivers: ['Otto Lund'], colour: 'blue' }),
  ]

  test.each<[EntryColumn, string[]]>([
    ['number', ['2', '9', '10']],
    ['group', ['10', '2', '9']],
    ['verdict', ['2', '10', '9']],
    ['driver', ['10', '9', '2']],
    ['colour', ['2', '10', '9']],
  ])('by %s, equals by number', (column, order) => {
    const compare = compareRows(column, ['a', 'b'])
    expect(numbersOf(rows.toSorted((a, b) => compare(a, b) || compareNumbers(a.number, b.number)))).toEqual(order)
  })
})
