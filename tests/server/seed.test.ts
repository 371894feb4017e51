import { afterEach, beforeEach, expect, test } from 'vitest'
import { account, crewMember, entry, event, runGroup } from '@/db/schema'
import { MARRAM, MARRAM_ACCOUNTS } from '@/db/scenarios/marram'
import { seedMarram } from '@/db/scenarios/seed-marram'
import { seedMarramEntrant } from '@/db/scenarios/seed-marram-entrant'
import { seedMarramEntries } from '@/db/scenarios/seed-marram-entries'
import { isRightPassword } from '@/lib/platform/password'
import { freshDatabase } from '../support/fresh-database'

// Half an hour past midnight at the venue, still yesterday in UTC.
const NOW = Date.parse('2026-05-08T23:30:00Z')
let fresh: ReturnType<typeof freshDatabase>
beforeEach(() => {
  fresh = freshDatabase()
})
afterEach(() => fresh.close())

async function seed(now = NOW) {
  const seeded = await seedMarram(fresh.database, now)
  seedMarramEntries(fresh.database, seeded, now)
  seedMarramEntrant(fresh.database, seeded, now)
  return seeded
}

function everything() {
  const tables = fresh.database.$client
    .prepare<[], { name: string }>("SELECT name FROM sqlite_master WHERE type = 'table' ORDER BY name")
    .all()
  return tables.map(({ name }) => [name, fresh.database.$client.prepare(`SELECT * FROM "${name}"`).all()])
}

test('the demo event begins today at the venue and holds the 142 entries of the list', async () => {
  const { eventId } = await seed()
  const [row] = fresh.database.select().from(event).all()
  expect(row).toMatchObject({
    id: eventId,
    venue: 'Ottermere Ring',
    firstDay: '2026-05-09',
    lastDay: '2026-05-10',
    nextKid: 1,
    nextEntryCode: 143,
  })
  expect(fresh.database.select().from(entry).all()).toHaveLength(142)
  const groups = fresh.database.select().from(runGroup).orderBy(runGroup.order).all()
  expect(groups.map(({ name, firstSessionAt }) => [name, firstSessionAt])).toEqual([
    ['Novice', Date.parse('2026-05-09T08:00:00Z')],
    ['Intermediate', Date.parse('2026-05-09T08:20:00Z')],
    ['Advanced', Date.parse('2026-05-09T08:40:00Z')],
  ])
})

test('there is a sign-in for each role, and the crew is accepted', async () => {
  await seed()
  const accounts = fresh.database.select().from(account).all()
  expect(accounts.map(({ email }) => email).sort()).toEqual(MARRAM_ACCOUNTS.map(({ role }) => `${role}@marram.example`).sort())
  expect(await isRightPassword(accounts[0]?.passwordHash ?? null, MARRAM.password)).toBe(true)
  const crew = fresh.database.select().from(crewMember).all()
  expect(crew.map(({ role, state }) => `${role} ${state}`).sort()).toEqual(
    ['chief', 'helper', 'marshal', 'scrutineer', 'sign-on'].map((role) => `${role} accepted`),
  )
})

test('seeded twice, nothing changes', async () => {
  await seed()
  const before = everything()
  await seed(NOW + 3_600_000)
  expect(everything()).toEqual(before)
})

test('another day is another event with another code, for the same people', async () => {
  await seed()
  await seed(NOW + 7 * 86_400_000)
  expect(
    fresh.database
      .select()
      .from(event)
      .all()
      .map(({ code }) => code),
  ).toEqual([1, 2])
  expect(fresh.database.select().from(account).all()).toHaveLength(MARRAM_ACCOUNTS.length)
})
