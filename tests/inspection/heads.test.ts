import { describe, expect, test } from 'vitest'
import { foldSubject } from '@/lib/inspection/fold-subject'
import type { LogEntry } from '@/lib/inspection/log-entry'
import type { CheckState } from '@/lib/inspection/state'
import { CAR_KEY, CREW, SATURDAY, SUNDAY, context, dispensation, finding, presented, ruling } from '../support/paddock'

const SEAT = 'seat.mounts'

function seat(records: readonly LogEntry[], day = SATURDAY): CheckState {
  return foldSubject([presented(), ...records], CAR_KEY, context({ day })).checks.get(SEAT) as CheckState
}

describe('what replaces what', () => {
  test('[F1] a line of another car is not looked at', () => {
    const fail = finding(SEAT, 'fail')
    const other = finding(SEAT, 'ok', { basis: [fail], subject: { car: '0'.repeat(36) } })
    expect(seat([fail, other]).standing).toBe('fail')
  })

  test('[F1] an expired dispensation is no head', () => {
    const fail = finding(SEAT, 'fail')
    const leave = dispensation(SEAT, SATURDAY, { basis: [fail] })
    expect(seat([fail, leave]).heads.map(({ hash }) => hash)).toEqual([leave.hash])
    expect(seat([fail, leave], SUNDAY).heads.map(({ hash }) => hash)).toEqual([fail.hash])
  })

  test.each([
    ['fail', 'could-not-see', 'fail'],
    ['could-not-see', 'advisory', 'could-not-see'],
    ['unseen', 'ok', 'not-seen'],
    ['advisory', 'ok', 'advisory'],
  ] as const)('[F2] of %s and %s, neither knowing the other, the first stands', (one, other, standing) => {
    const state = seat([finding(SEAT, one), finding(SEAT, other, { actor: CREW.ben })])
    expect(state.standing).toBe(standing)
    expect(state.disagreement).toBe(true)
  })

  test('[F2] a new look that names both ends the disagreement', () => {
    const [one, other] = [finding(SEAT, 'could-not-see'), finding(SEAT, 'ok', { actor: CREW.ben })]
    const look = finding(SEAT, 'ok', { basis: [one, other] })
    expect(seat([one, other, look])).toMatchObject({ standing: 'ok', disagreement: false })
  })
})

describe('[F4] how a fail ends', () => {
  const fail = finding(SEAT, 'fail')

  test.each(['ok', 'advisory'] as const)('[F4] by a look at %s that names it', (outcome) => {
    expect(seat([fail, finding(SEAT, outcome, { basis: [fail] })]).standing).toBe(outcome)
  })

  test('[F4] not by one who could not see: both stand side by side', () => {
    const blind = finding(SEAT, 'could-not-see', { basis: [fail] })
    expect(seat([fail, blind])).toMatchObject({ standing: 'fail', disagreement: true })
  })

  test('[F4] not by another person’s unseen', () => {
    expect(seat([fail, finding(SEAT, 'unseen', { actor: CREW.ben, basis: [fail] })]).standing).toBe('fail')
  })

  test('[F4] an unseen that names anybody else’s finding undoes not even its maker’s own', () => {
    const other = finding(SEAT, 'ok', { actor: CREW.ben })
    expect(seat([fail, other, finding(SEAT, 'unseen', { basis: [fail, other] })]).standing).toBe('fail')
  })

  test('[F4] a look taken back ends it no longer', () => {
    const look = finding(SEAT, 'ok', { actor: CREW.ben, basis: [fail] })
    const undo = finding(SEAT, 'unseen', { actor: CREW.ben, basis: [look] })
    expect(seat([fail, look, undo]).standing).toBe('fail')
  })

  test('[F4] [T1] a look or dispensation taken back ends it no longer, even where the taking back is quarantined', () => {
    const quarantined = 'device-lost'
    const look = finding(SEAT, 'ok', { actor: CREW.ben, basis: [fail] })
    expect(seat([fail, look, finding(SEAT, 'unseen', { actor: CREW.ben, basis: [look], quarantined })]).standing).toBe('fail')
    const leave = dispensation(SEAT, null, { basis: [fail] })
    expect(seat([fail, leave, finding(SEAT, 'unseen', { actor: CREW.chief, basis: [leave], quarantined })]).standing).toBe('fail')
  })

  test('[F4] by a ruling only where somebody really disagreed', () => {
    const before = finding(SEAT, 'ok', { actor: CREW.ben })
    const knowing = finding(SEAT, 'fail', { basis: [before] })
    expect(seat([before, knowing, ruling(SEAT, 'ok', { basis: [before, knowing] })]).standing).toBe('fail')

    const apart = finding(SEAT, 'ok', { actor: CREW.ben })
    expect(seat([fail, apart, ruling(SEAT, 'ok', { basis: [fail, apart] })]).standing).toBe('ok')
    expect(seat([fail, ruling(SEAT, 'ok', { basis: [fail] })]).standing).toBe('fail')
  })

  test('[F4] no ruling is milder than the mildest that anybody saw', () => {
    const apart = finding(SEAT, 'advisory', { actor: CREW.ben })
    expect(seat([fail, apart, ruling(SEAT, 'ok', { basis: [fail, apart] })]).standing).toBe('fail')
    expect(seat([fail, apart, ruling(SEAT, 'advisory', { basis: [fail, apart] })]).standing).toBe('advisory')
  })

  test('[F4] a ruling is never milder than a fail worked out from values', () => {
    const computed = finding(SEAT, 'fail', { judgement: { outcome: 'fail', code: 'seat.loose', facts: {} } })
    const apart = finding(SEAT, 'ok', { actor: CREW.ben })
    expect(seat([computed, apart, ruling(SEAT, 'ok', { basis: [computed, apart] })]).standing).toBe('fail')
    const fails = ruling(SEAT, 'fail', { basis: [computed, apart] })
    expect(seat([computed, apart, fails]).heads.map(({ hash }) => hash)).toEqual([fails.hash])
  })

  test('[F4] a ruling that settles nothing makes no check seen', () => {
    expect(seat([ruling(SEAT, 'ok', { basis: [] })]).standing).toBe('not-seen')
  })

  test('[F4] a dispensation that names no fail at hand accepts nothing', () => {
    expect(seat([dispensation(SEAT, null, { basis: ['a'.repeat(64)] })]).standing).toBe('not-seen')
  })

  test('[F4] once its dispensation is taken back the fail stands again', () => {
    const leave = dispensation(SEAT, null, { basis: [fail] })
    expect(seat([fail, leave])).toMatchObject({ standing: 'advisory', dispensation: { hash: leave.hash, conditions: 'group C only' } })
    expect(seat([fail, leave, finding(SEAT, 'unseen', { actor: CREW.chief, basis: [leave] })]).standing).toBe('fail')
  })

  test('[F4] a look that names the dispensation but not the fail beneath leaves the fail standing', () => {
    const leave = dispensation(SEAT, null, { basis: [fail] })
    expect(seat([fail, leave, finding(SEAT, 'ok', { basis: [leave] })]).standing).toBe('fail')
    expect(seat([fail, leave, finding(SEAT, 'ok', { basis: [leave, fail] })]).standing).toBe('ok')
  })

  test('[F4] a shorter dispensation leaves the longer one before it replaced when its own days end', () => {
    const long = dispensation(SEAT, null, { basis: [fail] })
    const short = dispensation(SEAT, SATURDAY, { basis: [long, fail] })
    expect(seat([fail, long, short]).dispensation?.hash).toBe(short.hash)
    expect(seat([fail, long, short], SUNDAY).standing).toBe('fail')
  })

  test('[F4] a dispensation without a date ends with the event', () => {
    const leave = dispensation(SEAT, null, { basis: [fail] })
    expect(seat([fail, leave], SUNDAY).standing).toBe('advisory')
    expect(seat([fail, leave], '2026-05-11').standing).toBe('fail')
  })
})

