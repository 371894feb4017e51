import { describe, expect, test } from 'vitest'
import { foldSubject } from '@/lib/inspection/fold-subject'
import type { Book } from '@/lib/checklist/book'
import type { LogEntry } from '@/lib/inspection/log-entry'
import {
  CAR,
  CAR_KEY,
  CREW,
  EVENT,
  adopted,
  allOk,
  context,
  dispensation,
  entryChanged,
  finding,
  hold,
  lifted,
  presented,
  unknownKind,
} from '../support/paddock'
import { paddockBook } from '../support/paddock-book'

function verdict(records: readonly LogEntry[], declared = false) {
  return foldSubject(records, CAR_KEY, context({ declared: new Set(declared ? [CAR_KEY] : []) })).verdict
}

describe('[F6] the verdict', () => {
  const shown = presented()
  const seen = [shown, ...allOk()]
  const gone = entryChanged({ what: 'withdrawn' })

  test('[F6] withdrawn comes before held, held before not passed, not passed before all that is unfinished', () => {
    const [stop, fail] = [hold(), finding('seat.mounts', 'fail')]
    expect(verdict([shown, fail])).toBe('not passed')
    expect(verdict([shown, fail, stop])).toBe('held')
    expect(verdict([shown, fail, stop, gone])).toBe('withdrawn')
  })

  test('[F6] a return ends only the withdrawal it names', () => {
    expect(verdict([...seen, gone, entryChanged({ what: 'returned' })])).toBe('withdrawn')
    expect(verdict([...seen, gone, entryChanged({ what: 'returned' }, { basis: [gone] })])).toBe('passed')
    expect(verdict([...seen, gone, entryChanged({ what: 'returned' }, { basis: [gone], quarantined: 'wrong-role' })])).toBe('withdrawn')
  })

  test('[F6] declared only while nobody has looked, then in progress', () => {
    expect(verdict([], true)).toBe('declared only')
    expect(verdict([shown], true)).toBe('declared only')
    expect(verdict([shown, finding('seat.mounts', 'ok')], true)).toBe('in progress')
  })

  test('[F6] findings without a presented are in progress', () => {
    expect(verdict(allOk())).toBe('in progress')
  })

  test('[F6] carried forward alone is never passed', () => {
    const carried = allOk({ carriedFrom: 'c'.repeat(64) })
    expect(verdict([shown, ...carried], true)).toBe('declared only')
    expect(verdict([shown, ...carried])).toBe('in progress')
    // The same where the list has nothing that perishes, so that everything it asks is carried.
    const book = paddockBook() as Book
    const openBook = () => ({ ...book, checks: book.checks.filter((check) => check.standing) })
    expect(foldSubject([shown, ...carried], CAR_KEY, context({ openBook }))).toMatchObject({ open: [], verdict: 'in progress' })
  })

  test('[F6] an advisory that another head outranks or equals still shows in the verdict', () => {
    expect(verdict([...seen, finding('body.mirror', 'advisory')])).toBe('passed with advisories')
    expect(verdict([...seen, finding('seat.mounts', 'advisory', { actor: CREW.ben })])).toBe('passed with advisories')
  })

  test('[F6] an optional check that could not be seen is a reservation, a fail of one is not passed', () => {
    expect(verdict([...seen, finding('body.mirror', 'could-not-see')])).toBe('passed with advisories')
    expect(verdict([...seen, finding('body.mirror', 'fail')])).toBe('not passed')
  })

  test('[F6] a dispensation passes with advisories', () => {
    const fail = finding('body.mirror', 'fail')
    expect(verdict([...seen, fail, dispensation('body.mirror', null, { basis: [fail] })])).toBe('passed with advisories')
  })
})

describe('[T1] quarantine takes permission, never a stop', () => {
  const shown = presented()

  test.each(['fail', 'could-not-see', 'unseen'] as const)('[T1] a quarantined %s still stops', (outcome) => {
    const doubted = finding('seat.mounts', outcome, { quarantined: 'wrong-role' })
    expect(verdict([shown, ...allOk(), doubted])).not.toMatch(/^passed/)
  })

  test('[T1] it ends as any other does', () => {
    const doubted = finding('seat.mounts', 'fail', { quarantined: 'wrong-role' })
    expect(verdict([shown, ...allOk({ except: ['seat.mounts'] }), doubted, finding('seat.mounts', 'ok', { basis: [doubted] })])).toBe(
      'passed',
    )
  })

  test('[T1] a quarantined fail ends no other fail', () => {
    const fail = finding('seat.mounts', 'fail')
    const doubted = finding('seat.mounts', 'fail', { basis: [fail], quarantined: 'wrong-role' })
    const mended = finding('seat.mounts', 'ok', { basis: [doubted] })
    expect(verdict([shown, ...allOk({ except: ['seat.mounts'] }), fail, doubted, mended])).toBe('not passed')
  })

  test('[T1] a quarantined hold holds, a quarantined presented is none', () => {
    expect(verdict([shown, ...allOk(), hold({ quarantined: 'wrong-role' })])).toBe('held')
    expect(verdict([presented({ quarantined: 'wrong-role' }), ...allOk()])).toBe('in progress')
  })

  test('[T1] the chief’s adoption gives it back, and is itself subject to trust', () => {
    const doubted = finding('seat.mounts', 'ok', { quarantined: 'device-lost' })
    const rest = [shown, ...allOk({ except: ['seat.mounts'] }), doubted]
    expect(verdict([...rest, adopted(doubted)])).toBe('passed')
    expect(verdict([...rest, adopted(doubted, { quarantined: 'wrong-role' })])).toBe('in progress')
    expect(verdict([...rest, adopted(doubted, { subject: { event: EVENT } })])).toBe('in progress')
  })

  test('[T1] a key nobody vouches for stops nothing and permits nothing, adopted or not', () => {
    const fail = finding('seat.mounts', 'fail', { quarantined: 'unknown-enrolment' })
    expect(verdict([shown, ...allOk(), fail, adopted(fail)])).toBe('passed')
    const ok = finding('seat.mounts', 'ok', { quarantined: 'unknown-enrolment' })
    expect(verdict([shown, ...allOk({ except: ['seat.mounts'] }), ok, adopted(ok)])).toBe('in progress')
  })
})

describe('[T3] kinds this build does not know', () => {
  const seen = [presented(), ...allOk()]

  test('[T3] stops holds, permits and none do nothing', () => {
    expect(verdict([...seen, unknownKind('stops')])).toBe('held')
    expect(verdict([...seen, unknownKind('permits'), unknownKind('none')])).toBe('passed')
  })

  test('[T3] a known kind in a version that is not known holds by its effect too', () => {
    const newer = hold()
    const record = { ...newer.record, v: 2 } as unknown as LogEntry['record']
    expect(verdict([...seen, { ...newer, record }])).toBe('held')
  })

  test('[T3] only the chief ends it, by naming it', () => {
    const stop = unknownKind('stops')
    expect(verdict([...seen, stop, lifted([stop])])).toBe('passed')
  })

  test('[T3] upon the whole event it holds every car', () => {
    const stop = unknownKind('stops', { subject: { event: EVENT } })
    expect(verdict([...seen, stop])).toBe('held')
    expect(verdict([...seen, stop, lifted([stop], { subject: CAR })])).toBe('passed')
  })
})
