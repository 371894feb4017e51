import { describe, expect, test } from 'vitest'
import { boardOf, type EntryFacts, type EventFacts } from '@/lib/board/board-of'
import type { DayReading } from '@/lib/board/day-reading'
import { foldSubject } from '@/lib/inspection/fold-subject'
import type { LogEntry } from '@/lib/inspection/log-entry'
import { subjectKey } from '@/lib/inspection/subject'
import { allOk, CAR, context, CREW, finding, hold, pass, PERSON, presented, SATURDAY, voided } from '../support/paddock'
import { PADDOCK_CHECKLIST, PADDOCK_LIMITS, paddockBook } from '../support/paddock-book'

const AT = 1_778_312_000_000

function anEntry(given: Partial<EntryFacts> = {}): EntryFacts {
  return {
    id: CAR.car,
    number: '47',
    plate: 'AB12 KLM',
    plateTail: '12KLM',
    model: 'Halden 1.6 hatch',
    colour: 'red',
    group: 'a',
    withdrawn: false,
    people: [{ id: PERSON.person, name: 'Lena Penhale', isDriver: true }],
    ...given,
  }
}

/** The board of these entries by a log read on the Saturday. */
function board(log: readonly LogEntry[], entries: readonly EntryFacts[] = [anEntry()], now: DayReading['entryNow'] = () => null) {
  const event: EventFacts = {
    timeZone: 'Europe/London',
    checklistHash: PADDOCK_CHECKLIST,
    limitsHash: PADDOCK_LIMITS,
    groups: [
      { id: 'a', name: 'Novice' },
      { id: 'b', name: 'Advanced' },
    ],
    timetable: [
      { day: SATURDAY, kind: 'session', group: 'b', startsAt: AT + 3_600_000, endsAt: AT + 4_800_000 },
      { day: SATURDAY, kind: 'session', group: 'b', startsAt: AT, endsAt: AT + 1_200_000 },
      { day: '2026-05-10', kind: 'session', group: 'a', startsAt: AT + 86_400_000, endsAt: AT + 87_600_000 },
    ],
    entries,
  }
  const reading: DayReading = {
    seq: log.length,
    day: SATURDAY,
    stateOf: (key) => foldSubject(log, key, context()),
    setAsideOf: (key) => log.filter(({ record, disposition }) => subjectKey(record.subject) === key && disposition.state === 'quarantined'),
    entryNow: now,
    bookOf: paddockBook,
  }
  return boardOf(event, reading, AT)
}

const row = (log: readonly LogEntry[], entry: Partial<EntryFacts> = {}) => {
  const [first] = board(log, [anEntry(entry)]).rows
  if (!first) throw new Error('the board has no row')
  return first
}
const kinds = (log: readonly LogEntry[]) => row(log).needs.map(({ kind }) => kind)

