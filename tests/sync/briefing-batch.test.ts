import { expect, test } from 'vitest'
import { civilDate } from '@/lib/rules/civil-date'
import { briefingDrafts, briefingOf, type AtBriefing } from '@/lib/walk/briefing'
import { DESK_HASH, layOutDesk } from '../support/desk-list'
import { aSyncPaddock, LIMITS_HASH, type Phone } from '../support/sync-paddock'
import { one } from '../support/sync-walk'

const PINS = { checklist: DESK_HASH, limits: LIMITS_HASH, depth: 'standard' } as const
const SAID = { pins: PINS, on: civilDate('2026-05-10'), note: 'note:briefing' }
const NOTES = [{ ref: 'briefing', text: 'At the 08:15 briefing' }]

async function aDesk(cars: number) {
  const paddock = await aSyncPaddock({ cars })
  layOutDesk(paddock)
  const desk = await paddock.phone(['sign-on'])
  await desk.day.loadDay()
  return { paddock, desk }
}

function at({ day }: Phone, person: string): AtBriefing {
  const book = day.book()
  if (book === null) throw new Error('the day is not loaded')
  return { person, minor: false, state: day.state(`person:${person}`), book }
}

test('[M1 S1] a batch larger than a push takes is saved whole, sent in deviceSeq order and stored once', async () => {
  const { paddock, desk } = await aDesk(120)
  const drafts = briefingDrafts(
    paddock.drivers.map((driver) => at(desk, driver)),
    SAID,
  )
  await desk.day.record(drafts, NOTES)
  expect(desk.day.status().unsent).toBe(240)
  await desk.day.drain()
  expect(desk.network.requests.filter(({ what }) => what === 'push').map(({ records }) => records)).toEqual([200, 40])
  expect(paddock.rows().map(({ deviceSeq }) => deviceSeq)).toEqual(Array.from({ length: 240 }, (_, index) => index + 1))
  expect(paddock.rows().every(({ disposition }) => disposition === 'accepted')).toBe(true)
})

test('[M1] a batch saved while nobody is unlocked is refused whole: nothing of anybody is kept', async () => {
  const { paddock, desk } = await aDesk(3)
  const drafts = briefingDrafts(
    paddock.drivers.map((driver) => at(desk, driver)),
    SAID,
  )
  await desk.day.lock()
  await expect(desk.day.record(drafts, NOTES)).rejects.toMatchObject({ problem: { code: 'locked' } })
  expect(paddock.drivers.map((driver) => desk.day.log(`person:${driver}`).length)).toEqual([0, 0, 0])
})

test('who has been ticked, or failed at it, is left out; who was begun with is not presented again', async () => {
  const { paddock, desk } = await aDesk(3)
  const [ticked, failed, begun] = paddock.drivers as [string, string, string]
  const present = (person: string) =>
    one(desk.day, { kind: 'presented', subject: { person }, checklist: DESK_HASH, limits: LIMITS_HASH, declaration: null, facts: { minor: false }, depth: 'standard' }) // prettier-ignore
  await desk.day.record(briefingDrafts([at(desk, ticked)], SAID), NOTES)
  await present(failed)
  await one(desk.day, { kind: 'finding', subject: { person: failed }, check: 'papers.briefing', outcome: 'fail', reason: 'none' })
  await present(begun)

  expect([ticked, failed, begun].map((person) => briefingOf(at(desk, person)))).toEqual(['was there', 'look at it', 'open'])
  const drafts = briefingDrafts([ticked, failed, begun].map((person) => at(desk, person)), SAID) // prettier-ignore
  expect(drafts).toEqual([
    { kind: 'finding', subject: { person: begun }, check: 'papers.briefing', outcome: 'ok', notes: ['note:briefing'] },
  ])
})
