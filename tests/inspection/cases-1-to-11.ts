import { CREW, allOk, finding, hold, lifted, pass, presented, ruling } from '../support/paddock'
import type { FoldCase } from './fold-case'

/** The numbered cases from 1 to 11, as far as the fold decides them. */
export const CASES_1_TO_11: readonly FoldCase[] = [
  {
    number: 1,
    title: 'a pass issued offline without knowing the fail is dead once both are there',
    build: () => {
      const shown = presented()
      const fail = finding('brakes.pads', 'fail')
      const blind = pass({ actor: CREW.ben, answers: [shown] })
      return {
        records: [shown, fail, finding('seat.mounts', 'ok'), blind],
        expected: [{ verdict: 'not passed', passes: [[blind, 'dead']] }],
      }
    },
  },
  {
    number: 2,
    title: 'a true fail from somebody whose role or tablet is gone is quarantined and still stops',
    build: () => {
      const shown = presented()
      const late = finding('brakes.pads', 'fail', { quarantined: 'device-retired' })
      const roleless = finding('seat.mounts', 'fail', { quarantined: 'wrong-role' })
      const blind = pass({ answers: [shown] })
      return {
        records: [shown, ...allOk(), late, roleless, blind],
        expected: [{ verdict: 'not passed', standings: { 'brakes.pads': 'fail', 'seat.mounts': 'fail' }, passes: [[blind, 'dead']] }],
      }
    },
  },
  {
    number: 3,
    title: 'an ok made without the right takes no fail away, nor does a finding that rests on it',
    build: () => {
      const fail = finding('brakes.pads', 'fail')
      const rightless = finding('brakes.pads', 'ok', { actor: CREW.desk, basis: [fail], quarantined: 'wrong-role' })
      const onTop = finding('brakes.pads', 'advisory', { actor: CREW.ben, basis: [rightless] })
      return {
        records: [presented(), fail, rightless, onTop],
        expected: [
          {
            verdict: 'not passed',
            standings: { 'brakes.pads': 'fail' },
            heads: { 'brakes.pads': [fail, onTop] },
            disagreements: ['brakes.pads'],
          },
        ],
      }
    },
  },
  {
    number: 5,
    title: 'a ruling by a scrutineer settles nothing: the fail stands',
    build: () => {
      const fail = finding('brakes.pads', 'fail')
      const fine = finding('brakes.pads', 'ok', { actor: CREW.ben })
      const ruled = ruling('brakes.pads', 'ok', { actor: CREW.ben, basis: [fail, fine], quarantined: 'wrong-role' })
      return {
        records: [presented(), fail, fine, ruled],
        expected: [{ verdict: 'not passed', standings: { 'brakes.pads': 'fail' }, heads: { 'brakes.pads': [fail, fine] } }],
      }
    },
  },
  {
    number: 6,
    title: 'a ruling and another look at the same time: the fail stands until the chief names both',
    build: () => {
      const fail = finding('seat.mounts', 'fail')
      const fine = finding('seat.mounts', 'ok', { actor: CREW.ben })
      const ruled = ruling('seat.mounts', 'ok', { basis: [fail, fine] })
      const again = finding('seat.mounts', 'fail', { actor: CREW.asha, basis: [fail, fine] })
      return {
        records: [presented(), fail, fine, ruled, again],
        expected: [{ verdict: 'not passed', standings: { 'seat.mounts': 'fail' }, heads: { 'seat.mounts': [ruled, again] } }],
      }
    },
  },
  {
    number: 6,
    title: 'once the chief names the ruling and the later fail, the ruling stands',
    build: () => {
      const fail = finding('seat.mounts', 'fail')
      const fine = finding('seat.mounts', 'ok', { actor: CREW.ben })
      const ruled = ruling('seat.mounts', 'ok', { basis: [fail, fine] })
      const again = finding('seat.mounts', 'fail', { basis: [fail, fine] })
      const both = ruling('seat.mounts', 'ok', { basis: [ruled, again] })
      return {
        records: [presented(), fail, fine, ruled, again, both],
        expected: [{ standings: { 'seat.mounts': 'ok' }, heads: { 'seat.mounts': [both] } }],
      }
    },
  },
  {
    number: 7,
    title: 'two oks that do not know each other are ok and no disagreement',
    build: () => {
      const one = finding('seat.mounts', 'ok')
      const other = finding('seat.mounts', 'ok', { actor: CREW.ben })
      return {
        records: [presented(), one, other],
        expected: [{ standings: { 'seat.mounts': 'ok' }, heads: { 'seat.mounts': [one, other] }, disagreements: [] }],
      }
    },
  },
  {
    number: 8,
    title: 'an ok made without knowing the hold does not end it, whenever it arrives',
    build: () => {
      const stop = hold({ stations: ['brakes'] })
      const shown = presented()
      return { records: [shown, stop, ...allOk()], expected: [{ verdict: 'held', blocks: [[stop, 'ends when seen']] }] }
    },
  },
  {
    number: 9,
    title: 'a pass from before the hold stays dead after the re-check; a new pass is needed',
    build: () => {
      const shown = presented()
      const first = allOk()
      const before = pass({ answers: [shown] })
      const stop = hold({ stations: ['brakes'] })
      const known = first.filter((entry) => 'check' in entry.record && entry.record.check === 'brakes.pads')
      const again = finding('brakes.pads', 'ok', { basis: known, answers: [stop] })
      return { records: [shown, ...first, before, stop, again], expected: [{ verdict: 'passed', passes: [[before, 'dead']], blocks: [] }] }
    },
  },
  {
    number: 10,
    title: 'a hold that names no station, or an unknown one, is not ended by any look',
    build: () => {
      const bare = hold()
      const odd = hold({ stations: ['brakes', 'gearbox'] })
      const missing = hold({ checks: ['gearbox.oil'] })
      return {
        records: [presented(), bare, odd, missing, ...allOk({ answers: [bare, odd, missing] })],
        expected: [
          {
            verdict: 'held',
            blocks: [
              [bare, 'only the chief lifts'],
              [odd, 'only the chief lifts'],
              [missing, 'only the chief lifts'],
            ],
          },
        ],
      }
    },
  },
  {
    number: 10,
    title: 'the chief lifts a hold that no look can end',
    build: () => {
      const bare = hold()
      return { records: [presented(), bare, lifted([bare]), ...allOk()], expected: [{ verdict: 'passed', blocks: [] }] }
    },
  },
  {
    number: 11,
    title: 'a second hold for one contact kills the pass that answered only the first, and holds',
    build: () => {
      const shown = presented()
      const first = hold({ stations: ['brakes'] })
      const second = hold({ stations: ['brakes'], actor: CREW.ben })
      const issued = pass({ answers: [shown, first] })
      return {
        records: [shown, first, second, ...allOk({ answers: [first] }), issued],
        expected: [{ verdict: 'held', blocks: [[second, 'ends when seen']], passes: [[issued, 'dead']] }],
      }
    },
  },
  {
    number: 11,
    title: 'when the chief lifts the second hold only a new pass lives',
    build: () => {
      const shown = presented()
      const first = hold({ stations: ['brakes'] })
      const second = hold({ stations: ['brakes'], actor: CREW.ben })
      const issued = pass({ answers: [shown, first] })
      const fresh = pass({ answers: [shown, first, second], basis: [issued] })
      return {
        records: [shown, first, second, ...allOk({ answers: [first] }), issued, lifted([second]), fresh],
        expected: [
          {
            verdict: 'passed',
            passes: [
              [issued, 'dead'],
              [fresh, 'live'],
            ],
          },
        ],
      }
    },
  },
]
