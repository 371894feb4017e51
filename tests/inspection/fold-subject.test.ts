import { describe, expect, test } from 'vitest'
import { foldSubject } from '@/lib/inspection/fold-subject'
import { CAR_KEY, allOk, context, finding, hold, pass, presented } from '../support/paddock'

describe('foldSubject', () => {
  test('a car nobody has seen is not presented', () => {
    expect(foldSubject([], CAR_KEY, context()).verdict).toBe('not presented')
  })

  test('[F6] a car with everything required seen and ok is passed, and its pass lives', () => {
    const shown = presented()
    const state = foldSubject([shown, ...allOk(), pass({ answers: [shown] })], CAR_KEY, context())

    expect(state.verdict).toBe('passed')
    expect(state.open).toEqual([])
    expect(state.passes.map((one) => one.state)).toEqual(['live'])
  })

  test('[F4] a fail stands until a look that names it', () => {
    const shown = presented()
    const fail = finding('brakes.pads', 'fail')
    const rest = [shown, ...allOk({ except: ['brakes.pads'] }), fail]

    expect(foldSubject([...rest, finding('brakes.pads', 'ok')], CAR_KEY, context()).verdict).toBe('not passed')
    expect(foldSubject([...rest, finding('brakes.pads', 'could-not-see', { basis: [fail] })], CAR_KEY, context()).verdict).toBe(
      'not passed',
    )
    const repair = finding('brakes.pads', 'ok', { basis: [fail] })
    const reopened = foldSubject([...rest, repair], CAR_KEY, context())
    expect(reopened.verdict).toBe('in progress')
    expect(reopened.open).toEqual(['wheels.nuts.front'])
  })

  test('[F5] a hold blocks until its checks are seen for it', () => {
    const stop = hold({ stations: ['brakes'] })
    expect(foldSubject([presented(), ...allOk(), stop], CAR_KEY, context()).verdict).toBe('held')
    expect(foldSubject([presented(), ...allOk({ answers: [stop] }), stop], CAR_KEY, context()).verdict).toBe('passed')
  })
})
