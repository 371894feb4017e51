import { expect, test } from 'vitest'
import { describeCars, type SeenCar } from '@/lib/walk/describe-cars'

const names = new Map([
  ['p1', 'Idris Falkner'],
  ['p2', 'Rhea Birkett'],
])
const car = (number: string, changes: Partial<SeenCar>): SeenCar => ({
  id: number,
  number,
  plate: 'OT11 KLM',
  colour: 'blue',
  model: 'Tarn 2',
  groupName: 'Novice',
  people: [{ person: 'p1', role: 'driver' }],
  ...changes,
})
const CARS = [
  car('47', {}),
  car('263', { plate: 'AH99 DSX', colour: 'orange', model: 'Oriel GT4 twin' }),
  car('8', { colour: 'orange', model: 'Tarn 3', people: [{ person: 'p1', role: 'driver' }, { person: 'p2', role: 'passenger' }] }), // prettier-ignore
]

test.each([
  ['orange', ['8', '263']],
  ['a purple oriel', []],
  ['orange oriel', ['263']],
  ['ORANGE passenger', ['8']],
  ['ah99dsx', ['263']],
  ['99dsx', ['263']],
  ['dsx', ['263']],
  ['birkett', ['8']],
  ['47', ['47']],
  ['tarn blue', ['47']],
  ['', []],
  [' - ', []],
])('“%s” finds %j', (said, found) => {
  expect(describeCars(CARS, said, names).map(({ number }) => number)).toEqual(found)
})

test('what begins a word comes before what only stands in one', () => {
  const cars = [car('12', { model: 'Starn' }), car('99', {})]
  expect(describeCars(cars, 'tarn', names).map(({ number }) => number)).toEqual(['99', '12'])
})
