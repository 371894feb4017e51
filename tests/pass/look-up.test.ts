import { describe, expect, test } from 'vitest'
import { decideAtPitExit } from '@/lib/pass/decide-at-pit-exit'
import type { PassList } from '@/lib/pass/pass-list'
import { showTypedCode, typedCode } from '@/lib/pass/typed-code'
import { aDevice, aList, anEntry, aPass, aToken, SATURDAY, SUNDAY } from './a-pit-exit'

const byNumber = (number: string, list: PassList = aList()) => decideAtPitExit({ how: 'number', number }, list, aDevice())
const byCode = (code: string, list: PassList = aList()) => decideAtPitExit({ how: 'typed', code }, list, aDevice())

describe('[P7] a number', () => {
  test('finds the live pass of its car, however it is keyed in', () => {
    expect(byNumber('47')).toMatchObject({ answer: 'PASSED', number: '47', pass: '12.3.1', passengerSeatUsable: true })
    expect(byNumber(' 47a ', aList([anEntry({ number: '47A' })]))).toMatchObject({ answer: 'PASSED' })
  })

  test.each(['', ' ', '48', '4 7 1', '047', '47\u0000', 'x'.repeat(10_000)])('%.10j that is not on the list is HOLD', (number) => {
    expect(byNumber(number)).toMatchObject({ answer: 'HOLD', code: 'unknown-number', number: null })
  })

  test('that two entries have is HOLD', () => {
    const list = aList([anEntry(), anEntry({ entry: 'entry-6', code: 6, passes: [] })])
    expect(byNumber('47', list)).toMatchObject({ answer: 'HOLD', code: 'number-twice' })
  })

  test('of a car without a pass is HOLD, though the car reads passed', () => {
    expect(byNumber('47', aList([anEntry({ passes: [] })]))).toMatchObject({ answer: 'HOLD', code: 'no-live-pass' })
  })

  test.each([
    ['dead', 'dead-pass'],
    ['quarantined', 'quarantined-pass'],
    ['printed-ahead', 'not-alive'],
  ] as const)('of a car whose only pass is %s is HOLD, and says so', (state, code) => {
    expect(byNumber('47', aList([anEntry({ passes: [aPass({ state })] })]))).toMatchObject({ answer: 'HOLD', code })
  })

  test('counts today’s live pass among dead ones and those of other days', () => {
    const passes = [
      aPass({ state: 'dead' }, { counter: 2 }),
      aPass({}, { counter: 3 }),
      aPass({}, { counter: 4, validFrom: SUNDAY }),
      aPass({ state: 'dead' }, { counter: 5 }),
    ]
    expect(byNumber('47', aList([anEntry({ passes })]))).toMatchObject({ answer: 'PASSED', pass: '12.3.3' })
  })

  test('with a live pass of another day only is HOLD', () => {
    const passes = [aPass({}, { validFrom: SUNDAY })]
    expect(byNumber('47', aList([anEntry({ passes })], { day: SATURDAY }))).toMatchObject({ answer: 'HOLD', code: 'wrong-day' })
  })
})

describe('[P7] a typed code', () => {
  test('finds the pass on the list that it belongs to', () => {
    expect(byCode(showTypedCode(typedCode(aToken())).toLowerCase())).toMatchObject({ answer: 'PASSED', pass: '12.3.1' })
  })

  test('of a good token that is not on the list is HOLD: a code proves nothing', () => {
    expect(byCode(typedCode(aToken({ counter: 2 })))).toMatchObject({ answer: 'HOLD', code: 'unknown-code' })
  })

  test('of a dead pass finds the dead one, not the car’s live one', () => {
    const passes = [aPass({ state: 'dead', why: 'held since' }), aPass({}, { counter: 2 })]
    const answer = byCode(typedCode(aToken()), aList([anEntry({ passes })]))
    expect(answer).toMatchObject({ answer: 'HOLD', code: 'dead-pass', todo: 'Scan its newer sticker; take this one off.' })
  })

  test('that two passes have is HOLD', () => {
    const code = aPass().typedCode
    const list = aList([
      anEntry(),
      anEntry({ entry: 'entry-6', code: 6, number: '48', passes: [aPass({ typedCode: code }, { counter: 2 })] }),
    ])
    expect(byCode(code, list)).toMatchObject({ answer: 'HOLD', code: 'code-twice' })
  })

  test.each([
    ['', /some are missing/],
    ['1234', /some are missing/],
    ['1234-5678-9', /too many/],
    ['????-????', /that no code has/],
    ['0000-0001', /wrong, or two are swapped/],
  ])('%j is HOLD, and says what is wrong with it', (code, why) => {
    const answer = byCode(code)
    expect(answer).toMatchObject({ answer: 'HOLD', code: 'mistyped-code' })
    expect(answer.why[0]).toMatch(why)
  })
})
