import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import * as tables from '@/db/schema'
import type { BayOrderView, BayPlanBody } from '@/lib/contracts/bay-order'
import { bayOrderView } from '@/lib/contracts/bay-order'
import { planOrder } from '@/lib/order/commands/plan-order'
import { readOrder, type ReadDoubts, seeOrder } from '@/lib/order/queries/see-order'
import type { AccountActor } from '@/lib/platform/actor'
import { newId } from '@/lib/platform/ids'
import { isRefusal, type Refusal } from '@/lib/platform/refusal'
import { aSyncPaddock, type SyncPaddock } from '../support/sync-paddock'

const DAY = '2026-05-09'
const at = (hours: number, minutes = 0) => Date.UTC(2026, 4, 9, hours, minutes)
const PLAN: BayPlanBody = { day: DAY, opensAt: '07:30', lanes: 2, windowMin: 15, carMin: 5, carSdMin: 2, publish: false }
const noDoubts: ReadDoubts = () => new Map()

function ownEvent(paddock: SyncPaddock) {
  const row = paddock.database().select().from(tables.event).get()
  if (!row) throw new Error('the paddock has no event')
  return row
}

function organiser(paddock: SyncPaddock, clubId = ownEvent(paddock).clubId): AccountActor {
  return { kind: 'account', accountId: newId(), clubId, name: 'Dorian Marsh', clubRoles: ['organiser'], signInHash: '' }
}

async function plan(paddock: SyncPaddock, given: Partial<BayPlanBody> = {}, actor = organiser(paddock), doubts = noDoubts) {
  const deps = { database: paddock.database(), now: paddock.time.now } as never
  return planOrder(doubts)({ params: { event: paddock.event }, query: {}, body: { ...PLAN, ...given } }, actor, deps)
}

function order(answer: BayOrderView | Refusal): BayOrderView {
  if (isRefusal(answer)) throw new Error(`refused: ${answer.code}`)
  return bayOrderView.parse(answer)
}

async function aPaddock() {
  const paddock = await aSyncPaddock({ cars: 3 })
  const group = paddock.database().select().from(tables.runGroup).get()
  const own = { clubId: ownEvent(paddock).clubId, eventId: paddock.event, day: DAY }
  const block = (given: Partial<typeof tables.timetableBlock.$inferInsert>) => {
    const row = {
      ...own,
      id: newId(),
      kind: 'session',
      groupId: group?.id ?? null,
      session: 1,
      startsAt: at(9),
      endsAt: at(9, 20),
    } as const
    paddock
      .database()
      .insert(tables.timetableBlock)
      .values({ ...row, ...given })
      .run()
  }
  block({})
  block({ kind: 'briefing', groupId: null, session: null, startsAt: at(7, 30), endsAt: at(7, 45) })
  return paddock
}

test('before anybody plans, the bay opens an hour and a half before the first session, and nothing is written', async () => {
  const paddock = await aPaddock()
  const seen = readOrder(noDoubts, paddock.database(), ownEvent(paddock), DAY, paddock.time.now)
  expect(seen).toMatchObject({ isPlanned: false, plan: { opensAt: '07:30', carMin: 5 }, publishedAt: null, toldOtherwise: 3 })
  expect(seen?.windows[0]).toMatchObject({ from: at(7, 45), to: at(8) })
  expect(paddock.database().select().from(tables.bayPlan).all()).toEqual([])
})

test('a plan is kept and told only when told: the windows then stand for each car, and devices learn of it', async () => {
  const paddock = await aPaddock()
  const before = ownEvent(paddock).snapshotVersion
  expect(order(await plan(paddock, { lanes: 3 }))).toMatchObject({ isPlanned: true, plan: { lanes: 3 }, publishedAt: null })
  expect(paddock.database().select().from(tables.callUp).all()).toEqual([])

  const told = order(await plan(paddock, { publish: true }))
  expect(told).toMatchObject({ toldOtherwise: 0, publishedAt: paddock.time.now })
  expect(paddock.database().select().from(tables.callUp).all()).toHaveLength(3)
  expect(ownEvent(paddock).snapshotVersion).toBe(before + 1)
})

test('a later plan does not move a told window by itself, and says how many it would move', async () => {
  const paddock = await aPaddock()
  await plan(paddock, { publish: true })
  const later = order(await plan(paddock, { opensAt: '08:00' }))
  expect(later.toldOtherwise).toBe(3)
  const rows = paddock.database().select().from(tables.callUp).all()
  expect(rows.every(({ startsAt }) => startsAt === at(7, 45))).toBe(true)
})

test('a withdrawn car is not called, a doubtful one first', async () => {
  const paddock = await aPaddock()
  const [first, second, third] = paddock.cars as [string, string, string]
  paddock.database().update(tables.entry).set({ withdrawn: true }).where(eq(tables.entry.id, second)).run()
  const made = order(await plan(paddock, {}, organiser(paddock), () => new Map([[third, 'would not be passed']])))
  expect(made.windows.flatMap(({ cars }) => cars.map(({ entry }) => entry))).toEqual([third, first])
})

test('a day the event does not have and another club’s event are missing alike', async () => {
  const paddock = await aPaddock()
  const deps = { database: paddock.database(), now: paddock.time.now } as never
  expect(await plan(paddock, { day: '2026-05-12' })).toMatchObject({ code: 'missing' })
  expect(await plan(paddock, {}, organiser(paddock, newId()))).toMatchObject({ code: 'missing' })
  const asked = { params: { event: paddock.event }, query: {}, body: {} }
  expect(await seeOrder(noDoubts)(asked, organiser(paddock, newId()), deps)).toMatchObject({ code: 'missing' })
  expect(await seeOrder(noDoubts)({ ...asked, query: { day: '2026-06-01' } }, organiser(paddock), deps)).toMatchObject({ code: 'missing' })
})
