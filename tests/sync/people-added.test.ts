import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import * as tables from '@/db/schema'
import { NAME_REF, seatDrafts, type TurnedUp } from '@/lib/desk/seat-drafts'
import { newId } from '@/lib/platform/ids'
import { layOutDesk } from '../support/desk-list'
import { aSyncPaddock, type Phone } from '../support/sync-paddock'
import { one, seesAll } from '../support/sync-walk'

async function aDesk() {
  const paddock = await aSyncPaddock({ cars: 3 })
  layOutDesk(paddock)
  const desk = await paddock.phone(['sign-on'])
  const bay = await paddock.phone(['scrutineer'])
  await desk.day.loadDay()
  await bay.day.loadDay()
  return { paddock, desk, bay, car: paddock.cars[0] as string }
}

async function turnsUp(phone: Phone, cars: readonly string[], given: Partial<TurnedUp> & { readonly name?: string } = {}) {
  const { name = 'Lio Brandt', ...more } = given
  const who: TurnedUp = { person: newId(), role: 'passenger', minor: false, isNew: true, cars, ...more }
  await phone.day.record(seatDrafts(who), who.isNew ? [{ ref: NAME_REF, text: name }] : [])
  return who.person
}

const aboard = (phone: Phone, car: string) => phone.day.entry(car)?.people.map(({ person, role }) => `${person} ${role}`) ?? []
const nameOf = (phone: Phone, person: string) => phone.day.snapshot()?.people.find(({ id }) => id === person)?.name
const listed = (phone: Phone, car: string) => phone.day.passList()?.entries.find(({ entry }) => entry === car)?.people ?? []

test('a passenger added before anything was sent is on this device at once, by name, in the car and on the pass list, without a band', async () => {
  const { desk, car } = await aDesk()
  const person = await turnsUp(desk, [car])
  expect(aboard(desk, car)).toContain(`${person} passenger`)
  expect(nameOf(desk, person)).toBe('Lio Brandt')
  expect(listed(desk, car).at(-1)).toMatchObject({ person, name: 'Lio Brandt', role: 'passenger', band: 'none', bandNumber: null })
})

test('after a pull every other device knows them, and the server has their rows; the name stands in no record', async () => {
  const { paddock, desk, bay, car } = await aDesk()
  const person = await turnsUp(desk, [car])
  await desk.day.drain()
  await bay.day.pull()
  expect(aboard(bay, car)).toEqual([expect.stringContaining(' driver'), `${person} passenger`])
  expect(nameOf(bay, person)).toBe('Lio Brandt')
  expect(listed(bay, car).at(-1)).toMatchObject({ person, name: 'Lio Brandt' })
  const row = paddock.database().select().from(tables.person).where(eq(tables.person.id, person)).get()
  expect(row).toMatchObject({ name: 'Lio Brandt', minor: false, eventId: paddock.event, email: null })
  const seats = paddock.database().select().from(tables.entryPerson).where(eq(tables.entryPerson.personId, person)).all()
  expect(seats).toMatchObject([{ entryId: car, role: 'passenger' }])
  const payloads = paddock.rows().map(({ jws }) => Buffer.from(jws.split('.')[1] ?? '', 'base64url').toString())
  expect(payloads.join('')).not.toContain('Brandt')
})

test('an instructor in three cars is one person in three cars, and one band lets them into each', async () => {
  const { paddock, desk, car } = await aDesk()
  const person = await turnsUp(desk, paddock.cars, { role: 'instructor', name: 'Ede Korn' })
  await desk.day.drain()
  const rows = paddock.database().select().from(tables.person).where(eq(tables.person.name, 'Ede Korn')).all()
  expect(rows).toHaveLength(1)
  await signsOn(desk, person, '204')
  for (const one of paddock.cars) expect(listed(desk, one).at(-1)).toMatchObject({ person, band: 'live', bandNumber: '204' })
  // A fourth car later on: known already, so nothing is named anew.
  await turnsUp(desk, [car], { person, role: 'instructor', minor: null, isNew: false })
  expect(aboard(desk, car).filter((seat) => seat.startsWith(person))).toHaveLength(1)
})

test('a passenger who is added makes the recall before a passenger due, and the pass of the car dies with it', async () => {
  const { desk, bay, car } = await aDesk()
  await presentsTo(bay, { car }, { cage: false, slicks: false })
  await seesAll(bay.day, car)
  await bay.day.issuePass({ entry: car, passengerSeatUsable: true })
  await one(bay.day, { kind: 'recall', subject: { car }, stations: [], checks: ['seat.mounts'], trigger: { when: 'passenger' } })
  expect(bay.day.state(`car:${car}`).blocks).toEqual([])
  await bay.day.drain()
  await turnsUp(desk, [car])
  await desk.day.drain()
  await bay.day.pull()
  expect(bay.day.state(`car:${car}`).blocks).toMatchObject([{ kind: 'recall', reason: 'passenger' }])
  expect(bay.day.state(`car:${car}`).passes).toMatchObject([{ state: 'dead' }])
})

