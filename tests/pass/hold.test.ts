import { generateKeyPairSync } from 'node:crypto'
import { afterEach, describe, expect, test, vi } from 'vitest'
import { decideAtPitExit } from '@/lib/pass/decide-at-pit-exit'
import type { ListedEntry, ListedKey, PassList } from '@/lib/pass/pass-list'
import type { PassPayload } from '@/lib/pass/pass-payload'
import type { PitCode } from '@/lib/pass/pit-answer'
import type { PitDevice } from '@/lib/pass/pit-device'
import { aDevice, aList, anEntry, aPass, aPayload, aToken, BAY, MINUTE, NOW, publicKeyOf, scan, scanText, SUNDAY } from './a-pit-exit'

afterEach(() => vi.unstubAllGlobals())

test('[P1] a sticker is proven good with every way to a network gone', async () => {
  const gone = () => {
    throw new Error('no network')
  }
  for (const name of ['fetch', 'XMLHttpRequest', 'WebSocket', 'EventSource']) vi.stubGlobal(name, gone)
  expect(await scan(aToken())).toMatchObject({ answer: 'PASSED', code: 'passed', number: '47', colour: 'red', model: 'Corvane S2' })
})

/** What one thing wrong does to a sticker that would pass. */
interface Wrong {
  readonly code: PitCode
  readonly why: RegExp
  readonly token?: Partial<PassPayload>
  readonly text?: string
  readonly entry?: Partial<ListedEntry>
  readonly list?: Partial<PassList>
  readonly device?: Partial<PitDevice>
}

const other = generateKeyPairSync('ed25519')
const keyThat = (is: Partial<ListedKey>): readonly ListedKey[] => [
  { kid: 3, publicKey: publicKeyOf(BAY.publicKey), mayIssue: true, state: 'active', ...is },
]
const hold = {
  kind: 'hold',
  words: 'Fluid dropped',
  seeAgain: ['Engine bay', 'Tyres'],
  at: NOW - 9 * MINUTE,
  stickerRemoved: true,
} as const

const HOLDS: readonly (readonly [string, Wrong])[] = [
  ['signed by another key', { text: aToken({}, other.privateKey), code: 'bad-signature', why: /altered or forged/ }],
  ['with a key on the list that is none', { list: { keys: keyThat({ publicKey: '!' }) }, code: 'bad-signature', why: /altered/ }],
  ['of another event', { token: { event: 13 }, code: 'wrong-event', why: /another event/ }],
  ['for tomorrow', { token: { validFrom: SUNDAY }, code: 'wrong-day', why: /for Sun 10 May 2026; today is Sat 9 May 2026/ }],
  ['for yesterday', { token: { validFrom: '2026-05-08' }, code: 'wrong-day', why: /for Fri 8 May 2026/ }],
  ['for two days that are over', { token: { validFrom: '2026-05-07', days: 2 }, code: 'wrong-day', why: /Thu 7 May 2026 to Fri 8 May/ }],
  ['by a device that is not on the list', { token: { kid: 4 }, code: 'unknown-key', why: /does not know/ }],
  ['by a device that never might issue', { list: { keys: keyThat({ mayIssue: false }) }, code: 'key-may-not-issue', why: /may not issue/ }],
  ['of an entry that is not on the list', { token: { entry: 6 }, code: 'unknown-entry', why: /not on list 14/ }],
  ['that is dead', { entry: { passes: [aPass({ state: 'dead', why: 'held since' })] }, code: 'dead-pass', why: /dead: held since/ }],
  ['that is quarantined', { entry: { passes: [aPass({ state: 'quarantined' })] }, code: 'quarantined-pass', why: /counts for nothing/ }],
  ['printed ahead, not on the list', { token: { printedAhead: true }, entry: { passes: [] }, code: 'not-alive', why: /Printed ahead/ }],
  ['printed ahead on the list', { entry: { passes: [aPass({ state: 'printed-ahead' })] }, code: 'not-alive', why: /Printed ahead/ }],
  [
    'in a state this build does not know',
    { entry: { passes: [aPass({ state: 'asleep' as never })] }, code: 'quarantined-pass', why: /nothing/ },
  ],
  ['of a number that is now another', { entry: { number: '74' }, code: 'number-differs', why: /says 47 …90VGN, the list 74 …90VGN/ }],
  ['of another plate', { entry: { plateTail: '91VGN' }, code: 'number-differs', why: /list 47 …91VGN/ }],
  ['of 047 for 47', { token: { number: '047' }, entry: { passes: [] }, code: 'number-differs', why: /says 047/ }],
  [
    'of a held car',
    { entry: { verdict: 'held', blocks: [hold] }, code: 'blocked', why: /^Fluid dropped, 09:31; Engine bay, Tyres to be seen$/ },
  ],
  ['of a withdrawn car', { entry: { verdict: 'withdrawn' }, code: 'blocked', why: /withdrawn/ }],
  ['of a car whose fail stands', { entry: { verdict: 'not passed' }, code: 'blocked', why: /not passed/ }],
  ['with a block under a verdict of passed', { entry: { blocks: [hold] }, code: 'blocked', why: /Fluid dropped/ }],
  [
    'of a number heard on the radio',
    { device: { blocks: [{ about: { number: ' 47' }, words: 'named on the radio', at: NOW }] }, code: 'blocked', why: /radio, 09:40$/ },
  ],
  [
    'of an entry whose recall this device knows to be due',
    { device: { blocks: [{ about: { entry: 'entry-5' }, words: 'recall due', at: null }] }, code: 'blocked', why: /^recall due$/ },
  ],
  ['of a band', { token: { type: 'band', entry: 0, plateTail: '', number: '112' }, code: 'band-scanned', why: /band 112/ }],
  [
    'of nobody we know',
    { text: 'https://tickets.example/47', code: 'foreign-code', why: /^Not a Lockwire sticker: a link .* It was not opened\.$/ },
  ],
  ['with a damaged code', { text: `${aToken().slice(0, -1)}B`, code: 'damaged-code', why: /proves nothing/ }],
]

