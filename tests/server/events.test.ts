import { afterEach, beforeEach, expect, test } from 'vitest'
import * as tables from '@/db/schema'
import type { EventBody, TimetableBlockBody } from '@/lib/contracts/events'
import { createEvent } from '@/lib/events/commands/create-event'
import { saveTimetable } from '@/lib/events/commands/save-timetable'
import { readTimetable } from '@/lib/events/queries/see-timetable'
import type { AccountActor } from '@/lib/platform/actor'
import { newId } from '@/lib/platform/ids'
import { isRefusal } from '@/lib/platform/refusal'
import { aClub } from '../support/a-club'
import { freshDatabase } from '../support/fresh-database'

const NOW = Date.UTC(2026, 10, 2)
const BODY: EventBody = {
  name: 'Marram in May',
  venue: 'Ottermere Ring',
  timeZone: 'Europe/London',
  firstDay: '2027-05-08',
  lastDay: '2027-05-09',
  groups: ['Novice', 'Advanced'],
  defaultDepth: 'standard',
  depthPolicy: 'must-see',
  sampleEvery: 5,
  listStaleMinutes: 30,
}

let fresh: ReturnType<typeof freshDatabase>
let actor: AccountActor
beforeEach(async () => {
  fresh = freshDatabase()
  const club = await aClub(fresh.database)
  actor = { kind: 'account', accountId: newId(), clubId: club.clubId, name: 'Dorian Marsh', clubRoles: ['organiser'], signInHash: '' }
})
afterEach(() => fresh.close())

const deps = () => ({ database: fresh.database, now: NOW }) as never

async function made(given: Partial<EventBody> = {}) {
  const answer = await createEvent({ params: {}, query: {}, body: { ...BODY, ...given } }, actor, deps())
  if (isRefusal(answer)) return answer.details.issues?.map(({ path }) => path) ?? answer.code
  const row = fresh.database
    .select()
    .from(tables.event)
    .all()
    .find(({ id }) => id === answer.event)
  if (!row) throw new Error('the event is not there')
  return row
}

async function anEvent() {
  const row = await made()
  if (typeof row === 'string' || Array.isArray(row)) throw new Error('refused')
  const [novice, advanced] = fresh.database
    .select()
    .from(tables.runGroup)
    .all()
    .map(({ id }) => id) as [string, string]
  return { row, novice, advanced }
}

const session = (group: string, startsAt: string, endsAt: string): TimetableBlockBody => ({
  kind: 'session',
  group,
  startsAt,
  endsAt,
  noiseLimitDb: 98,
})

async function save(event: string, day: string, blocks: TimetableBlockBody[], by = actor) {
  return saveTimetable({ params: { event }, query: {}, body: { day, blocks } }, by, deps())
}

test('an event is made with its groups, the newest checklist and the limits, and says so in the audit', async () => {
  const { row } = await anEvent()
  expect(row).toMatchObject({
    name: 'Marram in May',
    depthPolicy: 'must-see',
    sampleEvery: 5,
    code: 1,
    nextKid: 1,
    kindOfDay: 'closed-circuit',
  })
  const checklist = fresh.database
    .select()
    .from(tables.checklistText)
    .all()
    .find(({ hash }) => hash === row.checklistHash)
  expect(JSON.parse(checklist?.body ?? '{}')).toMatchObject({ id: 'closed-circuit', version: 2 })
  expect(
    fresh.database
      .select()
      .from(tables.runGroup)
      .all()
      .map(({ name, order }) => [name, order]),
  ).toEqual([
    ['Novice', 1],
    ['Advanced', 2],
  ])
  expect(fresh.database.select().from(tables.audit).all()).toMatchObject([{ action: 'event-created' }])
})

test('numbers in pass tokens are never used twice', async () => {
  await made()
  expect(await made({ name: 'Marram in June' })).toMatchObject({ code: 2 })
})

test.each([
  ['a day that is none', { firstDay: '2027-02-30' }, ['firstDay']],
  ['an end before the beginning', { lastDay: '2027-05-07' }, ['lastDay']],
  ['more than a week', { lastDay: '2027-05-20' }, ['lastDay']],
  ['two groups of one name', { groups: ['Novice', 'novice'] }, ['groups']],
] as const)('%s makes no event', async (_, given, fields) => {
  expect(await made(given as Partial<EventBody>)).toEqual(fields)
  expect(fresh.database.select().from(tables.event).all()).toEqual([])
})

test('a day’s timetable replaces what stood there, counts sessions over all days, and tells devices', async () => {
  const { row, novice, advanced } = await anEvent()
  await save(row.id, '2027-05-09', [session(novice, '09:00', '09:20')])
  await save(row.id, '2027-05-08', [
    session(advanced, '09:20', '09:40'),
    session(novice, '09:00', '09:20'),
    session(novice, '10:00', '10:20'),
  ])
  const sessions = fresh.database.select().from(tables.timetableBlock).orderBy(tables.timetableBlock.startsAt).all()
  expect(sessions.map(({ groupId, session: count }) => [groupId === novice ? 'novice' : 'advanced', count])).toEqual([
    ['novice', 1],
    ['advanced', 1],
    ['novice', 2],
    ['novice', 3],
  ])
  const groups = fresh.database.select().from(tables.runGroup).all()
  expect(groups.find(({ id }) => id === novice)?.firstSessionAt).toBe(Date.parse('2027-05-08T08:00:00Z'))
  expect(fresh.database.select().from(tables.event).get()?.snapshotVersion).toBe(3)

  await save(row.id, '2027-05-08', [])
  const own = fresh.database.select().from(tables.event).get()
  if (!own) throw new Error('no event')
  expect(readTimetable(fresh.database, own).byDay).toMatchObject({
    '2027-05-08': [],
    '2027-05-09': [{ startsAt: '09:00', endsAt: '09:20', noiseLimitDb: 98 }],
  })
})

test('a timetable with a fault is not saved at all, and each fault names its line', async () => {
  const { row, novice, advanced } = await anEvent()
  const refused = await save(row.id, '2027-05-08', [session(novice, '09:00', '09:20'), session(advanced, '09:10', '09:05')])
  expect(isRefusal(refused) && refused.details.issues?.map(({ path }) => path)).toEqual(['blocks.1.endsAt'])
  expect(fresh.database.select().from(tables.timetableBlock).all()).toEqual([])
})

test('a day the event does not have is refused, and another club’s event is as one that never was', async () => {
  const { row, novice } = await anEvent()
  expect(await save(row.id, '2027-05-12', [session(novice, '09:00', '09:20')])).toMatchObject({ code: 'invalid' })
  expect(await save(row.id, '2027-05-08', [], { ...actor, clubId: newId() })).toMatchObject({ code: 'missing' })
  expect(await save(newId(), '2027-05-08', [])).toMatchObject({ code: 'missing' })
})