describe('a row of the board', () => {
  test('an entry that nobody has seen is not presented, its wire empty, and needs nobody', () => {
    expect(row([])).toMatchObject({ verdict: 'not presented', open: null, needs: [], drivers: ['Lena Penhale'] })
    expect(new Set(row([]).wire)).toEqual(new Set(['none']))
  })

  test('[F6] with everything seen it is passed; without a pass it says so', () => {
    const seen = [presented(), ...allOk()]

    expect(row(seen)).toMatchObject({ verdict: 'passed', open: 0, needs: [{ kind: 'no-pass', words: 'Passed, but no pass issued' }] })
  })

  test('a live pass is nothing to look at', () => {
    const seen = [presented(), ...allOk()]

    expect(kinds([...seen, pass({ answers: seen })])).toEqual([])
  })

  test('[F7] two live passes of one entry ask for one to be voided; the void alone ends it', () => {
    const seen = [presented(), ...allOk()]
    const two = [pass({ answers: seen }), pass({ answers: seen })] as const

    expect(kinds([...seen, ...two])).toEqual(['two-passes'])
    expect(kinds([...seen, ...two, voided(two[1])])).toEqual([])
  })

  test('a pass that was killed, with the car passed again, asks for a new one', () => {
    const seen = [presented(), ...allOk()]
    const dead = pass({ answers: seen })

    expect(kinds([...seen, dead, voided(dead)])).toEqual(['pass-dead'])
  })

  test('a fail names its check; a hold comes before it', () => {
    const log = [presented(), ...allOk({ except: ['brakes.pads'] }), finding('brakes.pads', 'fail')]

    expect(row(log)).toMatchObject({ verdict: 'not passed', needs: [{ kind: 'not-passed', words: 'Not passed: brakes.pads' }] })
    expect(row([...log, hold({ stations: ['body'] })])).toMatchObject({ verdict: 'held' })
    expect(row([...log, hold({ stations: ['body'] })]).needs.map(({ words }) => words)).toEqual([
      'Held: light contact; see again body',
      'Not passed: brakes.pads',
    ])
  })

  test('two who looked and differ, and what could not be seen, ask for a person', () => {
    const apart = [
      presented(),
      ...allOk({ except: ['brakes.pads', 'seat.mounts'] }),
      finding('brakes.pads', 'ok'),
      finding('brakes.pads', 'advisory', { actor: CREW.ben }),
      finding('seat.mounts', 'could-not-see'),
    ]

    expect(kinds(apart)).toEqual(['disagreement', 'could-not-see'])
  })

  test('[T1] a record set aside asks for a person until somebody else has looked', () => {
    const aside = [presented(), ...allOk({ except: ['brakes.pads'] }), finding('brakes.pads', 'ok', { quarantined: 'device-lost' })]

    expect(row(aside).needs).toEqual([{ kind: 'set-aside', words: 'A record was set aside, its device was reported lost: brakes.pads' }])
    expect(kinds([...aside, finding('brakes.pads', 'ok', { actor: CREW.ben })])).toEqual(['no-pass'])
  })

  test('[T1] a quarantined fail still stops and says so', () => {
    const log = [presented(), ...allOk(), finding('brakes.pads', 'fail', { quarantined: 'wrong-role', actor: CREW.ben })]

    expect(kinds(log)).toEqual(['not-passed', 'disagreement', 'set-aside'])
  })

  test('a person who is not passed is named beside the car, which is not touched', () => {
    const log = [presented(), ...allOk(), finding('helmet.label', 'fail', { subject: PERSON })]

    expect(row(log).verdict).toBe('passed')
    expect(row(log).needs.at(-1)).toEqual({ kind: 'person', words: 'Lena Penhale is not passed' })
  })

  test('a withdrawn entry needs nobody', () => {
    const log = [presented(), finding('brakes.pads', 'fail')]

    expect(row(log, { withdrawn: true })).toMatchObject({ verdict: 'withdrawn', needs: [] })
  })

  test('number, plate end and group are those that the records left', () => {
    const changed = board([], [anEntry()], () => ({ number: '74', plateTail: 'XYZ', group: 'b' })).rows[0]

    expect(changed).toMatchObject({ number: '74', plate: '…XYZ', group: 'b' })
  })
})

describe('the groups of the board', () => {
  test('count who passes of those that are not withdrawn, and stand in running order by number', () => {
    const log = [presented(), ...allOk()]
    const entries = [
      anEntry({ id: 'c', number: '9', group: 'b' }),
      anEntry({ id: 'd', number: '103' }),
      anEntry(),
      anEntry({ id: 'e', number: '5', withdrawn: true }),
    ]
    const { groups, rows } = board(log, entries)

    expect(rows.map(({ number }) => number)).toEqual(['5', '47', '103', '9'])
    expect(groups.map(({ name, entries: all, passed }) => [name, all, passed])).toEqual([
      ['Novice', 2, 1],
      ['Advanced', 1, 0],
    ])
  })
})
