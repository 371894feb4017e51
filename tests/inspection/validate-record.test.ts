import { describe, expect, test } from 'vitest'
import type { LogEntry } from '@/lib/inspection/log-entry'
import { parseRecord } from '@/lib/inspection/validate-record'
import {
  adopted,
  band,
  comment,
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
  voided,
  PERSON,
} from '../support/paddock'

const fail = finding('brakes.pads', 'fail')

function changed(entry: LogEntry, change: object): unknown {
  return { ...entry.record, ...change }
}

function seated(role: 'passenger' | 'instructor', passengers: string[], added: string[] = [PERSON.person]): LogEntry {
  return entryChanged({ what: 'people', added, removed: [], passengers, seated: { person: PERSON.person, role, minor: null } })
}

describe('parseRecord', () => {
  test.each([
    presented(),
    fail,
    finding('brakes.pads', 'ok', { found: { outcome: 'fail', reason: 'worn' }, basis: [fail] }),
    ruling('brakes.pads', 'ok', { basis: [fail] }),
    dispensation('brakes.pads', null, { basis: [fail] }),
    pass(),
    band(),
    voided(pass()),
    hold({ stations: ['brakes'] }),
    lifted([hold()]),
    recall({ when: 'wet' }),
    day({ what: 'wet', on: true }),
    entryChanged({ what: 'withdrawn' }),
    entryChanged({ what: 'people', added: [], removed: [], passengers: [PERSON.person] }),
    { record: changed(seated('passenger', [PERSON.person]), { notes: ['a'.repeat(64)] }) as LogEntry['record'] },
    seated('instructor', []),
    adopted(fail),
    comment(),
  ])('a $record.kind is read as it was made', ({ record }) => {
    expect(parseRecord(JSON.parse(JSON.stringify(record)))).toEqual({ ok: true, record })
  })

  test('[T3] of an unknown kind the envelope and effect are kept', () => {
    const { record } = unknownKind('stops')
    expect(parseRecord({ ...record, cargo: { deep: [1] } })).toMatchObject({
      ok: true,
      record: { kind: 'tow-request', effect: 'stops', subject: record.subject },
    })
  })

  test('[T3] a known kind in another version is read by its effect, not refused', () => {
    expect(parseRecord(changed(hold(), { v: 2, stations: 'a new shape' }))).toMatchObject({
      ok: true,
      record: { v: 2, kind: 'hold', effect: 'stops' },
    })
  })

  test.each([
    ['a fail that permits', changed(fail, { effect: 'permits' }), 'effect: a finding of fail says stops, not permits'],
    ['an ok that stops', changed(finding('brakes.pads', 'ok'), { effect: 'stops' }), 'effect: a finding of ok says permits, not stops'],
    [
      'a ruling against its outcome',
      changed(ruling('a.b', 'ok', {}), { effect: 'stops' }),
      'effect: a ruling of ok says permits, not stops',
    ],
    [
      'a withdrawal that permits',
      changed(entryChanged({ what: 'withdrawn' }), { effect: 'permits' }),
      'effect: a withdrawal says stops, not permits',
    ],
    ['a return that stops', changed(entryChanged({ what: 'returned' }), { effect: 'stops' }), 'effect: a return says permits, not stops'],
    [
      'a new number that permits',
      changed(entryChanged({ what: 'number', number: '7' }), { effect: 'permits' }),
      'effect: a change of number cannot say permits',
    ],
    [
      'a passenger who is not counted as one',
      seated('passenger', []).record,
      'change.passengers: contradicts the role of who is seated, passenger',
    ],
    [
      'an instructor counted as a passenger',
      seated('instructor', [PERSON.person]).record,
      'change.passengers: contradicts the role of who is seated, instructor',
    ],
    ['a seat of another than who was added', seated('instructor', [], []).record, 'change.seated: is not the one who was added'],
    [
      'a note on a change that names nobody',
      changed(entryChanged({ what: 'withdrawn' }), { notes: ['a'.repeat(64)] }),
      'notes: a change names at most the one who is seated',
    ],
    ['a dispensation of nothing', dispensation('a.b', null, {}).record, 'basis: a dispensation names the fail it accepts'],
    ['an unseen of nothing', finding('a.b', 'unseen').record, 'basis: an unseen names the finding it takes back'],
    [
      'a fail put right',
      finding('a.b', 'fail', { found: { outcome: 'fail', reason: null } }).record,
      'found: what is put right here ends ok or advisory, not fail',
    ],
    ['a day that is none', changed(fail, { day: '2026-02-30' }), 'day: 2026-02-30 is not a date'],
    ['a basis twice', changed(fail, { basis: [fail.hash, fail.hash] }), 'basis: names the same record twice'],
  ])('%s contradicts itself and is refused', (_, payload, problem) => {
    expect(parseRecord(payload)).toEqual({ ok: false, problem })
  })

  test.each([
    ['nothing', undefined],
    ['null', null],
    ['text', 'hold'],
    ['a list', [hold().record]],
    ['a hold that permits', changed(hold(), { effect: 'permits' })],
    ['a field too many', changed(fail, { isAdmin: true })],
    ['a field too few', { ...fail.record, actor: undefined }],
    ['deviceSeq 0', changed(fail, { deviceSeq: 0 })],
    ['an id that is no UUIDv7', changed(fail, { id: '00000000-0000-4000-8000-000000000000' })],
    ['a hash in upper case', changed(fail, { basis: ['A'.repeat(64)] })],
    ['a pass upon a person', changed(pass(), { subject: PERSON })],
    ['two subjects in one', changed(fail, { subject: { car: '0'.repeat(36), person: '0'.repeat(36) } })],
    ['a kind named after an object’s own', changed(fail, { kind: '__proto__' })],
    ['a kind inherited by every object', { kind: 'constructor', v: 1 }],
    ['an unknown kind without effect', { ...unknownKind('stops').record, effect: 'maybe' }],
  ])('%s is refused with a reason and no exception', (_, payload) => {
    const parsed = parseRecord(payload)
    expect(parsed.ok).toBe(false)
    expect(parsed.ok ? '' : parsed.problem).not.toBe('')
  })
})
