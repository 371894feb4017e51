import { expect, test } from 'vitest'
import { byFirstGroup, deskPeople, type DeskEntry } from '@/lib/desk/desk-people'
import { searchPeople } from '@/lib/desk/search-people'
import { seatDrafts } from '@/lib/desk/seat-drafts'

const anEntry = (number: string, given: Partial<DeskEntry> = {}): DeskEntry => ({
  id: `e${number}`,
  number,
  plate: `OT${number} KLM`,
  model: 'Tarn 2',
  group: 'b',
  groupName: 'B',
  withdrawn: false,
  facts: {},
  people: [],
  ...given,
})
const drives = (person: string) => ({ person, role: 'driver' as const })
const PEOPLE = [
  { id: 'ana', name: 'Ana Brand', minor: false },
  { id: 'lio', name: 'Lio Brandt', minor: true },
  { id: 'zoe', name: 'Zoë Quarrel', minor: false },
  { id: 'crew', name: 'Tobin Ashe', minor: false },
]
const ENTRIES = [
  anEntry('47', { people: [drives('ana'), drives('zoe')] }),
  anEntry('112', { people: [drives('ana')], group: 'a', groupName: 'A' }),
  anEntry('9', { people: [drives('lio')], withdrawn: true }),
  anEntry('147', { people: [drives('lio')] }),
]
const people = deskPeople(PEOPLE, ENTRIES)
const numbers = (id: string) => people.find((one) => one.id === id)?.seats.map(({ entry }) => entry.number)

test('one person with two cars is one line with both, a shared car gives two lines, and who sits in no car gives none', () => {
  expect(people.map(({ id }) => id)).toEqual(['ana', 'lio', 'zoe'])
  expect(numbers('ana')).toEqual(['47', '112'])
})

test('a withdrawn car is no car to sign on for', () => {
  expect(numbers('lio')).toEqual(['147'])
})

test('somebody with cars in two groups is looked for once, in the group that runs first', () => {
  const lists = byFirstGroup(people, [
    { id: 'a', order: 1 },
    { id: 'b', order: 2 },
  ])
  expect(lists.get('a')?.map(({ id }) => id)).toEqual(['ana'])
  expect(lists.get('b')?.map(({ id }) => id)).toEqual(['lio', 'zoe'])
})

test.each([
  ['47', ['ana', 'zoe', 'lio']],
  ['OT47 KLM', ['ana', 'zoe']],
  ['ot47klm', ['ana', 'zoe']],
  ['bra', ['ana', 'lio']],
  ['lio br', ['lio']],
  ['zoe', ['zoe']],
  ['1', ['ana', 'lio']],
  ['rand', ['ana', 'lio']],
  ['  ', []],
  ['nobody', []],
])('typing “%s” finds %j', (query, found) => {
  expect(searchPeople(people, query).map(({ id }) => id)).toEqual(found)
})

test('[F13] only who rides as a passenger is named as one, and each car gets a record of its own', () => {
  const who = { person: 'p', minor: false, isNew: true, cars: ['e1', 'e2'] }
  expect(seatDrafts({ ...who, role: 'passenger' }).map(({ change }) => change)).toMatchObject([
    { passengers: ['p'] },
    { passengers: ['p'] },
  ])
  const taught = seatDrafts({ ...who, role: 'instructor', isNew: false })
  expect(taught.map(({ subject }) => subject)).toEqual([{ car: 'e1' }, { car: 'e2' }])
  expect(taught.map(({ change, notes }) => [change, notes])).toMatchObject([
    [{ passengers: [] }, undefined],
    [{ passengers: [] }, undefined],
  ])
})
