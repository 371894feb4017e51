import { eq } from 'drizzle-orm'
import { describe, expect, test } from 'vitest'
import * as tables from '@/db/schema'
import type { EntryEdit } from '@/lib/contracts/entry-edit'
import { editEntry } from '@/lib/entries/commands/edit-entry'
import { readEntry } from '@/lib/entries/queries/see-entry'
import type { AccountActor } from '@/lib/platform/actor'
import { newId } from '@/lib/platform/ids'
import { isRefusal } from '@/lib/platform/refusal'
import { appendServerRecords } from '@/lib/sync/server/append-server-records'
import { dayReading } from '@/lib/sync/server/day-reading'
import { aSyncPaddock, type SyncPaddock } from '../support/sync-paddock'
import { presents, seesAll } from '../support/sync-walk'

function anOffice(paddock: SyncPaddock, name: string, roles: readonly ('organiser' | 'admin')[] = ['organiser']): AccountActor {
  const { clubId } = paddock.database().select().from(tables.event).get() ?? { clubId: '' }
  const accountId = newId()
  paddock
    .database()
    .insert(tables.account)
    .values({ id: accountId, clubId, email: `${accountId}@marram.example`, name, passwordHash: 'x', roles, createdAt: 0 })
    .run()
  return { kind: 'account', accountId, clubId, name, clubRoles: roles, signInHash: '' }
}

function reads(paddock: SyncPaddock, car = paddock.cars[0] ?? '') {
  const own = paddock.database().select().from(tables.event).get()
  const view = own && readEntry(dayReading, paddock.database(), own, car, paddock.time.now, true)
  if (!view) throw new Error('no such entry')
  return view
}

const command = editEntry(appendServerRecords, dayReading)

async function saves(paddock: SyncPaddock, actor: AccountActor, view: ReturnType<typeof reads>, change: Partial<EntryEdit>) {
  const deps = {
    database: paddock.database(),
    now: paddock.time.now,
    origin: '',
    userAgent: '',
    cookie: '',
    replyHeaders: new Headers(),
    signal: new AbortController().signal,
  }
  const body = { version: view.version, edit: { ...view.values, ...change } }
  return command({ params: { event: paddock.event, entry: view.id }, query: {}, body }, actor, deps)
}

async function aPassed() {
  const paddock = await aSyncPaddock()
  const bay = await paddock.phone(['scrutineer'])
  const car = paddock.cars[0] ?? ''
  await bay.day.loadDay()
  await presents(bay.day, car)
  await seesAll(bay.day, car)
  await bay.day.issuePass({ entry: car, passengerSeatUsable: false })
  await bay.day.drain()
  return { paddock, bay, car, dorian: anOffice(paddock, 'Dorian Marsh') }
}

const someone = { person: null, name: 'Bo Lind', email: '', mobile: '' }

describe('before anybody has looked', () => {
  test('an edit changes rows and makes no record; devices get it with the next snapshot', async () => {
    const paddock = await aSyncPaddock()
    const dorian = anOffice(paddock, 'Dorian Marsh')
    const view = reads(paddock)
    const people: EntryEdit['people'] = [...view.values.people, { ...someone, role: 'driver' }]
    expect(await saves(paddock, dorian, view, { number: '99', colour: 'green', people, withdrawn: true })).toEqual({
      version: 2,
      records: 0,
      fields: ['number', 'colour', 'withdrawn', 'people'],
    })
    expect(paddock.rows()).toEqual([])
    expect(reads(paddock).values).toMatchObject({ number: '99', colour: 'green', withdrawn: true, people: [{}, { name: 'Bo Lind' }] })
    const phone = await paddock.phone(['scrutineer'])
    await phone.day.loadDay()
    expect(phone.day.entries()[0]).toMatchObject({ number: '99', colour: 'green', withdrawn: true })
  })

  test('an edit that changes nothing leaves the version as it is', async () => {
    const paddock = await aSyncPaddock()
    expect(await saves(paddock, anOffice(paddock, 'Dorian Marsh'), reads(paddock), {})).toEqual({ version: 1, records: 0, fields: [] })
  })
})