describe('[F9] what perishes', () => {
  test('[F9] a fail and a could-not-see of Saturday still stop on Sunday', () => {
    const state = foldSubject(
      [presented(), finding('brakes.pads', 'fail'), finding('wheels.nuts.rear', 'could-not-see')],
      CAR_KEY,
      context({ day: SUNDAY }),
    )
    expect(state.checks.get('brakes.pads')?.standing).toBe('fail')
    expect(state.checks.get('wheels.nuts.rear')?.standing).toBe('could-not-see')
  })

  test('[F9] a lapsed head is shown, marked, and not counted', () => {
    const state = foldSubject([presented(), finding('brakes.pads', 'advisory')], CAR_KEY, context({ day: SUNDAY }))
    expect(state.checks.get('brakes.pads')).toMatchObject({ standing: 'not-seen', heads: [{ lapsed: true }] })
    expect(state.advisories).toEqual([])
  })

  test('[F9] a phone a day ahead gives no ok for today', () => {
    const state = foldSubject([presented(), finding('brakes.pads', 'ok', { day: SUNDAY })], CAR_KEY, context())
    expect(state.checks.get('brakes.pads')?.standing).toBe('not-seen')
  })
})

describe('[F11] carried forward', () => {
  const carriedFrom = 'c'.repeat(64)

  test('[F11] it makes a standing check seen, and a perishable one not', () => {
    const state = foldSubject(
      [presented(), finding(SEAT, 'ok', { carriedFrom }), finding('brakes.pads', 'ok', { carriedFrom })],
      CAR_KEY,
      context(),
    )
    expect(state.checks.get(SEAT)?.standing).toBe('ok')
    expect(state.checks.get('brakes.pads')?.standing).toBe('not-seen')
  })

  test('[F11] it replaces an ok and its maker’s unseen, never a could-not-see or a dispensation', () => {
    const blind = finding(SEAT, 'could-not-see')
    expect(seat([blind, finding(SEAT, 'ok', { basis: [blind], carriedFrom })]).standing).toBe('could-not-see')
    const fail = finding(SEAT, 'fail')
    const leave = dispensation(SEAT, null, { basis: [fail] })
    expect(seat([fail, leave, finding(SEAT, 'ok', { basis: [leave, fail], carriedFrom })]).standing).toBe('advisory')
    const ok = finding(SEAT, 'ok')
    const undo = finding(SEAT, 'unseen', { basis: [ok] })
    expect(seat([ok, undo, finding(SEAT, 'ok', { basis: [undo], carriedFrom })]).standing).toBe('ok')
  })
})
