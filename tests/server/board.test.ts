import { describe, expect, test } from 'vitest'
import * as tables from '@/db/schema'
import { seeBoard } from '@/lib/board/queries/see-board'
import { board, type Board } from '@/lib/contracts/board'
import type { AccountActor } from '@/lib/platform/actor'
import { newId } from '@/lib/platform/ids'
import { isRefusal } from '@/lib/platform/refusal'
import { describeSticker } from '@/lib/public-pass/queries/describe-sticker'
import { dayReading } from '@/lib/sync/server/day-reading'
import { NAME_REF, seatDrafts } from '@/lib/desk/seat-drafts'
import { aSyncPaddock, CHECKLIST_HASH, LIMITS_HASH, PIN, type SyncPaddock } from '../support/sync-paddock'
import { finds, one, presents, seesAll } from '../support/sync-walk'

const DAY_MS = 86_400_000

function anOrganiserOf(clubId: string): AccountActor {
  return { kind: 'account', accountId: newId(), clubId, name: 'Dorian Marsh', clubRoles: ['organiser'], signInHash: '' }
}

function ask(paddock: SyncPaddock, actor?: AccountActor) {
  const own = paddock.database().select().from(tables.event).get()
  const deps = { database: paddock.database(), now: paddock.time.now } as never
  return seeBoard(dayReading)({ params: { event: paddock.event }, query: {}, body: {} }, actor ?? anOrganiserOf(own?.clubId ?? ''), deps)
}

async function boardOf(paddock: SyncPaddock): Promise<Board> {
  const answer = await ask(paddock)
  if (isRefusal(answer)) throw new Error(`the board was refused: ${answer.code}`)
  return board.response.parse(answer)
}

/** A bay that has passed the first car and told the server. */
async function aPassedCar() {
  const paddock = await aSyncPaddock()
  const bay = await paddock.phone(['scrutineer'], ['chief'])
  await bay.day.loadDay()
  const car = paddock.cars[0] as string
  await presents(bay.day, car)
  await seesAll(bay.day, car)
  const issued = await bay.day.issuePass({ entry: car, passengerSeatUsable: true })
  await bay.day.drain()
  return { paddock, bay, car, issued }
}

describe('the board on the server', () => {
  test('before anybody looks, every entry stands there by number with its plate and driver', async () => {
    const shown = await boardOf(await aSyncPaddock())

    expect(shown).toMatchObject({ seq: 0, day: '2026-05-09', groups: [{ name: 'A', entries: 2, passed: 0 }] })
    expect(shown.rows.map(({ number, plate, drivers, verdict }) => [number, plate, drivers, verdict])).toEqual([
      ['47', 'OT11 KLM', ['Driver 1'], 'not presented'],
      ['48', 'OT12 KLM', ['Driver 2'], 'not presented'],
    ])
  })

  test('[P8] each group says how many of its people are banded, whoever was seated at the desk among them; one who fails since is not', async () => {
    const paddock = await aSyncPaddock()
    const desk = await paddock.phone(['sign-on'])
    await desk.day.loadDay()
    const [car, driver] = [paddock.cars[0] as string, paddock.drivers[0] as string]
    const lio = { person: newId(), role: 'passenger', minor: false, isNew: true, cars: [car] } as const
    await desk.day.record(seatDrafts(lio), [{ ref: NAME_REF, text: 'Lio Brandt' }])
    const pins = { checklist: CHECKLIST_HASH, limits: LIMITS_HASH, declaration: null, facts: {}, depth: 'standard' } as const
    await one(desk.day, { kind: 'presented', subject: { person: driver }, ...pins })
    const label = { kind: 'finding', subject: { person: driver }, check: 'helmet.label' } as const
    await one(desk.day, { ...label, outcome: 'ok' })
    await desk.day.issueBand({ person: driver, bandNumber: '112' })
    await desk.day.drain()

    expect(await boardOf(paddock)).toMatchObject({ groups: [{ people: 3, banded: 1 }] })
    await one(desk.day, { ...label, outcome: 'fail' })
    await desk.day.drain()
    expect(await boardOf(paddock)).toMatchObject({ groups: [{ people: 3, banded: 0 }] })
  })

  test('it tells no address and no telephone of anybody', async () => {
    expect(JSON.stringify(await boardOf(await aSyncPaddock()))).not.toContain('canary')
  })

  test('another club’s event is missing, as one that never was', async () => {
    const answer = await ask(await aSyncPaddock(), anOrganiserOf(newId()))

    expect(isRefusal(answer) && answer.code).toBe('missing')
  })

  test('[F7] a passed car counts; a hold after it stops it and says what to see again', async () => {
    const { paddock, bay, car } = await aPassedCar()
    expect(await boardOf(paddock)).toMatchObject({ groups: [{ passed: 1 }], rows: [{ verdict: 'passed', open: 0, needs: [] }, {}] })

    await one(bay.day, { kind: 'hold', subject: { car }, reason: 'contact', stations: ['body'], checks: [], stickerRemoved: true })
    await bay.day.drain()

    const held = await boardOf(paddock)
    expect(held).toMatchObject({ groups: [{ passed: 0 }], rows: [{ verdict: 'held' }, {}] })
    expect(held.rows[0]?.needs).toEqual([{ kind: 'held', words: expect.stringMatching(/^Held: light contact; see again/) as string }])
  })

  test('[F9] at midnight what perishes is not seen, without any record or restart', async () => {
    const { paddock } = await aPassedCar()
    await boardOf(paddock)

    await paddock.time.pass(DAY_MS)

    expect(await boardOf(paddock)).toMatchObject({ day: '2026-05-10', groups: [{ passed: 0 }], rows: [{ verdict: 'in progress' }, {}] })
  })
})

