import { eq } from 'drizzle-orm'
import { readFileSync } from 'node:fs'
import { afterEach, beforeEach, describe, expect, test } from 'vitest'
import * as tables from '@/db/schema'
import type { InputOf } from '@/lib/contracts/contract'
import { entryImport } from '@/lib/contracts/entry-import'
import { importEntryList } from '@/lib/entries/commands/import-entry-list'
import type { AccountActor } from '@/lib/platform/actor'
import { isRefusal } from '@/lib/platform/refusal'
import { aClub } from '../support/a-club'
import { aLine, aList } from '../support/a-list'
import { freshDatabase } from '../support/fresh-database'

type Body = InputOf<typeof entryImport>['body']
const NOTHING_SAID: Body['choices'] = { encoding: null, headingRow: null, columns: null, corrections: [], leftOut: [] }

let fresh: ReturnType<typeof freshDatabase>
let eventId: string
let actor: AccountActor

beforeEach(async () => {
  fresh = freshDatabase()
  const club = await aClub(fresh.database)
  const accountId = club.addAccount('organiser', 'organiser@marram.example')
  eventId = club.addEvent()
  actor = { kind: 'account', accountId, clubId: club.clubId, name: 'The organiser', clubRoles: ['organiser'], signInHash: '' }
  for (const [order, name] of ['Novice', 'Intermediate', 'Advanced'].entries())
    fresh.database
      .insert(tables.runGroup)
      .values({ id: crypto.randomUUID(), clubId: club.clubId, eventId, name, order, firstSessionAt: null })
      .run()
})
afterEach(() => fresh.close())

function send(bytes: Uint8Array, said: Partial<Body> = {}) {
  const base64 = Buffer.from(bytes).toString('base64')
  const body = { fileName: 'list.csv', base64, choices: NOTHING_SAID, answers: [], dryRun: true, planHash: '', ...said }
  return importEntryList({ params: { event: eventId }, query: {}, body }, actor, { database: fresh.database, now: 1 })
}

function looks(bytes: Uint8Array, said: Partial<Body> = {}) {
  const answer = send(bytes, said)
  if (isRefusal(answer)) throw new Error(answer.code)
  return answer
}

function imports(bytes: Uint8Array, said: Partial<Body> = {}) {
  return send(bytes, { ...said, dryRun: false, planHash: looks(bytes, said).planHash })
}

const code = (answer: ReturnType<typeof send>) => (isRefusal(answer) ? answer.code : 'done')
const count = (table: Parameters<typeof fresh.database.$count>[0]) => fresh.database.$count(table)

describe('all rows or none', () => {
  test('a dry run writes nothing, a list with a problem or an open question neither', async () => {
    const good = aList(aLine())
    looks(good)
    expect(code(imports(aList(aLine(), aLine({ number: '' }))))).toBe('import-refused')
    expect(code(imports(aList(aLine(), aLine({ number: '8', email: 'bo@example.org' }))))).toBe('import-refused')
    expect([await count(tables.entry), await count(tables.entryImport), await count(tables.person)]).toEqual([0, 0, 0])
  })

  test('a row that the database refuses leaves none of the others', async () => {
    fresh.database.$client.exec("CREATE TRIGGER full BEFORE INSERT ON entry_person BEGIN SELECT RAISE(ABORT, 'no room'); END")
    expect(() => imports(aList(aLine(), aLine({ number: '8', plate: 'BB22' })))).toThrow('no room')
    expect([await count(tables.entry), await count(tables.car), await count(tables.person)]).toEqual([0, 0, 0])
  })

  test('sent twice it is done once, and told what the first one did', async () => {
    const bytes = aList(aLine(), aLine({ number: '8', plate: 'BB22' }))
    const { planHash } = looks(bytes)
    expect(send(bytes, { dryRun: false, planHash })).toMatchObject({ committed: true, added: 2 })
    expect(send(bytes, { dryRun: false, planHash })).toMatchObject({ committed: true, added: 2 })
    expect([await count(tables.entry), await count(tables.entryImport)]).toEqual([2, 1])
    expect(looks(bytes)).toMatchObject({ added: 0, changed: 0, unchanged: 2 })
  })

  test('what changed between dry run and import, in the event or in the answers, refuses it', () => {
    const bytes = aList(aLine())
    const { planHash } = looks(bytes)
    expect(code(send(bytes, { dryRun: false, planHash, answers: [{ id: 'row:9', value: 'shared', text: '' }] }))).toBe('import-stale')
    imports(aList(aLine({ number: '9', plate: 'ZZ9' })))
    expect(code(send(bytes, { dryRun: false, planHash }))).toBe('import-stale')
  })

  test('an event of another club is missing', () => {
    actor = { ...actor, clubId: crypto.randomUUID() }
    expect(code(send(aList(aLine())))).toBe('missing')
  })
})

