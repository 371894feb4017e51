import { describe, expect, test } from 'vitest'
import { foldSubject } from '@/lib/inspection/fold-subject'
import {
  CAR_KEY,
  CREW,
  SUNDAY,
  allOk,
  context,
  finding,
  hold,
  pass,
  presented,
  recall,
  day,
  entryChanged,
  lifted,
  ruling,
  dispensation,
  GROUP_A,
} from '../support/paddock'
import { TIGHTER_LIMITS, paddockCheck } from '../support/paddock-book'

function fold(...records: Parameters<typeof foldSubject>[0][number][]) {
  return foldSubject(records, CAR_KEY, context())
}

describe('[F3] what is seen', () => {
  const TREAD = 'wheels.tread'
  const rest = allOk({ except: [TREAD] })

  test('[F3] every required check without a head is open, in the checklist’s order', () => {
    expect(fold(presented()).open).toEqual(['brakes.pads', TREAD, 'wheels.nuts.front', 'wheels.nuts.rear', 'seat.mounts'])
  })

  test.each([
    ['has no value', { measured: null }],
    ['has only empty values', { measured: { depthMm: null } }],
    ['names no limits', { paramsHash: null }],
    ['was judged under other limits', { paramsHash: paddockCheck(TREAD, TIGHTER_LIMITS).paramsHash }],
    ['has an undecided judgement', { judgement: { outcome: 'undecided' as const, code: 'tyre-tread.missing', facts: {} } }],
    ['contradicts its own judgement', { judgement: { outcome: 'fail' as const, code: 'tyre-tread.under-limit', facts: {} } }],
  ])('[F3] a measured ok that %s is undecided and keeps the car from passing', (_, said) => {
    const state = fold(presented(), ...rest, finding(TREAD, 'ok', said))
    expect(state.checks.get(TREAD)?.standing).toBe('undecided')
    expect(state.verdict).toBe('in progress')
  })

  test('[F3] a fail needs no value', () => {
    expect(fold(presented(), finding(TREAD, 'fail', { measured: null, paramsHash: null })).verdict).toBe('not passed')
  })

  test('[F3] a ruling rests on the values of a look it names', () => {
    const measured = finding(TREAD, 'ok')
    const blank = finding(TREAD, 'ok', { measured: null })
    const fail = finding(TREAD, 'fail', { actor: CREW.ben })
    expect(fold(presented(), measured, fail, ruling(TREAD, 'ok', { basis: [measured, fail] })).checks.get(TREAD)?.standing).toBe('ok')
    expect(fold(presented(), blank, fail, ruling(TREAD, 'ok', { basis: [blank, fail] })).checks.get(TREAD)?.standing).toBe('undecided')
  })

  test('[F3] without its checklist at hand nothing passes', () => {
    const state = foldSubject([presented(), ...allOk()], CAR_KEY, context({ openBook: () => null }))
    expect(state.verdict).toBe('in progress')
  })
})

describe('[F12] presented more than once', () => {
  test('[F12] one that names the other takes its place', () => {
    const deep = presented({ depth: 'full' })
    const shallow = presented({ basis: [deep] })
    expect(fold(deep, shallow)).toMatchObject({ depth: 'look-over', presentedHeads: [{ hash: shallow.hash }] })
  })

  test('[F12] of two that do not know each other, both are asked and the deepest depth holds', () => {
    const state = fold(presented({ depth: 'full' }), presented({ facts: { cage: true, slicks: false } }))
    expect(state.depth).toBe('full')
    expect(state.open).toEqual(expect.arrayContaining(['body.undertray', 'cage.feet']))
  })

  test('[F12] a fact that is not known lets no check fall away', () => {
    expect(fold(presented({ facts: {} })).open).toContain('cage.feet')
  })

  test('[F12] a fail on a check that no longer applies still stands', () => {
    const caged = presented({ facts: { cage: true, slicks: false } })
    const fail = finding('cage.feet', 'fail')
    const bare = presented({ basis: [caged] })
    expect(fold(caged, fail, bare)).toMatchObject({ verdict: 'not passed', fails: ['cage.feet'] })
  })
})

