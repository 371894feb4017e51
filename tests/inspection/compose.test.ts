import { describe, expect, test } from 'vitest'
import {
  answersFor,
  basisFor,
  basisForUndo,
  passAnswers,
  passBasis,
  presentedBasis,
  proposeOutcome,
  returnedBasis,
} from '@/lib/inspection/compose'
import { recallAnswers, wetOffBasis } from '@/lib/inspection/compose-day'
import { foldSubject } from '@/lib/inspection/fold-subject'
import type { LogEntry } from '@/lib/inspection/log-entry'
import {
  CAR_KEY,
  CREW,
  GROUP_A,
  SUNDAY,
  context,
  day,
  dispensation,
  entryChanged,
  finding,
  hold,
  lifted,
  pass,
  presented,
  recall,
} from '../support/paddock'

const SEAT = 'seat.mounts'

function state(...records: readonly LogEntry[]) {
  return foldSubject(records, CAR_KEY, context())
}

function hashes(...entries: readonly LogEntry[]): readonly string[] {
  return entries.map(({ hash }) => hash).sort()
}

describe('[M5] what a new line names', () => {
  const shown = presented()

  test('[M5] every head of its check, quarantined ones too, and none of another check', () => {
    const [ok, other] = [finding(SEAT, 'ok'), finding('brakes.pads', 'fail')]
    const doubted = finding(SEAT, 'fail', { quarantined: 'wrong-role', actor: CREW.ben })
    expect([...basisFor(state(shown, ok, other, doubted), SEAT)].sort()).toEqual(hashes(ok, doubted))
  })

  test('[M5] no record that was replaced, except the fail beneath a dispensation', () => {
    const ok = finding(SEAT, 'ok')
    const fail = finding(SEAT, 'fail', { basis: [ok] })
    const leave = dispensation(SEAT, null, { basis: [fail] })
    expect(basisFor(state(shown, ok, fail), SEAT)).toEqual([fail.hash])
    expect(basisFor(state(shown, ok, fail, leave), SEAT)).toEqual([leave.hash, fail.hash])
  })

  test('[M5] a lapsed head as well', () => {
    const ok = finding('brakes.pads', 'ok')
    expect(basisFor(foldSubject([shown, ok], CAR_KEY, context({ day: SUNDAY })), 'brakes.pads')).toEqual([ok.hash])
  })

  test('[M5] an undo names its maker’s own heads only', () => {
    const [mine, theirs] = [finding(SEAT, 'fail'), finding(SEAT, 'ok', { actor: CREW.ben })]
    expect(basisForUndo(state(shown, mine, theirs), SEAT, CREW.asha)).toEqual([mine.hash])
    expect(basisForUndo(state(shown, theirs), SEAT, CREW.asha)).toEqual([])
  })

  test('[M5] its answers are every hold, due recall, wet switch and repair that names it or its station, ended or not', () => {
    const facts = { cage: false, slicks: true }
    const [byStation, byCheck, elsewhere] = [
      hold({ stations: ['wheels'] }),
      hold({ checks: ['wheels.nuts.front'] }),
      hold({ stations: ['seat'] }),
    ]
    const later = recall({ when: 'session-over', group: GROUP_A, session: 1 }, { stations: ['wheels'] })
    const notDue = recall({ when: 'session-over', group: GROUP_A, session: 9 }, { stations: ['wheels'] })
    const over = day({ what: 'session-over', group: GROUP_A, session: 1 })
    const mended = finding('brakes.pads', 'ok', { found: { outcome: 'fail', reason: null } })
    const wet = day({ what: 'wet', on: true })
    const all = state(presented({ facts }), byStation, byCheck, elsewhere, lifted([byStation]), later, notDue, over, mended, wet)

    expect(answersFor(all, 'wheels.nuts.front')).toEqual(hashes(byStation, byCheck, later, mended))
    expect(answersFor(all, 'wheels.nuts.rear')).toEqual(hashes(byStation, later))
    expect(answersFor(all, 'wheels.rain')).toEqual(hashes(byStation, later, wet))
    expect(answersFor(all, 'no.such')).toEqual([])
  })

  test('[M5] a new look made with both ends what it should', () => {
    const fail = finding(SEAT, 'fail')
    const stop = hold({ stations: ['seat'] })
    const before = state(shown, fail, stop)
    const look = finding(SEAT, 'ok', { basis: basisFor(before, SEAT), answers: answersFor(before, SEAT) })
    expect(state(shown, fail, stop, look)).toMatchObject({ blocks: [], fails: [] })
  })
})

describe('what other records name', () => {
  test('a pass answers what the state asks, and replaces those not dead', () => {
    const shown = presented()
    const [blind, first, doubted] = [pass(), pass({ answers: [shown] }), pass({ answers: [shown], quarantined: 'device-lost' })]
    const before = state(shown, blind, first, doubted)
    expect(passAnswers(before)).toEqual([shown.hash])
    expect([...passBasis(before)].sort()).toEqual(hashes(first, doubted))
  })

  test('a presented names the heads, a return the withdrawals in force', () => {
    const [one, gone] = [presented(), entryChanged({ what: 'withdrawn' })]
    const two = presented({ basis: [one] })
    expect(presentedBasis(state(one, two))).toEqual([two.hash])
    expect(returnedBasis(state(one, gone))).toEqual([gone.hash])
    expect(returnedBasis(state(gone, entryChanged({ what: 'returned' }, { basis: [gone] })))).toEqual([])
  })

  test('wet off names the wet in force; a recall what has already met its trigger', () => {
    const wet = day({ what: 'wet', on: true })
    const dry = day({ what: 'wet', on: false }, { basis: [wet] })
    const again = day({ what: 'wet', on: true })
    const over = day({ what: 'session-over', group: GROUP_A, session: 3 })
    const log = [wet, dry, again, over]
    expect(wetOffBasis(log)).toEqual([again.hash])
    expect(recallAnswers(log, CAR_KEY, { when: 'session-over', group: GROUP_A, session: 1 })).toEqual([over.hash])
    expect(recallAnswers(log, CAR_KEY, { when: 'session-over', group: GROUP_A, session: 4 })).toEqual([])
    expect(recallAnswers(log, CAR_KEY, { when: 'wet' })).toEqual([wet.hash])
  })

  test('a recall before a passenger or at a time that is already so is due at once: it names nothing as past', () => {
    const aboard = entryChanged({ what: 'people', added: [], removed: [], passengers: ['0'.repeat(36)] })
    const log = [aboard, day({ what: 'time', at: 5000 })]
    expect(recallAnswers(log, CAR_KEY, { when: 'passenger' })).toEqual([])
    expect(recallAnswers(log, CAR_KEY, { when: 'time', at: 4000 })).toEqual([])
  })

  test('a judgement proposes its outcome, and an undecided one none', () => {
    expect((['ok', 'advisory', 'fail', 'undecided'] as const).map((outcome) => proposeOutcome({ outcome }))).toEqual([
      'ok',
      'advisory',
      'fail',
      null,
    ])
  })
})