describe('[P2] [P4] HOLD, with the reason in words, for a sticker', () => {
  test.each(HOLDS)('%s', async (_, wrong) => {
    const list = aList([anEntry({ passes: [aPass({}, wrong.token)], ...wrong.entry })], wrong.list)
    const answer = await scanText(wrong.text ?? aToken(wrong.token), list, aDevice(wrong.device))
    expect(answer).toMatchObject({ answer: 'HOLD', code: wrong.code })
    expect(answer.why[0]).toMatch(wrong.why)
    expect(answer.todo).not.toBe('')
  })

  test.each(HOLDS)('%s, just the same with a list that is a day old and a clock that ran backwards', async (_, wrong) => {
    const list = aList([anEntry({ passes: [aPass({}, wrong.token)], ...wrong.entry })], { at: NOW - 1440 * MINUTE, ...wrong.list })
    const answer = await scanText(wrong.text ?? aToken(wrong.token), list, aDevice({ clockWentBackwards: true, ...wrong.device }))
    expect(answer).toMatchObject({ answer: 'HOLD', code: wrong.code })
  })
})

describe('[P2] a pass under a number that the list gives to another', () => {
  test('of the same car is HOLD', async () => {
    const answer = await scan(aToken({ days: 2 }))
    expect(answer).toMatchObject({ answer: 'HOLD', code: 'pass-differs' })
  })

  test('of another car is HOLD', async () => {
    const list = aList([anEntry(), anEntry({ entry: 'entry-6', code: 6, number: '48', passes: [] })])
    expect(await scan(aToken({ entry: 6, number: '48' }), list)).toMatchObject({ answer: 'HOLD', code: 'pass-differs' })
  })

  test('is HOLD where the very same code is listed under another car than it names', async () => {
    const list = aList([anEntry({ passes: [] }), anEntry({ entry: 'entry-6', code: 6, number: '48', passes: [aPass()] })])
    expect(await scan(aToken(), list)).toMatchObject({ answer: 'HOLD', code: 'pass-differs' })
  })
})

test('[P2] without a list nothing is known of any key, and every code is HOLD', async () => {
  expect(await scan(aToken(), null)).toMatchObject({ answer: 'HOLD', code: 'no-list' })
  expect(decideAtPitExit({ how: 'number', number: '47' }, null, aDevice())).toMatchObject({ answer: 'HOLD', code: 'no-list' })
  expect(decideAtPitExit({ how: 'typed', code: aPass().typedCode }, null, aDevice())).toMatchObject({ answer: 'HOLD', code: 'no-list' })
})

test('[P2] what is not proven shows nothing of what it claims', async () => {
  const forged = await scan(aToken({}, other.privateKey))
  expect(forged).toMatchObject({ number: null, plate: null, colour: null, entry: null, pass: null, people: [] })
})

test('[P2] all that holds is said, the pass first, then the car', async () => {
  const entry = anEntry({ verdict: 'held', blocks: [hold], passes: [aPass({ state: 'dead', why: 'held since' })], people: [] })
  const answer = await scan(aToken(), aList([entry]))
  expect(answer.reasons.map(({ code }) => code)).toEqual(['dead-pass', 'blocked', 'nobody-named'])
  expect(answer.todo).toBe('Send the car to the bay; take this sticker off.')
})

describe('[P4] only two verdicts let a pass of the list go', () => {
  test.each([
    ['withdrawn', 'HOLD', 'HOLD'],
    ['held', 'HOLD', 'HOLD'],
    ['not passed', 'HOLD', 'HOLD'],
    ['in progress', 'HOLD', 'CHECK'],
    ['declared only', 'HOLD', 'CHECK'],
    ['not presented', 'HOLD', 'CHECK'],
    ['passed with advisories', 'PASSED', 'CHECK'],
    ['passed', 'PASSED', 'CHECK'],
  ] as const)('%s: %s on the list, %s before it is there', async (verdict, listed, unlisted) => {
    expect((await scan(aToken(), aList([anEntry({ verdict })]))).answer).toBe(listed)
    expect((await scan(aToken(), aList([anEntry({ verdict, passes: [] })]))).answer).toBe(unlisted)
  })
})

test('[P4] a sticker left on a held car is to be taken off', async () => {
  const entry = anEntry({ verdict: 'held', blocks: [{ ...hold, stickerRemoved: false }] })
  expect((await scan(aToken(), aList([entry]))).todo).toMatch(/left on: take it off/)
})

test('[P4] PASSED says what to compare before the car goes', async () => {
  const answer = await scan(aToken())
  expect(answer).toMatchObject({
    answer: 'PASSED',
    why: [],
    number: '47',
    plateTail: '90VGN',
    plate: 'GF90 VGN',
    passengerSeatUsable: true,
  })
  expect(answer.todo).toMatch(/number, plate, colour and model/)
  expect(answer.pass).toBe(`${aPayload().event}.3.1`)
})
