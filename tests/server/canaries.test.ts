import { afterEach, beforeEach, describe, expect, test } from 'vitest'
import * as tables from '@/db/schema'
import type { Contract } from '@/lib/contracts/contract'
import { CONTRACTS } from '@/lib/contracts/registry'
import { resetAllowances } from '@/lib/http/rate'
import { CREW_ROLES, type CrewRole, type Role, ROLES } from '@/lib/permissions/policy'
import { newId } from '@/lib/platform/ids'
import { startSession } from '@/lib/platform/session'
import { aClubWithCanaries, type CanaryEvent } from '../support/a-club-with-canaries'
import { ORIGIN } from '../support/ask'
import { freshDatabase } from '../support/fresh-database'
import { handlerOf } from '../support/handler-of'

// Whoever asks, whatever route: what belongs to another club, and for crew to another event, is never in the answer. Each row of the
// database carries a word that says whose it is; the words are looked for in the bytes that were sent.
let fresh: ReturnType<typeof freshDatabase>
let own: CanaryEvent
let other: CanaryEvent
let foreign: CanaryEvent
let club: Awaited<ReturnType<typeof aClubWithCanaries>>
beforeEach(async () => {
  fresh = freshDatabase()
  resetAllowances()
  club = await aClubWithCanaries(fresh.database, 'Marram Track Days')
  own = club.addCanaryEvent()
  other = club.addCanaryEvent()
  foreign = (await aClubWithCanaries(fresh.database, 'Another club')).addCanaryEvent()
})
afterEach(() => fresh.close())

const reading = CONTRACTS.filter(({ method, auth }) => method === 'GET' && (auth === 'session' || auth === 'either'))
const writing = CONTRACTS.filter(({ method, auth }) => method !== 'GET' && (auth === 'session' || auth === 'either'))
/** Written by hand: whose address and telephone may be in an answer. */
const SEES_CONTACTS: readonly Role[] = ['admin', 'organiser']

/** The answer's own bytes, with every part of the path filled in with what is really there. */
async function sent(contract: Contract, of: CanaryEvent, cookie: string, body?: unknown): Promise<{ status: number; text: string }> {
  const filled: Readonly<Record<string, string>> = {
    event: of.event,
    entry: of.entry,
    car: of.car,
    kit: newId(),
    hash: of.photo,
    token: 'A'.repeat(27),
  }
  const names = [...contract.path.matchAll(/\[([^\]]+)\]/g)].map((match) => match[1] ?? '')
  const params = Object.fromEntries(names.map((name) => [name, filled[name] ?? '']))
  const path = names.reduce((text, name) => text.replace(`[${name}]`, filled[name] ?? ''), contract.path)
  const abort = new AbortController()
  const init: RequestInit & { duplex?: 'half' } = {
    method: contract.method,
    headers: { cookie, origin: ORIGIN, 'content-type': 'application/json' },
    signal: abort.signal,
    ...(body === undefined ? {} : { body: JSON.stringify(body), duplex: 'half' }),
  }
  const response = await (await handlerOf(contract))(new Request(`${ORIGIN}${path}`, init), { params: Promise.resolve(params) })
  if (response.headers.get('content-type')?.startsWith('text/event-stream')) {
    const first = await response.body?.getReader().read()
    abort.abort()
    return { status: response.status, text: new TextDecoder().decode(first?.value) }
  }
  return { status: response.status, text: await response.text() }
}

async function signedIn(role: Role): Promise<string> {
  const id = club.addAccount(role, `${role}@marram.example`)
  if ((CREW_ROLES as readonly Role[]).includes(role)) club.addCrew(own.event, id, role as CrewRole)
  // An entrant sits in the entry of the own event, by the address that was written there.
  if (role === 'entrant') {
    const person = {
      clubId: club.clubId,
      eventId: own.event,
      id: newId(),
      name: 'Ida Rook',
      email: 'entrant@marram.example',
      accountId: id,
    }
    fresh.database.insert(tables.person).values(person).run()
    fresh.database.insert(tables.entryPerson).values({ clubId: club.clubId, entryId: own.entry, personId: person.id, role: 'driver' }).run()
  }
  return (await startSession(fresh.database, id, '')).split(';')[0] ?? ''
}

function found(text: string, words: readonly string[]): readonly string[] {
  return words.filter((word) => text.toLowerCase().includes(word.toLowerCase()))
}

test('there are routes to read, and the canaries sing: an organiser is sent those of the own event', async () => {
  const cookie = await signedIn('organiser')
  const texts = await Promise.all(reading.map(async (contract) => (await sent(contract, own, cookie)).text))
  expect(reading.length).toBeGreaterThan(8)
  expect(found(texts.join(' '), own.words).length).toBeGreaterThan(4)
  expect(found(texts.join(' '), own.contacts).length).toBeGreaterThan(0)
})

describe.each(ROLES)('as %s', (role) => {
  test('no route sends anything of another club, or lets it be changed', async () => {
    const cookie = await signedIn(role)
    for (const contract of [...reading, ...writing]) {
      const { status, text } = await sent(contract, foreign, cookie, contract.method === 'GET' ? undefined : {})
      expect(found(text, [...foreign.words, ...foreign.contacts]), `${contract.name} of a foreign club`).toEqual([])
      // `me`, one's own garage and signing out name nothing of the other club in their path.
      if (/\[(event|entry|car|kit|hash)\]/.test(contract.path)) expect(status, contract.name).toBeGreaterThanOrEqual(400)
    }
  })

  test('an answer about the own event never carries another event’s words', async () => {
    const cookie = await signedIn(role)
    for (const contract of reading) {
      const { text } = await sent(contract, own, cookie)
      expect(found(text, [...foreign.words, ...foreign.contacts]), contract.name).toEqual([])
      expect(found(text, [...other.words, ...other.contacts]), contract.name).toEqual([])
    }
  })

  test('addresses and telephones are sent to whoever may see contacts, and to nobody else', async () => {
    const cookie = await signedIn(role)
    const texts = await Promise.all(reading.map(async (contract) => (await sent(contract, own, cookie)).text))
    expect(found(texts.join(' '), own.contacts).length > 0).toBe(SEES_CONTACTS.includes(role))
  })
})

test.each([...CREW_ROLES, 'entrant'] as const)('a %s of one event is sent nothing of another event of the same club', async (role) => {
  const cookie = await signedIn(role)
  for (const contract of reading) {
    const { text } = await sent(contract, other, cookie)
    expect(found(text, [...other.words, ...other.contacts]), contract.name).toEqual([])
  }
})
