import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest'
import { audit, crewMember, event as eventTable, joinCode } from '@/db/schema'
import type { AnswerOf } from '@/lib/contracts/contract'
import { decideCrew, listCrew, type CrewMemberView } from '@/lib/contracts/crew'
import { join, JOIN_CODE_MINUTES, joinState, makeJoinCode, seeJoinCode } from '@/lib/contracts/join'
import { askToJoin } from '@/lib/crew/commands/ask-to-join'
import { decideOnCrew } from '@/lib/crew/commands/decide-on-crew'
import { giveJoinCode } from '@/lib/crew/commands/give-join-code'
import { describeClaim } from '@/lib/crew/queries/describe-claim'
import { describeJoinCode } from '@/lib/crew/queries/describe-join-code'
import { seeCrew } from '@/lib/crew/queries/see-crew'
import { resetAllowances } from '@/lib/http/rate'
import { handle } from '@/lib/http/server'
import { startSession } from '@/lib/platform/session'
import { sha256 } from '@/lib/platform/sha256'
import { aClub, noSuchId } from '../support/a-club'
import { ask, ORIGIN } from '../support/ask'
import { freshDatabase } from '../support/fresh-database'

const making = handle(makeJoinCode, giveJoinCode)
const seeing = handle(seeJoinCode, describeJoinCode)
const joining = handle(join, askToJoin)
const polling = handle(joinState, describeClaim)
const listing = handle(listCrew, seeCrew)
const deciding = handle(decideCrew, decideOnCrew)

type Coded<T> = T & { readonly code: string }
let fresh: ReturnType<typeof freshDatabase>
let club: Awaited<ReturnType<typeof aClub>>
let event: string
let organiser: string

beforeEach(async () => {
  fresh = freshDatabase()
  resetAllowances()
  vi.useFakeTimers({ now: Date.parse('2026-05-09T06:00:00Z'), toFake: ['Date'] })
  club = await aClub(fresh.database)
  event = club.addEvent()
  organiser = await signedIn(club.addAccount('organiser', 'o@marram.example'))
})
afterEach(() => {
  vi.useRealTimers()
  fresh.close()
})

const signedIn = async (accountId: string) => (await startSession(fresh.database, accountId, '')).split(';')[0] ?? ''
const code = async (role = 'marshal', cookie = organiser, of = event) =>
  ask<Coded<AnswerOf<typeof makeJoinCode>>>(making, { method: 'POST', params: { event: of }, body: { role }, cookie })
const joins = (token: string, name = 'Wynn Harrow') =>
  ask<Coded<AnswerOf<typeof join>>>(joining, { method: 'POST', params: { token }, body: { name } })
const state = (claim: string) => ask<Coded<AnswerOf<typeof joinState>>>(polling, { method: 'POST', body: { claim } })
const decide = (member: string, decision: string, cookie = organiser, of = event) =>
  ask<Coded<CrewMemberView>>(deciding, { method: 'POST', params: { event: of }, body: { member, decision }, cookie })
const crew = (cookie = organiser, of = event) => ask<Coded<AnswerOf<typeof listCrew>>>(listing, { params: { event: of }, cookie })

describe('[M4] a join code', () => {
  test('is told once with at least 128 bits, and only its hash is kept', async () => {
    const { json } = await code()
    expect(Buffer.from(json.token, 'base64url').length).toBeGreaterThanOrEqual(16)
    expect(json.url).toBe(`${ORIGIN}/join/${json.token}`)
    const [row] = fresh.database.select().from(joinCode).all()
    expect(row?.tokenHash).toBe(sha256(json.token))
    expect(JSON.stringify([row, fresh.database.select().from(audit).all()])).not.toContain(json.token)
  })

  test.each(['chief', 'organiser', 'admin'])('never makes a %s', async (role) => {
    expect((await code(role)).json.code).toBe('invalid')
  })

  test('says what it is for, to anybody who holds it', async () => {
    const { json } = await code('helper')
    const seen = await ask<AnswerOf<typeof seeJoinCode>>(seeing, { params: { token: json.token } })
    expect(seen.json).toMatchObject({ role: 'helper', event: { id: event, venue: 'Ottermere Ring' } })
  })

  test('lets several people ask, each for themselves', async () => {
    const { token } = (await code()).json
    const [first, second] = [await joins(token, 'Wynn Harrow'), await joins(token, 'Ives Marlow')]
    expect(first.json.claim).not.toBe(second.json.claim)
    const { json } = await crew()
    expect(json.crew.map(({ name, state: stands }) => [name, stands])).toEqual([
      ['Wynn Harrow', 'waiting'],
      ['Ives Marlow', 'waiting'],
    ])
  })

  test('runs out to the millisecond', async () => {
    const { token, expiresAt } = (await code()).json
    expect(expiresAt - Date.now()).toBe(JOIN_CODE_MINUTES * 60_000)
    vi.setSystemTime(expiresAt - 1)
    expect((await joins(token)).status).toBe(200)
    vi.setSystemTime(expiresAt)
    expect((await joins(token)).json.code).toBe('join-code-expired')
    expect((await ask(seeing, { params: { token } })).status).toBe(410)
  })

  test('that was never made is not known', async () => {
    expect((await joins('A'.repeat(27))).json.code).toBe('join-code-unknown')
    expect((await joins('short')).json.code).toBe('missing')
  })

  test.each(['', ' ', 'x', 'a'.repeat(81), 'Wynn\u202eworraH', 'Wy\u0000nn', 'Wy\u200bnn'])('takes no name like %j', async (name) => {
    const { token } = (await code()).json
    expect((await joins(token, name)).json.code).toBe('invalid')
    expect(fresh.database.select().from(crewMember).all()).toEqual([])
  })

  test('is for organisers to make', async () => {
    const chief = club.addAccount('chief', 'c@marram.example')
    club.addCrew(event, chief, 'chief')
    expect((await code('marshal', await signedIn(chief))).json.code).toBe('forbidden')
  })
})

