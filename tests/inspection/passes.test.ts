import { describe, expect, test } from 'vitest'
import { foldSubject } from '@/lib/inspection/fold-subject'
import type { LogEntry } from '@/lib/inspection/log-entry'
import type { KillReason, PassState } from '@/lib/inspection/state'
import {
  CAR_KEY,
  CREW,
  FIT,
  PERSON,
  PERSON_KEY,
  SATURDAY,
  SUNDAY,
  adopted,
  allOk,
  band,
  comment,
  context,
  dispensation,
  entryChanged,
  finding,
  hold,
  pass,
  presented,
  unknownKind,
  voided,
} from '../support/paddock'

const shown = presented()

function fate(issued: LogEntry, records: readonly LogEntry[], day = SATURDAY): readonly (PassState['state'] | KillReason)[] {
  const state = foldSubject([shown, ...records, issued], CAR_KEY, context({ day })).passes.find(({ hash }) => hash === issued.hash)
  return [...new Set([state?.state ?? 'dead', ...(state?.killedBy ?? []).map(({ reason }) => reason)])]
}

describe('[F7] what kills a pass', () => {
  const fail = finding('seat.mounts', 'fail')
  const repair = finding('seat.mounts', 'ok', { basis: [fail] })
  const plain = pass({ answers: [shown] })

  test.each<[string, readonly LogEntry[], KillReason]>([
    ['a fail', [fail], 'fail-not-answered'],
    ['a fail of somebody who may not', [finding('seat.mounts', 'fail', { quarantined: 'wrong-role' })], 'fail-not-answered'],
    ['a hold', [hold({ stations: ['brakes'] })], 'hold-not-answered'],
    ['a stop of unknown kind', [unknownKind('stops')], 'hold-not-answered'],
    ['a repair', [finding('seat.mounts', 'ok', { found: { outcome: 'advisory', reason: null } })], 'repair-not-answered'],
    ['other facts', [presented({ facts: { cage: true, slicks: false } })], 'pins-changed'],
    ['another number', [entryChanged({ what: 'number', number: '48' })], 'entry-changed'],
    ['another plate', [entryChanged({ what: 'plate', plateTail: 'XYZ' })], 'entry-changed'],
    ['changed car facts', [entryChanged({ what: 'facts' })], 'entry-changed'],
    ['a withdrawal', [entryChanged({ what: 'withdrawn' })], 'withdrawn'],
    ['a void', [voided(plain)], 'void'],
    ['a void of somebody who may not', [voided(plain, { quarantined: 'wrong-role' })], 'void'],
    ['a pass that replaces it', [pass({ answers: [shown], basis: [plain] })], 'replaced'],
  ])('[F7] %s that it does not answer', (_, records, reason) => {
    expect(fate(plain, records)).toEqual(['dead', reason])
  })

  test.each<[string, readonly LogEntry[]]>([
    ['an ok', allOk()],
    ['an advisory', [finding('seat.mounts', 'advisory')]],
    ['a comment', [comment()]],
    ['another run group', [entryChanged({ what: 'group', group: '0'.repeat(36) })]],
    ['the same pins again', [presented()]],
    ['a hold whose key nobody vouches for', [hold({ quarantined: 'unknown-enrolment' })]],
    ['another pass that does not know it', [pass({ answers: [shown] })]],
  ])('[F7] not by %s', (_, records) => {
    expect(fate(plain, records)).toEqual(['live'])
  })

  test('[F7] one that answers the fail and its repair lives', () => {
    expect(fate(pass({ answers: [shown, fail, repair] }), [fail, repair])).toEqual(['live'])
  })

  test('[F7] one that answers a fail that stands is dead, and stays dead when the fail ends', () => {
    const early = pass({ answers: [shown, fail] })
    expect(fate(early, [fail])).toEqual(['dead', 'fail-stands-again'])
    expect(fate(early, [fail, finding('seat.mounts', 'unseen', { basis: [fail] })])).toEqual(['dead', 'fail-stands-again'])
    expect(fate(early, [fail, dispensation('seat.mounts', null, { basis: [fail] })])).toEqual(['dead', 'fail-stands-again'])
  })

  test('[F7] when the repair it rests on is taken back it is dead, also after a new one', () => {
    const undo = finding('seat.mounts', 'unseen', { basis: [repair] })
    const again = finding('seat.mounts', 'ok', { basis: [undo, fail] })
    const issued = pass({ answers: [shown, fail, repair] })
    expect(fate(issued, [fail, repair, undo])).toEqual(['dead', 'fail-stands-again'])
    expect(fate(issued, [fail, repair, undo, again])).toEqual(['dead', 'repair-not-answered', 'fail-stands-again'])
  })

  test('[F7] on the day after its dispensation it is dead, also once the thing is mended', () => {
    const leave = dispensation('seat.mounts', SATURDAY, { basis: [fail] })
    const issued = pass({ answers: [shown, fail, leave] })
    expect(fate(issued, [fail, leave])).toEqual(['live'])
    expect(fate(issued, [fail, leave], SUNDAY)).toEqual(['dead', 'fail-stands-again'])
    const mended = finding('seat.mounts', 'ok', { basis: [fail], day: SUNDAY })
    expect(fate(issued, [fail, leave, mended], SUNDAY)).toEqual(['dead', 'repair-not-answered', 'fail-stands-again'])
    expect(fate(pass({ answers: [shown, fail, leave, mended] }), [fail, leave, mended], SUNDAY)).toEqual(['live'])
  })

  test('[F7] a repair that had to be adopted saves only the pass that knew of the adoption', () => {
    const doubted = finding('seat.mounts', 'ok', { basis: [fail], quarantined: 'device-lost' })
    const vouched = adopted(doubted)
    expect(fate(pass({ answers: [shown, fail, doubted] }), [fail, doubted, vouched])).toEqual(['dead', 'fail-stands-again'])
    expect(fate(pass({ answers: [shown, fail, doubted, vouched] }), [fail, doubted, vouched])).toEqual(['live'])
  })

  test('[F7] one made after a withdrawal and return names the withdrawal and lives', () => {
    const gone = entryChanged({ what: 'withdrawn' })
    const back = entryChanged({ what: 'returned' }, { basis: [gone] })
    expect(fate(plain, [gone, back])).toEqual(['dead', 'withdrawn'])
    expect(fate(pass({ answers: [shown, gone] }), [gone, back])).toEqual(['live'])
  })

  test('[T1] a quarantined pass does nothing, yet those it replaced stay dead', () => {
    const doubted = pass({ answers: [shown], basis: [plain], quarantined: 'device-lost' })
    expect(fate(doubted, [plain])).toEqual(['quarantined'])
    expect(fate(plain, [doubted])).toEqual(['dead', 'replaced'])
    expect(fate(doubted, [adopted(doubted)])).toEqual(['live'])
  })

  test('[F8] every pass ever issued is in the state, oldest first', () => {
    const [first, second, third] = [pass(), pass({ quarantined: 'wrong-role' }), pass({ answers: [shown] })]
    expect(foldSubject([third, first, shown, second], CAR_KEY, context()).passes.map(({ hash }) => hash)).toEqual([
      first.hash,
      second.hash,
      third.hash,
    ])
  })

  test('[F7] what the state asks a new pass to answer is enough to live', () => {
    const leave = dispensation('brakes.pads', null, { basis: [] })
    const records = [
      shown,
      fail,
      repair,
      hold(),
      entryChanged({ what: 'plate', plateTail: 'XYZ' }),
      unknownKind('stops'),
      leave,
      presented({ depth: 'full' }),
    ]
    const { toAnswer } = foldSubject(records, CAR_KEY, context())
    expect(fate(pass({ answers: toAnswer }), records.slice(1))).toEqual(['live'])
  })

  test('[F7] a pass under a dispensation carries its conditions', () => {
    const leave = dispensation('seat.mounts', null, { basis: [fail] })
    const state = foldSubject([shown, fail, leave, pass({ answers: [shown, fail, leave] })], CAR_KEY, context())
    expect(state.passes[0]?.conditions).toEqual(['group C only'])
  })
})

test('[F14] a failed fit is not even read for the band or the pass', () => {
  const seated = presented({ subject: PERSON })
  const failed = finding('reach.headroom', 'fail', { subject: FIT })
  const banded = band({ answers: [seated] })
  const state = foldSubject([seated, failed, banded], PERSON_KEY, context())
  expect(state.passes.map((one) => one.state)).toEqual(['live'])
  expect(state.fails).toEqual([])
})

test('[T1] a device’s own unsent record counts as an accepted one would, until the server says otherwise', () => {
  const unsent = finding('seat.mounts', 'ok', { provisional: true, actor: CREW.ben })
  const standing = (...records: readonly LogEntry[]) =>
    foldSubject([shown, ...records], CAR_KEY, context()).checks.get('seat.mounts')?.standing
  expect(standing(unsent)).toBe('ok')
  const refused: LogEntry = { ...unsent, disposition: { state: 'quarantined', code: 'wrong-role' } }
  expect(standing(refused, unsent)).toBe('not-seen')
  expect(standing(unsent, refused)).toBe('not-seen')
})