test('[T1] a scrutineer seats nobody: it is refused on the device, and an addition the server sets aside gives nobody a row', async () => {
  const { paddock, desk, bay, car } = await aDesk()
  await expect(turnsUp(bay, [car])).rejects.toMatchObject({ problem: { code: 'not-allowed' } })
  // The role ends before the desk has sent it: what it added is set aside.
  const person = await turnsUp(desk, [car])
  paddock.change((database) => {
    database
      .update(tables.crewMember)
      .set({ state: 'ended' })
      .where(eq(tables.crewMember.personId, desk.people[0] as string))
      .run()
    database.delete(tables.devicePerson).where(eq(tables.devicePerson.deviceId, desk.deviceId)).run()
  })
  await desk.day.drain()
  await bay.day.pull()
  expect(paddock.database().select().from(tables.person).where(eq(tables.person.id, person)).all()).toEqual([])
  expect(aboard(bay, car).some((seat) => seat.startsWith(person))).toBe(false)
})

test('a band for somebody whose indemnity nobody saw is refused with words, and so is a minor’s without a consent', async () => {
  const { desk, car } = await aDesk()
  const person = await turnsUp(desk, [car], { minor: true })
  await presentsPerson(desk, person, { minor: true })
  await expect(desk.day.issueBand({ person, bandNumber: '7' })).rejects.toMatchObject({ problem: { code: 'not-passed' } })
  for (const check of ['helmet.label', 'papers.licence', 'papers.indemnity', 'papers.briefing']) await seesOf(desk, person, check)
  expect(desk.day.state(`person:${person}`).open).toEqual(['papers.consent'])
  await expect(desk.day.issueBand({ person, bandNumber: '7' })).rejects.toMatchObject({ problem: { code: 'not-passed' } })
  await seesOf(desk, person, 'papers.consent')
  await desk.day.issueBand({ person, bandNumber: '7' })
  expect(listed(desk, car).at(-1)).toMatchObject({ band: 'live', bandNumber: '7' })
})

test('a band number that somebody else was given today is refused with their name, also once that band is dead; one’s own may be given again', async () => {
  const { paddock, desk } = await aDesk()
  const [first, second] = paddock.drivers as [string, string]
  await signsOn(desk, first, '112')
  await presentsPerson(desk, second, { minor: false })
  for (const check of PAPERS) await seesOf(desk, second, check)
  await expect(desk.day.issueBand({ person: second, bandNumber: '112' })).rejects.toMatchObject({
    problem: { code: 'band-taken', what: 'Band 112 was given to Driver 1 today.' },
  })
  await says(desk, first, 'helmet.label', 'fail')
  await expect(desk.day.issueBand({ person: second, bandNumber: '112' })).rejects.toMatchObject({ problem: { code: 'band-taken' } })
  await seesOf(desk, first, 'helmet.label')
  await desk.day.issueBand({ person: first, bandNumber: '112' })
})

test('somebody of another event is not drawn into this one, and what was typed as a name keeps no sign that turns a line around', async () => {
  const { paddock, desk, car } = await aDesk()
  const stranger = newId()
  paddock.change((database) => {
    const own = database.select().from(tables.event).where(eq(tables.event.id, paddock.event)).get()
    if (own === undefined) throw new Error('the event is gone')
    const other = { ...own, id: newId(), code: 8 }
    database.insert(tables.event).values(other).run()
    database.insert(tables.person).values({ id: stranger, clubId: own.clubId, eventId: other.id, name: 'Canary' }).run()
  })
  await turnsUp(desk, [car], { person: stranger, isNew: false, minor: null })
  const person = await turnsUp(desk, [car], { name: ' Ana\u202e\u0007  Brand ' })
  await desk.day.drain()
  const seated = paddock.database().select().from(tables.entryPerson).where(eq(tables.entryPerson.entryId, car)).all()
  expect(seated.map(({ personId }) => personId).sort()).toEqual([paddock.drivers[0], person].sort())
  expect(paddock.database().select().from(tables.person).where(eq(tables.person.id, person)).get()?.name).toBe('Ana Brand')
})

const PAPERS = ['helmet.label', 'papers.licence', 'papers.indemnity', 'papers.briefing']

const presentsPerson = (phone: Phone, person: string, facts: Record<string, boolean>) => presentsTo(phone, { person }, facts)

function presentsTo({ day }: Phone, subject: { readonly car: string } | { readonly person: string }, facts: Record<string, boolean>) {
  const event = day.snapshot()?.event
  const pins = { checklist: event?.checklistHash ?? '', limits: event?.limitsHash ?? '', declaration: null }
  return one(day, { kind: 'presented', subject, ...pins, facts, depth: 'standard' })
}

function says({ day }: Phone, person: string, check: string, outcome: 'ok' | 'fail') {
  return one(day, { kind: 'finding', subject: { person }, check, outcome })
}

const seesOf = (phone: Phone, person: string, check: string) => says(phone, person, check, 'ok')

async function signsOn(phone: Phone, person: string, bandNumber: string): Promise<void> {
  await presentsPerson(phone, person, { minor: false })
  for (const check of PAPERS) await seesOf(phone, person, check)
  await phone.day.issueBand({ person, bandNumber })
}