describe('what a sticker says to anybody', () => {
  const read = (paddock: SyncPaddock, text: string) => describeSticker(paddock.database(), text, dayReading, paddock.time.now)

  test('a live pass is valid today, with number and plate end and nobody’s name', async () => {
    const { paddock, issued } = await aPassedCar()
    const sticker = await read(paddock, issued.token)

    expect(sticker).toMatchObject({ is: 'valid', number: '47', plateTail: '11KLM', firstDay: '2026-05-09', lastDay: '2026-05-09' })
    expect(JSON.stringify(sticker)).not.toMatch(/Driver|Crew/)
    expect(await read(paddock, issued.token.toLowerCase())).toEqual(sticker)
  })

  test('tomorrow it is for another day; held it is not valid, on any day', async () => {
    const { paddock, bay, car, issued } = await aPassedCar()
    await paddock.time.pass(DAY_MS)
    expect((await read(paddock, issued.token)).is).toBe('another-day')

    await bay.day.unlock(bay.people[0] as string, PIN)
    await one(bay.day, { kind: 'hold', subject: { car }, reason: 'contact', stations: ['body'], checks: [], stickerRemoved: true })
    await bay.day.drain()

    expect((await read(paddock, issued.token)).is).toBe('not-valid')
  })

  test('[F7] a fail that comes after the pass ends it here too', async () => {
    const { paddock, bay, car, issued } = await aPassedCar()
    await finds(bay.day, car, 'brakes.pads', 'fail')
    await bay.day.drain()

    expect((await read(paddock, issued.token)).is).toBe('not-valid')
  })

  test('one whose record has not come yet is never called valid', async () => {
    const paddock = await aSyncPaddock()
    const bay = await paddock.phone()
    await bay.day.loadDay()
    const car = paddock.cars[0] as string
    await presents(bay.day, car)
    await seesAll(bay.day, car)
    const issued = await bay.day.issuePass({ entry: car, passengerSeatUsable: true })

    expect((await read(paddock, issued.token)).is).toBe('not-reported')
  })

  test.each([
    ['nothing', ''],
    ['somebody else’s link', 'https://elsewhere.example/p/1'],
    ['a path out', '../../etc/passwd'],
    ['letters of the right length', 'A'.repeat(133)],
    ['null bytes', '\0'.repeat(20)],
    ['a megabyte', 'A'.repeat(1_000_000)],
  ])('%s is not one of ours, and no fault', async (_, text) => {
    expect(await read(await aSyncPaddock(), text)).toEqual({ is: 'not-ours' })
  })

  test('one sign changed anywhere is not one of ours', async () => {
    const { paddock, issued } = await aPassedCar()
    for (const at of [0, 5, 20, 40, 90, 131]) {
      const other = issued.token[at] === 'B' ? 'C' : 'B'
      const changed = issued.token.slice(0, at) + other + issued.token.slice(at + 1)
      expect((await read(paddock, changed)).is, `sign ${at}`).toBe('not-ours')
    }
  })
})
