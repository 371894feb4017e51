import { describe, expect, test } from 'vitest'
import type { ListedEntry, PassList } from '@/lib/pass/pass-list'
import type { PassPayload } from '@/lib/pass/pass-payload'
import type { PitCode } from '@/lib/pass/pit-answer'
import { ANY_GROUP, type PitDevice } from '@/lib/pass/pit-device'
import { aDevice, aList, anEntry, aPass, aToken, BAY, MINUTE, NOW, publicKeyOf, scan, SUNDAY } from './a-pit-exit'

interface Doubt {
  readonly code: PitCode
  readonly why: RegExp
  readonly token?: Partial<PassPayload>
  readonly entry?: Partial<ListedEntry>
  readonly list?: Partial<PassList>
  readonly device?: Partial<PitDevice>
}

const B = anEntry({ entry: 'entry-9', code: 9, number: '48', group: 'group-b', groupName: 'B', passes: [] })
const key = { kid: 3, publicKey: publicKeyOf(BAY.publicKey), mayIssue: true }

const DOUBTS: readonly (readonly [string, Doubt])[] = [
  ['the list is a minute over the limit', { list: { at: NOW - 31 * MINUTE }, code: 'list-stale', why: /^List 14 is 31 min old\.$/ }],
  ['how old the list is cannot be told', { list: { at: Number.NaN }, code: 'list-stale', why: /cannot be told/ }],
  ['the limit is no number', { device: { listStaleMinutes: Number.NaN }, code: 'list-stale', why: /2 min old/ }],
  ['the list was made on another day', { list: { day: '2026-05-08' }, code: 'list-other-day', why: /another day/ }],
  ['the clock went backwards', { device: { clockWentBackwards: true }, code: 'clock', why: /backwards/ }],
  ['the list is from the future', { list: { at: NOW + 3 * MINUTE }, code: 'clock', why: /backwards/ }],
  [
    'the pass is not on the list',
    { entry: { passes: [] }, code: 'not-on-list', why: /^Signature good, but this pass is not on list 14\.$/ },
  ],
  [
    'it was made by a lost tablet and is not on the list',
    { entry: { passes: [] }, list: { keys: [{ ...key, state: 'lost' }] }, code: 'not-on-list', why: /reported lost/ },
  ],
  [
    'it was made by a retired tablet and is not on the list',
    { entry: { passes: [] }, list: { keys: [{ ...key, state: 'retired' }] }, code: 'not-on-list', why: /retired/ },
  ],
  [
    'the list knows its conditions',
    { entry: { passes: [aPass({ conditions: ['group C only'] })] }, code: 'conditions', why: /group C only/ },
  ],
  ['only the sticker says it has conditions', { token: { conditions: true }, code: 'conditions', why: /ask the bay which/ }],
  ['another group is running', { device: { runningGroup: 'group-b' }, code: 'other-group', why: /^Group A; another one/ }],
  ['nobody set which group is running', { device: { runningGroup: null }, code: 'no-group-set', why: /Nobody has set/ }],
]

describe('[P3] CHECK, with the reason in words, when', () => {
  test.each(DOUBTS)('%s', async (_, { token, entry, list, device, code, why }) => {
    const answer = await scan(aToken(token), aList([anEntry({ passes: [aPass({}, token)], ...entry }), B], list), aDevice(device))
    expect(answer).toMatchObject({ answer: 'CHECK', code, number: '47' })
    expect(answer.reasons.map((reason) => reason.code)).toEqual([code])
    expect(answer.why[0]).toMatch(why)
    expect(answer.todo).not.toBe('')
  })
})

describe('[P3] [P4] PASSED, at the edge of a doubt, when', () => {
  test.each<[string, Partial<PassList>, Partial<PitDevice>]>([
    ['the list is exactly as old as the limit', { at: NOW - 30 * MINUTE }, {}],
    ['the list is a little ahead of the clock', { at: NOW + 2 * MINUTE }, {}],
    ['a list an hour old was read back just now', { at: NOW - 60 * MINUTE }, { readBackAt: NOW - MINUTE }],
    ['the pit lane is open to any group', {}, { runningGroup: ANY_GROUP }],
  ])('%s', async (_, list, device) => {
    expect(await scan(aToken(), aList([anEntry(), B], list), aDevice(device))).toMatchObject({ answer: 'PASSED', why: [] })
  })

  test('there is one group and nobody said that it is running', async () => {
    expect(await scan(aToken(), aList(), aDevice({ runningGroup: null }))).toMatchObject({ answer: 'PASSED' })
  })

  test('the tablet was lost, and its pass is on the list', async () => {
    expect(await scan(aToken(), aList([anEntry()], { keys: [{ ...key, state: 'lost' }] }))).toMatchObject({ answer: 'PASSED' })
  })

  test('it is the second day of a pass for two', async () => {
    const passes = [aPass({}, { days: 2 })]
    const device = aDevice({ day: SUNDAY, now: NOW + 1440 * MINUTE })
    const list = aList([anEntry({ passes })], { day: SUNDAY, at: device.now })
    expect(await scan(aToken({ days: 2 }), list, device)).toMatchObject({ answer: 'PASSED' })
  })
})

test('[P3] a read-back that is itself old, or from the future, freshens nothing', async () => {
  const list = aList([anEntry()], { at: NOW - 60 * MINUTE })
  expect(await scan(aToken(), list, aDevice({ readBackAt: NOW - 45 * MINUTE }))).toMatchObject({
    code: 'list-stale',
    why: ['List 14 is 45 min old.'],
  })
  expect(await scan(aToken(), list, aDevice({ readBackAt: NOW + 45 * MINUTE }))).toMatchObject({ answer: 'CHECK', code: 'clock' })
  expect(await scan(aToken(), list, aDevice({ readBackAt: Number.NaN }))).toMatchObject({ answer: 'CHECK', code: 'list-stale' })
})

test('[P3] every doubt is said, and what to do about each', async () => {
  const entry = anEntry({ passes: [aPass({ conditions: ['group C only'] })] })
  const answer = await scan(aToken(), aList([entry, B], { at: NOW - 41 * MINUTE }), aDevice({ runningGroup: 'group-b' }))
  expect(answer.reasons.map(({ code }) => code)).toEqual(['list-stale', 'conditions', 'other-group'])
  expect(answer.todo).toBe('Ask on the radio: list, holds? See that the conditions are kept. Send it back if it is not its turn.')
})
