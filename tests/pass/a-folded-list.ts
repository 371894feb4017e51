import { foldSubject } from '@/lib/inspection/fold-subject'
import type { LogEntry } from '@/lib/inspection/log-entry'
import type { FoldContext } from '@/lib/inspection/state'
import { subjectKey, type SubjectKey } from '@/lib/inspection/subject'
import { buildPassList, type EntryForList } from '@/lib/pass/build-pass-list'
import type { PassList } from '@/lib/pass/pass-list'
import type { PassPayload } from '@/lib/pass/pass-payload'
import { CAR, CREW, PERSON, band, context, pass, type Said } from '../support/paddock'
import { paddockBook } from '../support/paddock-book'
import { fakeId } from '../support/paddock-hash'
import { aList, aToken, NOW } from './a-pit-exit'

/** The second person of the car, beside `PERSON`. */
export const CO_DRIVER = { person: fakeId('a co-driver') } as const

/** Car 47 as the event's rows have it, with two drivers. */
export function aCar(given: Partial<EntryForList> = {}): EntryForList {
  return {
    id: CAR.car,
    code: 5,
    number: '47',
    plate: 'GF90 VGN',
    plateTail: '90VGN',
    colour: 'red',
    model: 'Corvane S2',
    group: 'group-a',
    groupName: 'A',
    withdrawn: false,
    facts: { cage: false, slicks: false },
    people: [
      { person: PERSON.person, role: 'driver' },
      { person: CO_DRIVER.person, role: 'driver' },
    ],
    ...given,
  }
}

/** The list that the server makes of these records, as far as they are of car 47, its people and the event. */
export function foldedList(records: readonly LogEntry[], given: { car?: Partial<EntryForList>; on?: Partial<FoldContext> } = {}): PassList {
  const car = aCar(given.car)
  const folded = context(given.on)
  const keys: SubjectKey[] = [
    subjectKey(CAR),
    ...car.people.flatMap(({ person }) => [subjectKey({ person }), subjectKey({ fit: car.id, person })]),
  ]
  const touched = keys.filter((key) => records.some(({ record }) => subjectKey(record.subject) === key))
  const { keys: signers, seq, version, eventCode } = aList()
  return buildPassList({
    seq,
    version,
    at: NOW,
    eventCode,
    day: folded.day,
    keys: signers,
    entries: [car],
    states: new Map(touched.map((key) => [key, foldSubject(records, key, folded)])),
    names: new Map([
      [PERSON.person, 'Ana Brand'],
      [CO_DRIVER.person, 'Ben Oduya'],
    ]),
    book: paddockBook(),
  })
}

/** A pass record that carries a real token. */
export function signedPass(said: Said, payload: Partial<PassPayload> = {}): LogEntry {
  return withToken(pass(said), aToken(payload))
}

/** A band record that carries a real token. */
export function signedBand(number: string, said: Said): LogEntry {
  const made = withToken(
    band({ actor: CREW.desk, ...said }),
    aToken({ type: 'band', counter: 500 + Number(number), entry: 0, number, plateTail: '' }),
  )
  return { ...made, record: { ...made.record, bandNumber: number } as never }
}

function withToken(entry: LogEntry, token: string): LogEntry {
  return { ...entry, record: { ...entry.record, token } as never }
}
