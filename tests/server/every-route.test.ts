import { afterEach, beforeEach, describe, expect, test } from 'vitest'
import type { Contract } from '@/lib/contracts/contract'
import { problem } from '@/lib/contracts/problem'
import { CONTRACTS } from '@/lib/contracts/registry'
import { resetAllowances } from '@/lib/http/rate'
import { CREW_ROLES, type CrewRole, type Role, ROLES } from '@/lib/permissions/policy'
import { startSession } from '@/lib/platform/session'
import { aClub, noSuchId } from '../support/a-club'
import { ask, type Asked } from '../support/ask'
import { freshDatabase } from '../support/fresh-database'
import { handlerOf } from '../support/handler-of'

// Every route there is, found by the registry: a new one is asked the same hostile questions without a line here.
let fresh: ReturnType<typeof freshDatabase>
let club: Awaited<ReturnType<typeof aClub>>
let event: string
beforeEach(async () => {
  fresh = freshDatabase()
  resetAllowances()
  club = await aClub(fresh.database)
  event = club.addEvent()
})
afterEach(() => fresh.close())

const every = CONTRACTS.map((contract) => ({ name: contract.name, contract }))
const unsafe = every.filter(({ contract }) => contract.method !== 'GET')
const forSignIns = every.filter(({ contract }) => contract.auth === 'session')

/** As Next does: undefined for a path without a variable part. */
function paramsOf({ path }: Contract, eventId: string): Record<string, string> | undefined {
  const names = [...path.matchAll(/\[([^\]]+)\]/g)].map((match) => match[1] ?? '')
  if (names.length === 0) return undefined
  return Object.fromEntries(names.map((name) => [name, name === 'event' ? eventId : 'A'.repeat(27)]))
}

async function asks(contract: Contract, asked: Asked, eventId = event) {
  const path = contract.path.replace('[event]', eventId)
  const params = paramsOf(contract, eventId)
  return ask(await handlerOf(contract), { method: contract.method, path, ...(params ? { params } : {}), ...asked })
}

async function signedIn(role: Role): Promise<string> {
  const id = club.addAccount(role, `${role}@marram.example`)
  if (isCrewRole(role)) club.addCrew(event, id, role)
  return (await startSession(fresh.database, id, '')).split(';')[0] ?? ''
}

function isCrewRole(role: Role): role is CrewRole {
  return (CREW_ROLES as readonly Role[]).includes(role)
}

const JUNK: readonly (readonly [string, BodyInit])[] = [
  ['malformed JSON', '{"a'],
  ['very deep JSON', '['.repeat(200_000)],
  ['an array', '[]'],
  ['null', 'null'],
  ['prototype keys', '{"__proto__":{"x":1},"constructor":{"prototype":{"x":1}}}'],
  ['huge numbers', '{"unsent":1e400,"member":-1e308,"protocol":99999999999999999999}'],
  ['null bytes and bidi text', JSON.stringify({ name: '\u0000\u202e\u200b', email: '\u0000@x.y', password: '\ud800', text: '\u0000' })],
  ['bytes that are no UTF-8', Buffer.from([0xff, 0xfe, 0x00, 0xd8])],
]

describe.each(unsafe)('$name', ({ contract }) => {
  test('takes nothing from a page of another origin', async () => {
    const answer = await asks(contract, { origin: 'https://elsewhere.example', body: {}, cookie: await signedIn('organiser') })
    expect([answer.status, answer.json.code]).toEqual([403, 'foreign-origin'])
  })

  test('takes not one byte more than its limit', async () => {
    const answer = await asks(contract, { raw: new Uint8Array(contract.limitBytes + 1), cookie: await signedIn('organiser') })
    expect([answer.status, answer.json.code]).toEqual([413, 'too-large'])
  })

  test.each(JUNK)('answers %s as the fault of who sends it', async (_, raw) => {
    const answer = await asks(contract, { raw, cookie: await signedIn('organiser') })
    expect(answer.status).toBeGreaterThanOrEqual(400)
    expect(answer.status).toBeLessThan(500)
    expect(answer.headers.get('content-type')).toBe('application/problem+json')
    expect(JSON.stringify(problem.parse(answer.json))).not.toMatch(/\.ts:|node_modules|at Object/)
  })
})

describe.each(every.filter(({ contract }) => contract.auth !== 'public'))('$name', ({ contract }) => {
  test('is closed to who does not say who they are', async () => {
    const answer = await asks(contract, contract.method === 'GET' ? {} : { body: {} })
    expect(answer.status).toBe(401)
  })
})

// Written by hand: who gets past the door of each route for sign-ins. Everybody else is told the same, whether the event exists or not.
const MAY: Readonly<Record<string, readonly Role[]>> = {
  'sign-out': ROLES,
  me: ROLES,
  'join-code-make': ['admin', 'organiser'],
  'crew-list': ['admin', 'organiser', 'chief'],
  'crew-decide': ['admin', 'organiser'],
  'device-list': ['admin', 'organiser', 'chief'],
  'device-retire': ['admin', 'organiser'],
  'entry-edit': ['organiser', 'chief'],
  'entry-import': ['admin', 'organiser'],
  'my-entry': ['entrant'],
  'declaration-draft': ['entrant'],
  'declaration-sign': ['entrant'],
  'car-add': ['entrant'],
  'car-keep': ['entrant'],
  'kit-add': ['entrant'],
  'kit-keep': ['entrant'],
  'event-declarations': ['admin', 'organiser', 'chief'],
  holds: ['admin', 'organiser', 'chief'],
  'pass-void': ['organiser', 'chief'],
  'report-csv': ['admin', 'organiser', 'chief'],
  'report-json': ['admin', 'organiser', 'chief'],
  'crew-invite': ['admin', 'organiser'],
  'event-create': ['admin', 'organiser'],
  'timetable-save': ['admin', 'organiser'],
  'see-bay-order': ['admin', 'organiser', 'chief', 'scrutineer', 'helper', 'sign-on'],
  'plan-bay': ['admin', 'organiser'],
  'event-mail': ['admin', 'organiser'],
  'mail-write': ['admin', 'organiser'],
  'mail-again': ['admin', 'organiser'],
  board: ['admin', 'organiser', 'chief', 'scrutineer', 'helper', 'sign-on', 'marshal'],
}

test('the list of who may names every route for sign-ins', () => {
  expect(forSignIns.map(({ name }) => name).filter((name) => !(name in MAY))).toEqual([])
})

describe.each(forSignIns)('$name', ({ name, contract }) => {
  test.each(ROLES)(`as %s`, async (role) => {
    const cookie = await signedIn(role)
    const input: Asked = contract.method === 'GET' ? { cookie } : { cookie, body: {} }
    const own = await asks(contract, input)
    expect(own.status === 403).toBe(!MAY[name]?.includes(role))
    if (!contract.path.includes('[event]')) return
    const foreign = await asks(contract, input, (await aClub(fresh.database, 'Another club')).addEvent())
    const never = await asks(contract, input, noSuchId())
    expect([foreign.status, foreign.json.code]).toEqual([never.status, never.json.code])
    expect(foreign.status).toBeGreaterThanOrEqual(400)
  })
})
