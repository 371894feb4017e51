import { describe, expect, test } from 'vitest'
import { openBook } from '@/lib/checklist/open-book'
import type { LogEntry } from '@/lib/inspection/log-entry'
import { blocksOf, buildPassList } from '@/lib/pass/build-pass-list'
import { CHIEF_ONLY } from '@/lib/pass/pass-list'
import { typedCode } from '@/lib/pass/typed-code'
import { foldSubject } from '@/lib/inspection/fold-subject'
import {
  CAR_KEY,
  FIT,
  PERSON,
  SUNDAY,
  allOk,
  context,
  day,
  dispensation,
  entryChanged,
  finding,
  hold,
  pass,
  presented,
  recall,
  unknownKind,
} from '../support/paddock'
import { PADDOCK_CHECKLIST, PADDOCK_LIMITS, paddockBook, paddockChecklist } from '../support/paddock-book'
import { aCar, foldedList, signedBand, signedPass } from './a-folded-list'
import { aToken, NOW } from './a-pit-exit'

const only = (records: readonly LogEntry[], on = {}) => foldedList(records, { on }).entries[0]
const oneDriver = { people: [{ ...PERSON, role: 'driver' as const }] }
const person = (records: readonly LogEntry[], on = {}) => foldedList(records, { car: oneDriver, on }).entries[0]?.people[0]

describe('a car on the pass list', () => {
  test('without a record is not presented, with nothing to say against it and no pass', () => {
    expect(only([])).toMatchObject({ number: '47', verdict: 'not presented', blocks: [], passes: [] })
  })

  test('carries each pass with its id, its typed code and how long it is for', () => {
    const shown = presented()
    const listed = only([shown, ...allOk(), signedPass({ answers: [shown] }, { days: 2, passengerSeatUsable: false })])
    expect(listed).toMatchObject({ verdict: 'passed', blocks: [] })
    const code = typedCode(aToken({ days: 2, passengerSeatUsable: false }))
    expect(listed?.passes).toEqual([
      {
        id: '12.3.1',
        typedCode: code,
        state: 'live',
        why: '',
        validFrom: '2026-05-09',
        days: 2,
        conditions: [],
        passengerSeatUsable: false,
      },
    ])
  })

  test('leaves out a record whose token is none, is of another car, or is a band’s', () => {
    const band = signedPass({}, { type: 'band', entry: 0, number: '112', plateTail: '' })
    expect(only([presented(), pass(), signedPass({}, { entry: 6 }), band])?.passes).toEqual([])
  })

  test('says all that killed a pass, each once', () => {
    const shown = presented()
    const dead = [shown, ...allOk(), signedPass({ answers: [shown] }), hold(), hold(), finding('brakes.pads', 'fail')]
    expect(only(dead)?.passes).toMatchObject([{ state: 'dead', why: 'something failed that it did not know of; held since' }])
  })

  test('shows a quarantined pass as such', () => {
    const shown = presented()
    const made = signedPass({ answers: [shown], quarantined: 'wrong-role' })
    expect(only([shown, ...allOk(), made])?.passes).toMatchObject([{ state: 'quarantined' }])
  })

  test('gives a pass the conditions of a dispensation', () => {
    const shown = presented()
    const fail = finding('brakes.pads', 'fail')
    const granted = dispensation('brakes.pads', null, { basis: [fail] })
    const made = signedPass({ answers: [shown, fail, granted] })
    const listed = only([shown, ...allOk({ except: ['brakes.pads'] }), fail, granted, made])
    expect(listed).toMatchObject({ verdict: 'passed with advisories', passes: [{ state: 'live', conditions: ['group C only'] }] })
  })

  test('withdrawn by its row or by a record is blocked as such', () => {
    expect(foldedList([], { car: { withdrawn: true } }).entries[0]).toMatchObject({ verdict: 'withdrawn', blocks: [{ kind: 'withdrawn' }] })
    expect(only([presented(), entryChanged({ what: 'withdrawn' })])).toMatchObject({
      verdict: 'withdrawn',
      blocks: [{ kind: 'withdrawn' }],
    })
  })
})