describe('[F5] holds', () => {
  test('[F5] what is not applicable here only the chief ends', () => {
    const stop = hold({ stations: ['cage'] })
    expect(fold(presented(), ...allOk(), stop).blocks).toMatchObject([{ onlyChiefLifts: true, checksLeft: [] }])
    expect(fold(presented(), ...allOk(), stop, lifted([stop])).verdict).toBe('passed')
  })

  test('[F5] each of its checks needs a look of its own that answers it', () => {
    const stop = hold({ stations: ['wheels'] })
    const front = finding('wheels.nuts.front', 'ok', { answers: [stop] })
    const state = fold(presented(), ...allOk({ except: ['wheels.nuts.front'] }), front, stop)
    expect(state.blocks[0]?.checksLeft).toEqual(['wheels.tread', 'wheels.nuts.rear'])
  })

  test('[F5] a check named without its corner means every corner', () => {
    const stop = hold({ checks: ['wheels.nuts'] })
    expect(fold(presented(), stop).blocks[0]).toMatchObject({
      onlyChiefLifts: false,
      checksLeft: ['wheels.nuts.front', 'wheels.nuts.rear'],
    })
  })

  test('[F5] before the car is presented a hold stands, whatever was looked at', () => {
    const stop = hold({ stations: ['brakes'] })
    expect(fold(finding('brakes.pads', 'ok', { answers: [stop] }), stop)).toMatchObject({
      verdict: 'held',
      blocks: [{ onlyChiefLifts: false }],
    })
  })

  test('[F5] a look at advisory answers it, one that could not see does not', () => {
    const stop = hold({ checks: ['seat.mounts'] })
    const rest = [presented(), ...allOk({ except: ['seat.mounts'] }), stop]
    expect(fold(...rest, finding('seat.mounts', 'advisory', { answers: [stop] })).verdict).toBe('passed with advisories')
    expect(fold(...rest, finding('seat.mounts', 'could-not-see', { answers: [stop] })).verdict).toBe('held')
  })

  test('[F5] a dispensation or ruling signed at a table is no look at a held car', () => {
    const fail = finding('seat.mounts', 'fail')
    const stop = hold({ checks: ['seat.mounts'] })
    const rest = [presented(), ...allOk({ except: ['seat.mounts'] }), stop]
    expect(fold(...rest, fail, dispensation('seat.mounts', null, { basis: [fail], answers: [stop] })).verdict).toBe('held')
    const looked = finding('seat.mounts', 'fail', { answers: [stop] })
    expect(fold(...rest, looked, dispensation('seat.mounts', null, { basis: [looked] })).verdict).toBe('passed with advisories')
  })

  test('[F5] [F11] a carried-forward ok does not end it', () => {
    const stop = hold({ checks: ['seat.mounts'] })
    const carried = finding('seat.mounts', 'ok', { answers: [stop], carriedFrom: 'c'.repeat(64) })
    expect(fold(presented(), ...allOk({ except: ['seat.mounts'] }), stop, carried).verdict).toBe('held')
  })

  test('[F5] a hold lifted by somebody without the right still holds', () => {
    const stop = hold({ stations: ['brakes'] })
    expect(fold(presented(), ...allOk(), stop, lifted([stop], { quarantined: 'wrong-role' })).verdict).toBe('held')
  })
})

describe('[F10] repairs', () => {
  test('[F10] what a repair disturbs is not seen until a look answers it', () => {
    const fail = finding('brakes.pads', 'fail')
    const mended = finding('brakes.pads', 'ok', { basis: [fail] })
    const records = [presented(), ...allOk({ except: ['brakes.pads'] }), fail, mended]
    expect(fold(...records).checks.get('wheels.nuts.front')).toMatchObject({
      standing: 'not-seen',
      unanswered: [mended.hash],
      required: true,
    })
    expect(fold(...records, finding('wheels.nuts.front', 'ok', { answers: [mended] })).verdict).toBe('passed')
  })

  test('[F10] [T1] put right by somebody without the right disturbs the car all the same', () => {
    const mended = finding('brakes.pads', 'ok', { found: { outcome: 'fail', reason: 'worn' }, quarantined: 'wrong-role' })
    const state = fold(presented(), ...allOk(), mended)
    expect(state.checks.get('wheels.nuts.front')?.standing).toBe('not-seen')
  })
})

test('[F10] [T1] under a dispensation, an ok of somebody without the right still disturbs the car', () => {
  const fail = finding('brakes.pads', 'fail')
  const leave = dispensation('brakes.pads', null, { basis: [fail] })
  const mended = finding('brakes.pads', 'ok', { basis: [leave, fail], quarantined: 'wrong-role' })
  const records = [presented(), ...allOk({ except: ['brakes.pads'] }), fail, leave]
  expect(fold(...records).verdict).toBe('passed with advisories')
  expect(fold(...records, mended).open).toEqual(['wheels.nuts.front'])
})

