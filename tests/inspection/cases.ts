import type { LogEntry } from '@/lib/inspection/log-entry'
import type { FoldContext, PassState, Standing, Verdict } from '@/lib/inspection/state'
import type { SubjectKey } from '@/lib/inspection/subject'
import {
  CAR_KEY,
  CREW,
  FIT,
  FIT_KEY,
  GROUP_A,
  LOOK_OVER,
  PERSON,
  PERSON_KEY,
  SATURDAY,
  SUNDAY,
  allOk,
  band,
  day,
  dispensation,
  entryChanged,
  finding,
  hold,
  lifted,
  pass,
  presented,
  recall,
  ruling,
  unknownKind,
} from '../support/paddock'
import { TIGHTER_LIMITS } from '../support/paddock-book'

/** What must be so of one subject on one day, once all records are there. What is not named is not asked. */
export interface Expected {
  readonly of?: SubjectKey
  readonly on?: Partial<FoldContext>
  readonly verdict?: Verdict
  readonly standings?: Readonly<Record<string, Standing>>
  /** Hashes of the heads of a check. */
  readonly heads?: Readonly<Record<string, readonly LogEntry[]>>
  readonly disagreements?: readonly string[]
  readonly passes?: readonly (readonly [LogEntry, PassState['state']])[]
  /** The blocks, each with whether only the chief can lift it. */
  readonly blocks?: readonly (readonly [LogEntry, 'only the chief lifts' | 'ends when seen'])[]
  readonly open?: readonly string[]
  /** Defects in the history: check, then what became of it. */
  readonly defects?: readonly (readonly [string, 'put right' | 'undone' | 'open'])[]
}

/** One of the numbered cases: records that may come in any order, and what they must mean. */
export interface FoldCase {
  readonly number: number
  readonly title: string
  readonly build: () => { readonly records: readonly LogEntry[]; readonly expected: readonly Expected[] }
}

export const FOLD_CASES: readonly FoldCase[] = [
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
  {
    number: 12,
    title: 'a fail under a dispensation until Saturday stands again on Sunday, and the pass is dead',
    build: () => {
      const shown = presented()
      const fail = finding('seat.mounts', 'fail')
      const leave = dispensation('seat.mounts', SATURDAY, { basis: [fail] })
      const issued = pass({ answers: [shown, fail, leave] })
      return {
        records: [shown, ...allOk({ except: ['seat.mounts'] }), fail, leave, issued],
        expected: [
          { verdict: 'passed with advisories', standings: { 'seat.mounts': 'advisory' }, passes: [[issued, 'live']] },
          { on: { day: SUNDAY }, verdict: 'not passed', standings: { 'seat.mounts': 'fail' }, passes: [[issued, 'dead']] },
        ],
      }
    },
  },
  {
    number: 13,
    title: 'a dispensation covers the fail it names and not the one found meanwhile',
    build: () => {
      const fail = finding('seat.mounts', 'fail')
      const leave = dispensation('seat.mounts', null, { basis: [fail] })
      const again = finding('seat.mounts', 'fail', { actor: CREW.ben, basis: [fail] })
      return {
        records: [presented(), fail, leave, again],
        expected: [{ verdict: 'not passed', standings: { 'seat.mounts': 'fail' }, heads: { 'seat.mounts': [leave, again] } }],
      }
    },
  },
  {
    number: 14,
    title: 'a finding on the mirror ends no fail on the brakes, whatever it names',
    build: () => {
      const fail = finding('brakes.pads', 'fail')
      const elsewhere = finding('body.mirror', 'ok', { basis: [fail] })
      return {
        records: [presented(), fail, elsewhere],
        expected: [{ verdict: 'not passed', standings: { 'brakes.pads': 'fail', 'body.mirror': 'ok' } }],
      }
    },
  },
  {
    number: 15,
    title: 'undoing one’s own fail leaves the check not seen and the fail in the history',
    build: () => {
      const fail = finding('brakes.pads', 'fail')
      const undo = finding('brakes.pads', 'unseen', { basis: [fail] })
      return {
        records: [presented(), fail, undo],
        expected: [{ verdict: 'in progress', standings: { 'brakes.pads': 'not-seen' }, defects: [['brakes.pads', 'undone']] }],
      }
    },
  },
  {
    number: 16,
    title: 'a record of an unknown kind that stops blocks the car',
    build: () => {
      const shown = presented()
      const newer = unknownKind('stops')
      return {
        records: [shown, newer, ...allOk()],
        expected: [{ verdict: 'held', blocks: [[newer, 'only the chief lifts']] }],
      }
    },
  },
  {
    number: 18,
    title: 'an ok tapped while the screen showed another number does not count',
    build: () => {
      const confused = finding('seat.mounts', 'ok', { shown: { number: '47', plateTail: 'KLM' }, quarantined: 'shown-differs' })
      const renumbered = entryChanged({ what: 'number', number: '74' })
      return {
        records: [presented(), ...allOk({ except: ['seat.mounts'] }).slice(0, 2), confused, renumbered],
        expected: [{ verdict: 'in progress', standings: { 'seat.mounts': 'not-seen' }, heads: { 'seat.mounts': [] } }],
      }
    },
  },
  {
    number: 19,
    title: 'put right here is ok, opens again what it disturbed, and keeps the defect in the history',
    build: () => {
      const mended = finding('brakes.pads', 'ok', { found: { outcome: 'fail', reason: 'worn' } })
      const rest = allOk({ except: ['brakes.pads'] })
      return {
        records: [presented(), mended, ...rest],
        expected: [
          {
            verdict: 'in progress',
            standings: { 'brakes.pads': 'ok', 'wheels.nuts.front': 'not-seen', 'wheels.nuts.rear': 'ok' },
            open: ['wheels.nuts.front'],
            defects: [['brakes.pads', 'put right']],
          },
        ],
      }
    },
  },
  {
    number: 20,
    title: 'a required check that could not be seen is never passed',
    build: () => {
      const blind = finding('seat.mounts', 'could-not-see')
      const issued = presented()
      return {
        records: [issued, ...allOk({ except: ['seat.mounts'] }), blind],
        expected: [{ verdict: 'in progress', standings: { 'seat.mounts': 'could-not-see' }, open: ['seat.mounts'] }],
      }
    },
  },
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
