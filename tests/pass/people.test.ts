import { describe, expect, test } from 'vitest'
import { decideAboard } from '@/lib/pass/decide-aboard'
import type { ListedPerson } from '@/lib/pass/pass-list'
import { aDevice, aList, anEntry, aPass, aPerson, aToken, BEN, MINUTE, NOW, scan } from './a-pit-exit'

const withPeople = (...people: readonly ListedPerson[]) => aList([anEntry({ people })])

describe('[P8] a driver goes only with a live band, and a passed fit where it is asked', () => {
  test.each([
    ['live', 'not-asked', 'PASSED'],
    ['live', 'passed', 'PASSED'],
    ['live', 'open', 'HOLD'],
    ['live', 'failed', 'HOLD'],
    ['live', 'unheard-of' as never, 'HOLD'],
    ['dead', 'not-asked', 'HOLD'],
    ['none', 'not-asked', 'HOLD'],
    ['held', 'not-asked', 'HOLD'],
    ['unheard-of' as never, 'not-asked', 'HOLD'],
  ] as const)('band %s, fit %s: %s', async (band, fit, expected) => {
    const answer = await scan(aToken(), withPeople(aPerson({ band, fit })))
    expect(answer.answer).toBe(expected)
    expect(answer.people).toMatchObject([{ name: 'Ana Brand', bandNumber: '112', may: expected === 'PASSED' }])
    if (expected === 'HOLD') expect(answer.people[0]?.why).not.toBe('')
  })
})

describe('[P8] who is named decides', () => {
  test('nobody named is HOLD', async () => {
    expect(await scan(aToken(), withPeople())).toMatchObject({ answer: 'HOLD', code: 'nobody-named' })
  })

  test.each(['passenger', 'instructor'] as const)('a %s alone is no driver: HOLD', async (role) => {
    expect(await scan(aToken(), withPeople(aPerson({ role })))).toMatchObject({ answer: 'HOLD', code: 'nobody-named' })
  })

  test('no driver who may is HOLD, though a passenger may', async () => {
    const answer = await scan(aToken(), withPeople(aPerson({ band: 'none', why: 'no band yet' }), { ...BEN, role: 'passenger' }))
    expect(answer).toMatchObject({ answer: 'HOLD', code: 'nobody-may-drive', why: ['Ana Brand (band 112) may not drive: no band yet'] })
  })

  test('some who may not are CHECK, with names and band numbers', async () => {
    const answer = await scan(aToken(), withPeople(aPerson(), { ...BEN, band: 'dead', why: 'band is dead: label: cut' }))
    expect(answer).toMatchObject({ answer: 'CHECK', code: 'some-may-not' })
    expect(answer.why).toEqual(['May go: Ana Brand (band 112)', 'Ben Oduya (band 113) may not: band is dead: label: cut'])
  })

  test('a person this device knows to be stopped may not, whatever the list says', async () => {
    const blocks = [{ about: { person: 'ana' }, words: 'no briefing', at: null }]
    expect(await scan(aToken(), aList(), aDevice({ blocks }))).toMatchObject({ answer: 'HOLD', code: 'nobody-may-drive' })
    expect(await scan(aToken(), withPeople(aPerson(), BEN), aDevice({ blocks }))).toMatchObject({ answer: 'CHECK', code: 'some-may-not' })
  })
})

describe('[P8] once the marshal has tapped who is aboard', () => {
  const two = withPeople(aPerson(), { ...BEN, band: 'none', bandNumber: null, why: 'no band yet' })

  test('the car goes with those who may', async () => {
    expect(decideAboard(await scan(aToken(), two), { people: ['ana'], unnamed: 0 })).toMatchObject({ answer: 'PASSED', why: [] })
  })

  test.each([
    ['one who may not', ['ben'], 0, ['aboard-may-not']],
    ['one who may and one who may not', ['ana', 'ben'], 0, ['aboard-may-not']],
    ['somebody unnamed', ['ana'], 1, ['unnamed-aboard']],
    ['a person of another car', ['ana', 'cleo'], 0, ['unnamed-aboard']],
    ['a count that is no number', ['ana'], Number.NaN, ['unnamed-aboard']],
    ['nobody', [], 0, ['no-driver-aboard']],
  ])('%s aboard is HOLD', async (_, people, unnamed, codes) => {
    const answer = decideAboard(await scan(aToken(), two), { people, unnamed })
    expect(answer.answer).toBe('HOLD')
    expect(answer.reasons.map(({ code }) => code)).toEqual(expect.arrayContaining(codes))
  })

  test('a passenger who may does not drive', async () => {
    const list = withPeople(aPerson(), { ...BEN, role: 'passenger' })
    expect(decideAboard(await scan(aToken(), list), { people: ['ben'], unnamed: 0 })).toMatchObject({
      answer: 'HOLD',
      code: 'no-driver-aboard',
    })
    expect(decideAboard(await scan(aToken(), list), { people: ['ana', 'ben'], unnamed: 0 })).toMatchObject({ answer: 'PASSED' })
  })

  test('two go only where the pass says that the passenger seat may be used', async () => {
    const token = { passengerSeatUsable: false }
    const list = aList([anEntry({ passes: [aPass({}, token)], people: [aPerson(), BEN] })])
    const answer = await scan(aToken(token), list)
    expect(decideAboard(answer, { people: ['ana', 'ben'], unnamed: 0 })).toMatchObject({ answer: 'HOLD', code: 'no-passenger-seat' })
    expect(decideAboard(answer, { people: ['ana'], unnamed: 0 })).toMatchObject({ answer: 'PASSED' })
  })

  test('every other doubt stays', async () => {
    const answer = await scan(aToken(), { ...two, at: NOW - 50 * MINUTE })
    expect(decideAboard(answer, { people: ['ana'], unnamed: 0 })).toMatchObject({ answer: 'CHECK', code: 'list-stale' })
  })

  test('a HOLD stays what it is', async () => {
    const held = await scan(aToken(), aList([anEntry({ verdict: 'held' })]))
    expect(decideAboard(held, { people: ['ana'], unnamed: 0 })).toBe(held)
  })
})
