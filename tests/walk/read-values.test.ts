import { expect, test } from 'vitest'
import type { MeasureField } from '@/lib/checklist/checklist'
import { readValues } from '@/lib/walk/read-values'

const drop: MeasureField = { kind: 'number', id: 'dropMm', label: 'Drop', unit: 'mm', min: -1500, max: 3000, decimals: 1 }
const year: MeasureField = { kind: 'number', id: 'year', label: 'Year', unit: '', min: 1995, max: 2099, decimals: 0 }
const code: MeasureField = { kind: 'text', id: 'code', label: 'Date code', maxLength: 4 }
const fluid: MeasureField = {
  kind: 'choice',
  id: 'fluid',
  label: 'Fluid',
  options: [
    { id: 'oil', label: 'Oil' },
    { id: 'fuel', label: 'Fuel' },
  ],
}

test.each([
  ['300', 300],
  ['1.6', 1.6],
  ['1,6', 1.6],
  ['-12', -12],
  ['2.', 2],
  ['.5', 0.5],
  [' 7 ', 7],
  ['-1500', -1500],
  ['3000', 3000],
])('“%s” is read as %s', (text, value) => {
  expect(readValues([drop], { dropMm: text })).toEqual({ values: { dropMm: value }, problems: [] })
})

test.each(['3001', '-1501', '1.2.3', 'abc', '-', '.', '1e3', '1 2'])('“%s” is no value, and what would be one is named', (text) => {
  expect(readValues([drop], { dropMm: text })).toEqual({
    values: {},
    problems: [{ field: 'dropMm', why: 'Drop: a number from -1500 to 3000 mm.' }],
  })
})

test('a figure without a unit is named without one', () => {
  expect(readValues([year], { year: '1994' }).problems).toEqual([{ field: 'year', why: 'Year: a number from 1995 to 2099.' }])
})

test('a field not typed yet is missing: no value, no zero, no problem', () => {
  expect(readValues([drop, code, fluid], { dropMm: '', code: '   ' })).toEqual({ values: {}, problems: [] })
})

test('a text longer than the field is not cut but refused', () => {
  expect(readValues([code], { code: '12345' })).toEqual({
    values: {},
    problems: [{ field: 'code', why: 'Date code: at most 4 characters.' }],
  })
  expect(readValues([code], { code: '2319' }).values).toEqual({ code: '2319' })
})

test('only what stands on the list can be chosen', () => {
  expect(readValues([fluid], { fluid: 'oil' }).values).toEqual({ fluid: 'oil' })
  expect(readValues([fluid], { fluid: 'milk' })).toEqual({
    values: {},
    problems: [{ field: 'fluid', why: 'Fluid: choose one of the list.' }],
  })
})
