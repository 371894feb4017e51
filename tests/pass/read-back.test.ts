import { describe, expect, test } from 'vitest'
import type { ListedEntry } from '@/lib/pass/pass-list'
import { applyReadBack, readBackOf } from '@/lib/pass/read-back'
import { aDevice, aList, anEntry, aPass, aToken, MINUTE, NOW, scan, SUNDAY } from './a-pit-exit'

/** Car n of the day, entry code and pass counter alike. */
function car(number: number, given: Partial<ListedEntry> = {}): ListedEntry {
  const payload = { counter: number, entry: number, number: String(number) }
  return anEntry({ entry: `entry-${number}`, code: number, number: String(number), passes: [aPass({}, payload)], ...given })
}
const dead = (number: number) => ({ passes: [aPass({ state: 'dead' as const, why: 'held since' }, { counter: number })] })
const stale = aList([car(47), car(48), car(49)], { at: NOW - 50 * MINUTE })
const sticker = (number: number) => aToken({ counter: number, entry: number, number: String(number) })

describe('[P5] what is read out', () => {
  test.each<[string, Partial<ListedEntry>]>([
    ['held', { verdict: 'held', ...dead(48) }],
    ['not passed', { verdict: 'not passed', ...dead(48) }],
    ['withdrawn', { verdict: 'withdrawn', ...dead(48) }],
    ['passed, its pass void', dead(48)],
    ['in progress, its pass alive', { verdict: 'in progress' }],
    ['passed, with a recall due', { blocks: [{ kind: 'recall', words: 'recall due', seeAgain: [], at: NOW, stickerRemoved: null }] }],
  ])('names a car that has had a pass and is %s', (_, entry) => {
    expect(readBackOf(aList([car(47), car(48, entry)]))).toEqual({ numbers: ['48'], livePasses: 1 })
  })

  test('leaves out who never had a pass, or had one for another day only', () => {
    const list = aList([
      car(47),
      car(48, { verdict: 'held', passes: [] }),
      car(49, { verdict: 'held', passes: [aPass({}, { counter: 9, validFrom: SUNDAY })] }),
    ])
    expect(readBackOf(list)).toEqual({ numbers: [], livePasses: 1 })
  })

  test('counts every live pass, two of one car as two', () => {
    const two = [aPass({}, { counter: 47 }), aPass({}, { counter: 90 })]
    expect(readBackOf(aList([car(47, { passes: two }), car(48)]))).toEqual({ numbers: [], livePasses: 3 })
  })
})

describe('[P5] a read-back', () => {
  test('agrees with a list from which nothing changed', () => {
    expect(applyReadBack(stale, readBackOf(stale), NOW)).toEqual({ agrees: true, blocks: [], unknown: [], counted: 3 })
  })

  test('agrees when all that changed is what it names, and then holds that car and lets the others go', async () => {
    const newer = aList([car(47), car(48, { verdict: 'held', ...dead(48) }), car(49)])
    const heard = applyReadBack(stale, readBackOf(newer), NOW)
    expect(heard).toMatchObject({ agrees: true, counted: 2, blocks: [{ about: { number: '48' }, at: NOW }] })
    const device = aDevice({ readBackAt: NOW, blocks: heard.blocks })
    expect(await scan(sticker(47), stale, device)).toMatchObject({ answer: 'PASSED' })
    expect(await scan(sticker(48), stale, device)).toMatchObject({ answer: 'HOLD', code: 'blocked' })
  })

  test.each([
    ['a pass was issued since', 4],
    ['a number was left out', 1],
    ['the count is no number', Number.NaN],
  ])('that does not agree because %s adds its blocks, and the list stays as old as it is', async (_, livePasses) => {
    const heard = applyReadBack(stale, { numbers: ['48'], livePasses }, NOW)
    expect(heard).toMatchObject({ agrees: false, blocks: [{ about: { number: '48' } }] })
    const device = aDevice({ readBackAt: heard.agrees ? NOW : null, blocks: heard.blocks })
    expect(await scan(sticker(48), stale, device)).toMatchObject({ answer: 'HOLD' })
    expect(await scan(sticker(47), stale, device)).toMatchObject({ answer: 'CHECK', code: 'list-stale' })
  })

  test('that names a number this list has not is misheard or newer, and does not agree', () => {
    expect(applyReadBack(stale, { numbers: ['74'], livePasses: 3 }, NOW)).toMatchObject({ agrees: false, unknown: ['74'] })
    expect(applyReadBack(null, { numbers: ['48'], livePasses: 0 }, NOW)).toMatchObject({ agrees: false, blocks: [{}], unknown: ['48'] })
  })

  test('lifts no block: a car that the list holds and it does not name is still HOLD', async () => {
    const list = aList([car(47), car(48, { verdict: 'held' })], { at: NOW - 50 * MINUTE })
    const heard = applyReadBack(list, { numbers: [], livePasses: 1 }, NOW)
    expect(heard).toEqual({ agrees: true, blocks: [], unknown: [], counted: 1 })
    expect(await scan(sticker(48), list, aDevice({ readBackAt: NOW, blocks: heard.blocks }))).toMatchObject({ answer: 'HOLD' })
  })

  test('that names one number twice counts its car once', () => {
    expect(applyReadBack(stale, { numbers: ['48', ' 48'], livePasses: 2 }, NOW)).toMatchObject({ agrees: true })
  })
})