describe('[F13] recalls and the wet', () => {
  const shown = presented({ facts: { cage: false, slicks: true } })

  test.each([
    [
      'its session is over',
      { when: 'session-over', group: GROUP_A, session: 2 },
      day({ what: 'session-over', group: GROUP_A, session: 2 }),
    ],
    [
      'a later session is over',
      { when: 'session-over', group: GROUP_A, session: 2 },
      day({ what: 'session-over', group: GROUP_A, session: 3 }),
    ],
    ['its time is reached', { when: 'time', at: 5000 }, day({ what: 'time', at: 5000 })],
    ['it is declared wet', { when: 'wet' }, day({ what: 'wet', on: true })],
    ['a passenger is added', { when: 'passenger' }, entryChanged({ what: 'people', added: [], removed: [], passengers: ['0'.repeat(36)] })],
  ] as const)('[F13] a recall is due when %s', (_, trigger, met) => {
    const later = recall(trigger, { stations: ['brakes'] })
    expect(fold(presented(), ...allOk(), later).verdict).toBe('passed')
    expect(fold(presented(), ...allOk(), later, met).verdict).toBe('held')
    expect(fold(presented(), ...allOk({ answers: [later] }), later, met).verdict).toBe('passed')
  })

  test.each([
    ['another group’s session', day({ what: 'session-over', group: '0'.repeat(36), session: 9 })],
    ['an earlier session', day({ what: 'session-over', group: GROUP_A, session: 1 })],
    ['the wet', day({ what: 'wet', on: true })],
  ])('[F13] %s does not make a recall after session 2 due', (_, other) => {
    const later = recall({ when: 'session-over', group: GROUP_A, session: 2 }, { stations: ['brakes'] })
    expect(fold(presented(), ...allOk(), later, other).verdict).toBe('passed')
  })

  test('[F13] what it names as past does not make it due', () => {
    const yesterday = day({ what: 'session-over', group: GROUP_A, session: 4 })
    const later = recall({ when: 'session-over', group: GROUP_A, session: 1 }, { stations: ['brakes'], answers: [yesterday] })
    expect(fold(presented(), ...allOk(), yesterday, later).verdict).toBe('passed')
    expect(fold(presented(), ...allOk(), yesterday, later, day({ what: 'session-over', group: GROUP_A, session: 1 })).verdict).toBe('held')
  })

  test('[F13] wet on holds a car that has checks for the wet, and no other', () => {
    const wet = day({ what: 'wet', on: true })
    expect(fold(presented(), ...allOk(), wet).verdict).toBe('passed')
    expect(fold(shown, ...allOk(), wet)).toMatchObject({ verdict: 'held', open: ['wheels.rain'], blocks: [{ kind: 'wet' }] })
    expect(fold(shown, ...allOk(), wet, finding('wheels.rain', 'ok', { answers: [wet] })).verdict).toBe('passed')
  })

  test('[F13] wet off ends the wet it names, and only that', () => {
    const [wet, again] = [day({ what: 'wet', on: true }), day({ what: 'wet', on: true })]
    const dry = day({ what: 'wet', on: false }, { basis: [wet] })
    expect(fold(shown, ...allOk(), wet, dry).verdict).toBe('passed')
    expect(fold(shown, ...allOk(), wet, dry, again).verdict).toBe('held')
    expect(fold(shown, ...allOk(), wet, day({ what: 'wet', on: false }, { basis: [wet], quarantined: 'wrong-role' })).verdict).toBe('held')
  })

  test('[F13] a pass from before the rain stays dead when it is dry again', () => {
    const wet = day({ what: 'wet', on: true })
    const before = pass({ answers: [shown] })
    const after = pass({ answers: [shown, wet] })
    const state = fold(shown, ...allOk(), before, wet, day({ what: 'wet', on: false }, { basis: [wet] }), after)
    expect(state.passes.map((one) => one.state)).toEqual(['dead', 'live'])
  })
})

test('[F9] on the second day a perishable look answers no hold any longer', () => {
  const stop = hold({ stations: ['brakes'] })
  const records = [presented(), ...allOk({ answers: [stop] }), stop]
  expect(foldSubject(records, CAR_KEY, context({ day: SUNDAY })).verdict).toBe('held')
})