describe('once the entry has a record', () => {
  test.each([
    ['number', { number: '99' }, 'dead'],
    ['plate', { plate: 'ZZ99 ZZZ' }, 'dead'],
    ['car facts', { facts: { cage: true, slicks: false } }, 'dead'],
    ['another car', { model: 'Tarn 3' }, 'dead'],
    ['withdrawal', { withdrawn: true }, 'dead'],
    ['people', { people: [{ ...someone, role: 'driver' as const }] }, 'live'],
    ['note', { note: 'quiet exhaust fitted' }, 'live'],
    ['colour', { colour: 'green' }, 'live'],
  ])('[F7] a change of %s leaves the pass %s', async (field, change, state) => {
    const { paddock, bay, car, dorian } = await aPassed()
    const before = paddock.rows().length
    const saved = await saves(paddock, dorian, reads(paddock), change)
    if (isRefusal(saved)) throw new Error(saved.code)
    expect(saved.records).toBe(['note', 'colour'].includes(field) ? 0 : 1)
    expect(paddock.rows()).toHaveLength(before + saved.records)
    await bay.day.drain()
    expect(bay.day.state(`car:${car}`).passes.map((pass) => pass.state)).toEqual([state])
  })

  test('withdrawn and returned it may be passed again, by a new pass', async () => {
    const { paddock, bay, car, dorian } = await aPassed()
    await saves(paddock, dorian, reads(paddock), { withdrawn: true })
    expect(reads(paddock).values.withdrawn).toBe(true)
    await saves(paddock, dorian, reads(paddock), { withdrawn: false })
    expect(reads(paddock).values.withdrawn).toBe(false)
    await bay.day.drain()
    expect(bay.day.state(`car:${car}`)).toMatchObject({ verdict: 'passed', passes: [{ state: 'dead' }] })
    await bay.day.issuePass({ entry: car, passengerSeatUsable: false })
    expect(bay.day.state(`car:${car}`).passes.at(-1)?.state).toBe('live')
  })

  test('withdrawn before the first record it can be returned after it', async () => {
    const paddock = await aSyncPaddock()
    const dorian = anOffice(paddock, 'Dorian Marsh')
    await saves(paddock, dorian, reads(paddock), { withdrawn: true })
    const bay = await paddock.phone(['scrutineer'])
    await bay.day.loadDay()
    await presents(bay.day, paddock.cars[0] ?? '')
    await bay.day.drain()
    await saves(paddock, dorian, reads(paddock), { withdrawn: false })
    expect(reads(paddock).values.withdrawn).toBe(false)
  })

  test('[F13] a passenger who is put in makes the recall due that waits for one', async () => {
    const { paddock, bay, car, dorian } = await aPassed()
    const chief = await paddock.phone(['chief'])
    await chief.day.loadDay()
    await chief.day.record([{ kind: 'recall', subject: { car }, stations: [], checks: ['seat.mounts'], trigger: { when: 'passenger' } }])
    await chief.day.drain()
    await saves(paddock, dorian, reads(paddock), { people: [...reads(paddock).values.people, { ...someone, role: 'passenger' }] })
    await bay.day.drain()
    expect(bay.day.state(`car:${car}`).verdict).toBe('held')
  })

  test('the history says what the office and the bay did, newest first', async () => {
    const { paddock, dorian } = await aPassed()
    paddock.time.now += 60_000
    await saves(paddock, dorian, reads(paddock), { number: '99', note: 'loud' })
    expect(reads(paddock).history.map(({ words, isRecord }) => [words, isRecord])).toEqual([
      ['Number is now 99', true],
      ['Changed note', false],
      ['Pass issued', true],
      ['Presented, depth standard', true],
    ])
  })
})

describe('two who edit one entry', () => {
  test('the second is told who changed what and when; nothing of theirs is written, the first stands', async () => {
    const { paddock, dorian } = await aPassed()
    const petra = anOffice(paddock, 'Petra Holmwood')
    const [seenByDorian, seenByPetra] = [reads(paddock), reads(paddock)]
    await saves(paddock, dorian, seenByDorian, { number: '99', colour: 'green' })
    const rows = paddock.rows().length
    const late = await saves(paddock, petra, seenByPetra, { number: '88' })
    expect(isRefusal(late) && late.code).toBe('entry-edited-meanwhile')
    expect(isRefusal(late) && late.details).toMatchObject({
      what: 'Dorian Marsh changed number, colour at 07:30, while you were editing.',
      issues: [{ path: 'number' }, { path: 'colour' }],
    })
    expect(paddock.rows()).toHaveLength(rows)
    expect(reads(paddock).values).toMatchObject({ number: '99', colour: 'green' })
    // Having looked, with the entry as it is now, hers goes through.
    expect(await saves(paddock, petra, reads(paddock), { number: '88' })).toMatchObject({ records: 1 })
  })
})

describe('what is refused', () => {
  test.each([
    ['a number that is taken', { number: '48' }, 'edit.number', /taken by the car with plate/],
    ['a group that is not there', { group: newId() }, 'edit.group', /not there/],
    [
      'somebody of another event',
      { people: [{ ...someone, person: newId(), role: 'driver' as const }] },
      'edit.people.0.name',
      /not of this event/,
    ],
    [
      'somebody twice',
      {
        people: [
          { ...someone, role: 'driver' as const },
          { ...someone, role: 'driver' as const },
        ],
      },
      'edit.people.1.name',
      /twice/,
    ],
  ])('%s is named with its field, and nothing is written', async (_, change, path, message) => {
    const { paddock, dorian } = await aPassed()
    const before = paddock.rows().length
    const refused = await saves(paddock, dorian, reads(paddock), change)
    expect(isRefusal(refused) && refused.details.issues).toMatchObject([{ path, message: expect.stringMatching(message) as string }])
    expect(paddock.rows()).toHaveLength(before)
  })

  test('an edit that the database refuses leaves no record either', async () => {
    const { paddock, dorian } = await aPassed()
    const before = paddock.rows().length
    paddock.database().$client.exec("CREATE TRIGGER full BEFORE UPDATE ON entry BEGIN SELECT RAISE(ABORT, 'no room'); END")
    await expect(async () => saves(paddock, dorian, reads(paddock), { number: '99' })).rejects.toThrow('no room')
    expect(paddock.rows()).toHaveLength(before)
    paddock.database().$client.exec('DROP TRIGGER full')
    expect(await saves(paddock, dorian, reads(paddock), { number: '98' })).toMatchObject({ records: 1 })
  })

  test('who may not see contacts keeps them as they are', async () => {
    const paddock = await aSyncPaddock()
    const chief = { ...anOffice(paddock, 'Sella Warrick'), clubRoles: ['chief'] as const }
    const view = reads(paddock)
    const people = view.values.people.map((one) => ({ ...one, email: '', mobile: '' }))
    await saves(paddock, chief, view, { people, note: 'seen' })
    const driver = paddock
      .database()
      .select()
      .from(tables.person)
      .where(eq(tables.person.id, paddock.drivers[0] ?? ''))
      .get()
    expect(driver?.email).toBe('canary-mail@example.org')
  })
})
