import {
  CAR_KEY,
  CREW,
  FIT,
  FIT_KEY,
  GROUP_A,
  LOOK_OVER,
  PERSON,
  PERSON_KEY,
  SUNDAY,
  allOk,
  band,
  day,
  finding,
  hold,
  pass,
  presented,
  recall,
} from '../support/paddock'
import { TIGHTER_LIMITS } from '../support/paddock-book'
import type { FoldCase } from './fold-case'

/** The numbered cases from 21 to 29, as far as the fold decides them. */
export const CASES_21_TO_29: readonly FoldCase[] = [
  {
    number: 21,
    title: 'a recall after session 1 holds the car once session 1 is over, and kills its pass',
    build: () => {
      const shown = presented()
      const later = recall({ when: 'session-over', group: GROUP_A, session: 1 }, { stations: ['brakes'] })
      const issued = pass({ answers: [shown] })
      const over = day({ what: 'session-over', group: GROUP_A, session: 1 })
      return {
        records: [shown, ...allOk(), later, issued, over],
        expected: [{ verdict: 'held', blocks: [[later, 'ends when seen']], passes: [[issued, 'dead']] }],
      }
    },
  },
  {
    number: 22,
    title: 'after a kill everything is seen again: the old pass stays dead, the new one lives',
    build: () => {
      const shown = presented()
      const old = pass({ answers: [shown] })
      const stop = hold({ stations: ['brakes'] })
      const fresh = pass({ answers: [shown, stop], basis: [old] })
      return {
        records: [shown, old, stop, ...allOk({ answers: [stop] }), fresh],
        expected: [
          {
            verdict: 'passed',
            passes: [
              [old, 'dead'],
              [fresh, 'live'],
            ],
          },
        ],
      }
    },
  },
  {
    number: 23,
    title: 'a helmet that fails kills the band and leaves the car’s pass alive',
    build: () => {
      const shown = presented()
      const issued = pass({ answers: [shown] })
      const seated = presented({ subject: PERSON })
      const banded = band({ answers: [seated] })
      const fine = finding('helmet.label', 'ok', { subject: PERSON })
      const failed = finding('helmet.label', 'fail', { subject: PERSON, basis: [fine] })
      return {
        records: [shown, issued, seated, banded, fine, failed],
        expected: [
          { of: PERSON_KEY, verdict: 'not passed', passes: [[banded, 'dead']] },
          { of: CAR_KEY, passes: [[issued, 'live']] },
        ],
      }
    },
  },
  {
    number: 24,
    title: 'a fit that fails bars that driver from that car and touches neither pass nor band',
    build: () => {
      const shown = presented()
      const issued = pass({ answers: [shown] })
      const seated = presented({ subject: PERSON })
      const banded = band({ answers: [seated] })
      const tried = presented({ subject: FIT })
      const failed = finding('reach.headroom', 'fail', { subject: FIT })
      return {
        records: [shown, issued, seated, banded, tried, failed],
        expected: [
          { of: FIT_KEY, verdict: 'not passed' },
          { of: PERSON_KEY, passes: [[banded, 'live']] },
          { of: CAR_KEY, passes: [[issued, 'live']] },
        ],
      }
    },
  },
  {
    number: 25,
    title: 'a hold on a station that this depth does not ask makes its applicable checks required',
    build: () => {
      const stop = hold({ stations: ['body'] })
      return {
        records: [presented(), ...allOk(), stop],
        expected: [{ verdict: 'held', open: ['body.mirror', 'body.undertray'], blocks: [[stop, 'ends when seen']] }],
      }
    },
  },
  {
    number: 25,
    title: 'and it ends when they are seen for it',
    build: () => {
      const stop = hold({ stations: ['body'] })
      const seen = ['body.mirror', 'body.undertray'].map((check) => finding(check, 'ok', { answers: [stop] }))
      return { records: [presented(), ...allOk(), stop, ...seen], expected: [{ verdict: 'passed', blocks: [], open: [] }] }
    },
  },
  {
    number: 26,
    title: 'Saturday’s ok on what perishes is not seen on Sunday; what stands, stands',
    build: () => {
      return {
        records: [presented(), ...LOOK_OVER.map((check) => finding(check, 'ok'))],
        expected: [
          { verdict: 'passed' },
          { on: { day: SUNDAY }, verdict: 'in progress', standings: { 'wheels.tread': 'not-seen', 'seat.mounts': 'ok' } },
        ],
      }
    },
  },
  {
    number: 27,
    title: 'a carried-forward ok does not end a fail',
    build: () => {
      const fail = finding('seat.mounts', 'fail')
      const carried = finding('seat.mounts', 'ok', { basis: [fail], carriedFrom: 'f'.repeat(64) })
      return { records: [presented(), fail, carried], expected: [{ verdict: 'not passed', standings: { 'seat.mounts': 'fail' } }] }
    },
  },
  {
    number: 28,
    title: 'presented twice offline with the same pins: the passes live',
    build: () => {
      const bay = presented()
      const noise = presented({ actor: CREW.ben })
      const issued = pass({ answers: [bay] })
      const other = pass({ answers: [noise], actor: CREW.ben })
      return {
        records: [bay, noise, issued, other],
        expected: [
          {
            passes: [
              [issued, 'live'],
              [other, 'live'],
            ],
          },
        ],
      }
    },
  },
  {
    number: 28,
    title: 'presented twice offline at different depths: the deeper holds',
    build: () => {
      const bay = presented()
      const deep = presented({ actor: CREW.ben, depth: 'full' })
      const issued = pass({ answers: [bay] })
      return {
        records: [bay, deep, ...allOk(), issued],
        expected: [{ verdict: 'in progress', open: ['body.undertray'], passes: [[issued, 'dead']] }],
      }
    },
  },
  {
    number: 29,
    title: 'a limit tightened at noon leaves what was measured under the old one undecided and the pass dead',
    build: () => {
      const shown = presented()
      const issued = pass({ answers: [shown] })
      const noon = presented({ actor: CREW.organiser, limits: TIGHTER_LIMITS, basis: [shown] })
      return {
        records: [shown, ...allOk(), issued, noon],
        expected: [
          {
            verdict: 'in progress',
            standings: { 'wheels.tread': 'undecided', 'seat.mounts': 'ok' },
            open: ['wheels.tread'],
            passes: [[issued, 'dead']],
          },
        ],
      }
    },
  },
]