describe('acceptance', () => {
  test('changes what the phone hears, moves the snapshot on, and is written down', async () => {
    const joined = (await joins((await code()).json.token)).json
    expect((await state(joined.claim)).json.state).toBe('waiting')
    vi.setSystemTime(Date.now() + 5000)
    const decided = await decide(joined.member, 'accept')
    expect(decided.json).toMatchObject({ state: 'accepted', hasAccount: false, decidedAt: Date.now() })
    expect((await state(joined.claim)).json).toMatchObject({
      state: 'accepted',
      name: 'Wynn Harrow',
      role: 'marshal',
      person: joined.person,
    })
    expect(fresh.database.select().from(eventTable).get()?.snapshotVersion).toBe(2)
    expect(
      fresh.database
        .select({ action: audit.action })
        .from(audit)
        .all()
        .map(({ action }) => action),
    ).toContain('crew-accepted')
  })

  test('asked twice is done once; the other way afterwards is refused', async () => {
    const { member } = (await joins((await code()).json.token)).json
    const [first, again] = [await decide(member, 'accept'), await decide(member, 'accept')]
    expect(again.json).toEqual(first.json)
    expect(
      fresh.database
        .select()
        .from(audit)
        .all()
        .filter(({ action }) => action === 'crew-accepted'),
    ).toHaveLength(1)
    expect((await decide(member, 'refuse')).json.code).toBe('crew-decided')
  })

  test('refused stays refused', async () => {
    const joined = (await joins((await code()).json.token)).json
    await decide(joined.member, 'refuse')
    expect((await decide(joined.member, 'accept')).json.code).toBe('crew-decided')
    expect((await state(joined.claim)).json.state).toBe('refused')
  })

  test('ends, and stays ended', async () => {
    const joined = (await joins((await code()).json.token)).json
    await decide(joined.member, 'accept')
    expect((await decide(joined.member, 'end')).json.state).toBe('ended')
    expect((await decide(joined.member, 'accept')).json.code).toBe('crew-decided')
  })

  test('a claim that was never given is not known', async () => {
    expect((await state('A'.repeat(27))).json.code).toBe('claim-unknown')
  })
})

describe('a foreign event', () => {
  test("another club's event, its people and an event that never was are all missing alike", async () => {
    const other = await aClub(fresh.database, 'Another club')
    const foreign = other.addEvent()
    const stranger = await signedIn(other.addAccount('organiser', 'o@other.example'))
    const joined = (await joins((await code('marshal', stranger, foreign)).json.token)).json
    for (const of of [foreign, noSuchId()]) {
      for (const answer of [
        await crew(organiser, of),
        await code('marshal', organiser, of),
        await decide(joined.member, 'accept', organiser, of),
      ]) {
        expect([answer.status, answer.json.code]).toEqual([404, 'missing'])
      }
    }
    expect((await decide(joined.member, 'accept')).json.code).toBe('missing')
    expect((await decide(noSuchId(), 'accept')).json.code).toBe('missing')
    expect((await state(joined.claim)).json.state).toBe('waiting')
  })

  test('a crew role at one event gives none at another', async () => {
    const chief = club.addAccount('chief', 'c@marram.example')
    club.addCrew(event, chief, 'chief')
    const cookie = await signedIn(chief)
    expect((await crew(cookie)).status).toBe(200)
    expect((await crew(cookie, club.addEvent(2))).json.code).toBe('forbidden')
    expect((await crew(cookie, noSuchId())).json.code).toBe('forbidden')
  })
})
