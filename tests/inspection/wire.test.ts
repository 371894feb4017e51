import { describe, expect, test } from 'vitest'
import type { Book } from '@/lib/checklist/book'
import { foldSubject } from '@/lib/inspection/fold-subject'
import type { LogEntry } from '@/lib/inspection/log-entry'
import { wireSentence, wireStations } from '@/lib/inspection/wire'
import { CAR_KEY, PERSON, PERSON_KEY, allOk, context, finding, hold, presented } from '../support/paddock'
import { paddockBook } from '../support/paddock-book'

const book = paddockBook() as Book

function wire(...records: readonly LogEntry[]) {
  return wireStations(foldSubject(records, CAR_KEY, context()), book)
}

function states(...records: readonly LogEntry[]) {
  return Object.fromEntries(wire(...records).map(({ station, state, open }) => [station, `${state} ${open}`]))
}

describe('the wire', () => {
  test('before a car is presented every station is still to be looked at', () => {
    expect(wire().map(({ state }) => state)).toEqual(['none', 'none', 'none', 'none', 'none'])
  })

  test('each station shows the worst that can be said of it', () => {
    const rest = [presented(), ...allOk({ except: ['brakes.pads', 'wheels.nuts.rear'] })]
    expect(states(...rest, finding('brakes.pads', 'fail'))).toEqual({
      brakes: 'fail 1',
      wheels: 'ask 1',
      seat: 'ok 0',
      body: 'na 0',
      cage: 'na 0',
    })
  })

  test('a required check that could not be seen asks for somebody, an optional one is a reservation', () => {
    const shown = states(presented(), finding('seat.mounts', 'could-not-see'), finding('body.mirror', 'could-not-see'))
    expect(shown).toMatchObject({ seat: 'ask 1', body: 'advisory 0', brakes: 'none 1' })
  })

  test('a hold shows on the stations it names, until they are seen for it', () => {
    const stop = hold({ stations: ['brakes'] })
    expect(states(presented(), ...allOk(), stop)).toMatchObject({ brakes: 'held 1', seat: 'ok 0' })
    expect(states(presented(), ...allOk({ answers: [stop] }), stop)).toMatchObject({ brakes: 'ok 0' })
  })

  test('a hold that only the chief lifts shows on the stations it names too', () => {
    expect(states(presented(), ...allOk(), hold({ stations: ['brakes', 'gearbox'] }))).toMatchObject({ brakes: 'held 1', seat: 'ok 0' })
  })

  test('a person’s wire has the person’s stations', () => {
    const seen = foldSubject([presented({ subject: PERSON }), finding('helmet.label', 'ok', { subject: PERSON })], PERSON_KEY, context())
    expect(wireStations(seen, book)).toEqual([{ station: 'helmet', title: 'Helmet and kit', short: 'helmet', state: 'ok', open: 0 }])
  })

  test('it can be heard as a sentence', () => {
    expect(wireSentence(wire(presented(), ...allOk()))).toBe('3 of 3 stations ok')
    expect(wireSentence(wire(presented(), finding('brakes.pads', 'fail'), finding('seat.mounts', 'advisory')))).toBe(
      '1 of 3 stations ok, brakes failed, seat with advisories, 1 to see',
    )
    expect(wireSentence(wire(presented(), ...allOk(), hold({ stations: ['brakes'] })))).toBe('2 of 3 stations ok, brakes held')
  })
})
