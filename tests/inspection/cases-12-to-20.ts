import { CREW, SATURDAY, SUNDAY, allOk, dispensation, entryChanged, finding, pass, presented, unknownKind } from '../support/paddock'
import type { FoldCase } from './fold-case'

/** The numbered cases from 12 to 20, as far as the fold decides them. */
export const CASES_12_TO_20: readonly FoldCase[] = [
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
]