describe('a block in words', () => {
  test.each<[string, () => readonly LogEntry[], object]>([
    ['a hold by its reason', () => [hold({ stations: ['body'] })], { kind: 'hold', words: 'light contact', seeAgain: ['Body'] }],
    ['a hold of a reason no list has', () => [hold({ reason: 'a-newer-reason', stations: ['wheels'] })], { words: 'a newer reason' }],
    ['a hold by the station of its checks', () => [hold({ checks: ['wheels.nuts'] })], { seeAgain: ['Wheels and tyres'] }],
    ['a hold that names nothing', () => [hold()], { seeAgain: [CHIEF_ONLY] }],
    [
      'a due recall by its trigger',
      () => [recall({ when: 'wet' }, { checks: ['brakes.pads'] }), day({ what: 'wet', on: true })],
      { kind: 'recall', words: 'recall due: it is wet', seeAgain: ['Brakes'] },
    ],
    ['an unknown stop', () => [unknownKind('stops')], { kind: 'unknown', seeAgain: [CHIEF_ONLY] }],
    [
      'a fail with its reason',
      () => [finding('brakes.pads', 'fail', { reason: 'other' })],
      { kind: 'fail', words: 'brakes.pads: anything else' },
    ],
    ['a fail without one', () => [finding('brakes.pads', 'fail')], { kind: 'fail', words: 'brakes.pads failed' }],
  ])('%s', (_, records, expected) => {
    expect(only([presented(), ...records()])?.blocks).toMatchObject([expected])
  })

  test('the newest comes first', () => {
    const blocks = only([
      presented(),
      hold({ at: NOW, reason: 'first' }),
      hold({ at: NOW + 2, reason: 'third' }),
      hold({ at: NOW + 1, reason: 'second' }),
    ])?.blocks
    expect(blocks?.map(({ words }) => words)).toEqual(['third', 'second', 'first'])
  })

  test('without a book there are words all the same', () => {
    const state = foldSubject([presented(), hold({ stations: ['body'] }), finding('brakes.pads', 'fail')], CAR_KEY, context())
    expect(
      blocksOf(state, null)
        .map(({ words }) => words)
        .sort(),
    ).toEqual(['brakes.pads failed', 'contact'])
  })
})

describe('[P8] a person on the pass list', () => {
  const seated = presented({ subject: PERSON })
  const seen = finding('helmet.label', 'ok', { subject: PERSON })
  const banded = signedBand('112', { subject: PERSON, answers: [seated] })
  const sits = [presented({ subject: FIT }), finding('reach.headroom', 'ok', { subject: FIT })]

  test.each<[string, readonly LogEntry[], object]>([
    ['nothing recorded', [], { band: 'none', bandNumber: null, fit: 'open', why: 'no band yet' }],
    ['seen and not banded', [seated, seen], { band: 'none', why: 'no band yet' }],
    ['failed and not banded', [seated, finding('helmet.label', 'fail', { subject: PERSON })], { why: 'no band: helmet.label failed' }],
    [
      'banded, and the fit not seen',
      [seated, seen, banded],
      { band: 'live', bandNumber: '112', fit: 'open', why: 'fit in this car not seen' },
    ],
    ['banded, and the fit seen', [seated, seen, banded, ...sits], { band: 'live', fit: 'passed', why: '' }],
    ['banded, the fit held', [seated, seen, banded, ...sits, hold({ subject: FIT })], { band: 'live', fit: 'open' }],
    ['banded and held since', [seated, seen, banded, hold({ subject: PERSON })], { band: 'dead', why: 'band is dead: light contact' }],
    [
      'banded, and not seen any longer',
      [seated, seen, banded, finding('helmet.label', 'could-not-see', { subject: PERSON, basis: [seen] })],
      { band: 'held', why: 'held: reads in progress' },
    ],
    [
      'banded without the right to',
      [seated, seen, signedBand('9', { subject: PERSON, answers: [seated], quarantined: 'wrong-role' })],
      { band: 'dead' },
    ],
  ])('%s', (_, records, expected) => {
    expect(person(records)).toMatchObject({ name: 'Ana Brand', role: 'driver', ...expected })
  })

  test('a band of Saturday lets nobody go on Sunday', () => {
    expect(person([seated, seen, banded], { day: SUNDAY })).toMatchObject({ band: 'dead', why: 'band is of another day' })
  })

  test('a band record that carries a car’s token bands nobody', () => {
    const wrong = { ...banded, record: { ...banded.record, token: aToken() } as never }
    expect(person([seated, seen, wrong, ...sits])).toMatchObject({ band: 'dead' })
  })

  test('a fit that no check asks for is not asked', () => {
    const checklist = { ...paddockChecklist, checks: paddockChecklist.checks.filter(({ subject }) => subject !== 'fit') }
    const limits = { id: 'track-day', version: 1, title: 'track day', rules: {} }
    const book = openBook(checklist, limits, { checklist: PADDOCK_CHECKLIST, limits: PADDOCK_LIMITS })
    const list = (given: typeof book | null) =>
      buildPassList({
        seq: 1,
        version: 1,
        at: NOW,
        eventCode: 12,
        day: SUNDAY,
        keys: [],
        entries: [aCar()],
        states: new Map(),
        names: new Map(),
        book: given,
      })
    expect(list(book).entries[0]?.people[0]).toMatchObject({ fit: 'not-asked', name: 'somebody without a name' })
    expect(list(paddockBook()).entries[0]?.people[0]).toMatchObject({ fit: 'open' })
    expect(list(null).entries[0]?.people[0]).toMatchObject({ fit: 'open' })
  })
})
