import { expect, test } from 'vitest'
import { heldNumbers } from '@/app/pit-exit/_screens/held-numbers'
import { aDevice, aList, anEntry, aPass, NOW } from '../pass/a-pit-exit'

const HELD = { kind: 'hold', words: 'light contact', seeAgain: ['Body'], at: NOW, stickerRemoved: null } as const

test.each([
  ['a car that may run is not on it', anEntry(), []],
  ['a car that was never passed and is not held is not on it', anEntry({ verdict: 'not presented', passes: [] }), []],
  ['a car whose pass died is on it', anEntry({ passes: [aPass({ state: 'dead' })] }), ['47']],
  ['a held car is on it', anEntry({ verdict: 'held', blocks: [HELD] }), ['47']],
  ['a car held before it ever had a pass is on it', anEntry({ verdict: 'held', blocks: [HELD], passes: [] }), ['47']],
  ['so is one whose recall is due', anEntry({ blocks: [{ ...HELD, kind: 'recall' }], passes: [] }), ['47']],
] as const)('[P4 P5] the hold list: %s', (_, entry, numbers) => {
  expect(heldNumbers(aList([entry]), aDevice())).toEqual(numbers)
})

test('[P4] what this device knows besides is on the hold list, in order of number', () => {
  const list = aList([anEntry({ number: '103', entry: 'other', verdict: 'held', blocks: [HELD] }), anEntry()])
  const blocks = [{ about: { number: '47' }, words: 'named on the radio as not to run', at: NOW }]
  expect(heldNumbers(list, aDevice({ blocks }))).toEqual(['47', '103'])
})