describe('who sits where', () => {
  const driversOf = (number: string) =>
    fresh.database
      .select({ name: tables.person.name, id: tables.person.id })
      .from(tables.entryPerson)
      .innerJoin(tables.person, eq(tables.person.id, tables.entryPerson.personId))
      .innerJoin(tables.entry, eq(tables.entry.id, tables.entryPerson.entryId))
      .where(eq(tables.entry.number, number))
      .orderBy(tables.person.id)
      .all()

  test('a shared car is one entry with two drivers, and stays so when the list comes again', () => {
    const bytes = aList(aLine(), aLine({ number: '8', firstName: 'Bo', surname: 'Lind', email: 'bo@example.org' }))
    const answers = [{ id: 'row:3', value: 'shared', text: '' }]
    imports(bytes, { answers })
    expect(driversOf('7').map(({ name }) => name)).toEqual(['Ada Norcott', 'Bo Lind'])
    expect(looks(bytes)).toMatchObject({ added: 0, changed: 0, unchanged: 1, openQuestions: 0 })
  })

  test('one driver with two cars is one person, in one list or in two', () => {
    imports(aList(aLine(), aLine({ number: '8', plate: 'BB22' })))
    imports(aList(aLine({ number: '9', plate: 'CC33' })))
    const ids = ['7', '8', '9'].map((number) => driversOf(number)[0]?.id)
    expect(new Set(ids).size).toBe(1)
  })

  test('numbers may change places in one list', () => {
    imports(aList(aLine(), aLine({ number: '8', plate: 'BB22' })))
    const swapped = aList(aLine({ number: '8' }), aLine({ number: '9', plate: 'BB22' }))
    const asked = looks(swapped)
    expect(asked.openQuestions).toBeGreaterThan(0)
    const moved = aList(aLine({ number: '70' }), aLine({ number: '80', plate: 'BB22' }))
    const answers = ['entry:2', 'entry:3'].map((id) => ({ id, value: 'renumber', text: '' }))
    expect(imports(moved, { answers })).toMatchObject({ committed: true, changed: 2 })
    expect(fresh.database.select({ number: tables.entry.number, version: tables.entry.version }).from(tables.entry).all()).toEqual([
      { number: '70', version: 2 },
      { number: '80', version: 2 },
    ])
  })

  test('another driver takes the place of the one before', () => {
    imports(aList(aLine()))
    imports(aList(aLine({ firstName: 'Olof', email: 'olof@example.org' })))
    expect(driversOf('7').map(({ name }) => name)).toEqual(['Olof Norcott'])
  })
})

test('the messy list goes in whole once it is answered, in the bytes it came in', async () => {
  const bytes = new Uint8Array(readFileSync('tests/fixtures/entries-messy.csv'))
  const corrections: Body['choices']['corrections'] = [
    { row: 7, column: 'email', value: '' },
    { row: 21, column: 'passengerSeats', value: '1' },
    { row: 22, column: 'passengerSeats', value: '0' },
    { row: 29, column: 'model', value: 'Tarn 2' },
    { row: 30, column: 'note', value: 'long story' },
  ]
  const said = {
    choices: { ...NOTHING_SAID, corrections, leftOut: [20] },
    answers: [
      { id: 'group:inter', value: 'is:Intermediate', text: '' },
      { id: 'group:adv.', value: 'is:Advanced', text: '' },
      { id: 'group:beginners', value: 'is:Novice', text: '' },
      { id: 'row:10', value: 'two-cars', text: '61' },
      { id: 'row:26', value: 'shared', text: '' },
      { id: 'row:100', value: 'leave-out', text: '' },
    ],
  }
  expect(imports(bytes, said)).toMatchObject({ committed: true, added: 94, people: 95, newGroups: [] })
  expect([await count(tables.entry), await count(tables.person)]).toEqual([94, 95])
  const numbers = fresh.database.select({ number: tables.entry.number }).from(tables.entry).all()
  expect(numbers.map(({ number }) => number)).toEqual(expect.arrayContaining(['007', '7A', '61']))
  expect(looks(bytes, said)).toMatchObject({ added: 0, changed: 0, unchanged: 94, openQuestions: 0, problemCount: 0 })
})

test('ten thousand rows are planned and written in one request, well under its limit', async () => {
  const lines = Array.from({ length: 10_000 }, (_, index) =>
    aLine({ number: String(index + 1), plate: `AB${index} CDE`, email: `a${index}@example.org`, surname: `Norcott${index}` }),
  )
  const bytes = aList(...lines)
  expect(Buffer.from(bytes).toString('base64').length).toBeLessThan(entryImport.limitBytes / 4)
  expect(imports(bytes)).toMatchObject({ committed: true, added: 10_000 })
  expect(await count(tables.entryPerson)).toBe(10_000)
  expect(looks(bytes)).toMatchObject({ unchanged: 10_000, added: 0 })
}, 60_000)
