import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest'
import { signIn as signInTable } from '@/db/schema'
import { endSignIn } from '@/lib/accounts/commands/end-sign-in'
import { signInWithPassword } from '@/lib/accounts/commands/sign-in-with-password'
import { describeMe } from '@/lib/accounts/queries/describe-me'
import { resetTries, WRONG_TRIES } from '@/lib/accounts/sign-in-throttle'
import type { AnswerOf } from '@/lib/contracts/contract'
import { me } from '@/lib/contracts/me'
import { signIn } from '@/lib/contracts/sign-in'
import { signOut } from '@/lib/contracts/sign-out'
import { resetAllowances } from '@/lib/http/rate'
import { handle } from '@/lib/http/server'
import { hashPassword, isRightPassword, passwordFault } from '@/lib/platform/password'
import { ABSOLUTE_LIFETIME, forgetEndedSessions, IDLE_LIFETIME } from '@/lib/platform/session'
import { sha256 } from '@/lib/platform/sha256'
import { aClub, PASSWORD } from '../support/a-club'
import { ask } from '../support/ask'
import { freshDatabase } from '../support/fresh-database'

const signingIn = handle(signIn, signInWithPassword)
const signingOut = handle(signOut, endSignIn)
const asking = handle(me, describeMe)
const START = Date.parse('2026-05-01T08:00:00Z')
const EMAIL = 'organiser@marram.example'

let fresh: ReturnType<typeof freshDatabase>
let club: Awaited<ReturnType<typeof aClub>>
beforeEach(async () => {
  fresh = freshDatabase()
  resetAllowances()
  resetTries()
  vi.useFakeTimers({ now: START, toFake: ['Date'] })
  club = await aClub(fresh.database)
  club.addAccount('organiser', EMAIL)
})
afterEach(() => {
  vi.useRealTimers()
  fresh.close()
})

const enter = (email = EMAIL, password = PASSWORD, cookie = '') =>
  ask(signingIn, { method: 'POST', body: { email, password }, cookie, headers: { 'user-agent': 'a phone' } })
const who = (cookie: string) => ask<AnswerOf<typeof me> & { code: string }>(asking, { cookie })
const wait = (ms: number) => vi.setSystemTime(Date.now() + ms)

describe('signing in', () => {
  test('the cookie is host-only, out of reach of scripts, and never sent without TLS', async () => {
    const { headers } = await enter()
    expect(headers.get('set-cookie')).toMatch(/^__Host-lockwire=[a-z0-9]{40}; /)
    const attributes = (headers.get('set-cookie') ?? '')
      .split('; ')
      .slice(1)
      .map((each) => each.split('=')[0]?.toLowerCase())
    expect(attributes).toEqual(expect.arrayContaining(['httponly', 'secure', 'samesite', 'path']))
    expect(attributes).not.toContain('domain')
  })

  test('only the hash of the sign-in is stored', async () => {
    const { cookie } = await enter()
    const id = cookie.split('=')[1] ?? ''
    expect(fresh.database.select().from(signInTable).all()).toMatchObject([{ idHash: sha256(id), userAgent: 'a phone' }])
    expect(JSON.stringify(fresh.database.select().from(signInTable).all())).not.toContain(id)
  })

  test('spaces and capitals in the e-mail do not matter, in the password they do', async () => {
    expect((await enter('  Organiser@MARRAM.example ')).status).toBe(200)
    expect((await enter(EMAIL, PASSWORD.toUpperCase())).status).toBe(401)
  })

  test('wrong password and unknown e-mail are answered alike', async () => {
    const wrong = await enter(EMAIL, 'not the password')
    const unknown = await enter('nobody@marram.example', 'not the password')
    expect(wrong.status).toBe(401)
    expect(unknown).toEqual({ ...wrong, headers: expect.anything() as Headers })
    expect(wrong.cookie).toBe('')
  })

  test('an unknown account costs the same work as a wrong password', async () => {
    const stored = await hashPassword(PASSWORD)
    await isRightPassword(null, 'warm')
    const took = async (hash: string | null) => {
      const from = performance.now()
      expect(await isRightPassword(hash, 'not the password')).toBe(false)
      return performance.now() - from
    }
    // By turns, and the quickest of each: other work on the machine only ever makes one slower.
    let [known, unknown] = [Infinity, Infinity]
    for (let time = 0; time < 8; time++) {
      known = Math.min(known, await took(stored))
      unknown = Math.min(unknown, await took(null))
    }
    expect(unknown / known).toBeGreaterThan(0.5)
  })

  test('too many wrong tries for one e-mail wait, even with the right password; others do not', async () => {
    club.addAccount('chief', 'chief@marram.example')
    for (let time = 0; time < WRONG_TRIES; time++) await enter(EMAIL, 'not the password')
    const refused = await enter()
    expect([refused.status, refused.json.code]).toEqual([429, 'too-many-tries'])
    expect(Number(refused.headers.get('retry-after'))).toBeGreaterThan(600)
    expect((await enter('chief@marram.example')).status).toBe(200)
  })

  test('an e-mail without account is throttled just so', async () => {
    for (let time = 0; time < WRONG_TRIES; time++) await enter('nobody@marram.example', 'x')
    expect((await enter('nobody@marram.example', 'x')).json.code).toBe('too-many-tries')
  })

  test('a right password wipes the wrong tries', async () => {
    for (let round = 0; round < 3; round++) {
      for (let time = 0; time < WRONG_TRIES - 1; time++) await enter(EMAIL, 'not the password')
      expect((await enter()).status).toBe(200)
    }
  })

  test('signing in again ends the sign-in that was there', async () => {
    const first = await enter()
    const second = await enter(EMAIL, PASSWORD, first.cookie)
    expect((await who(first.cookie)).status).toBe(401)
    expect((await who(second.cookie)).status).toBe(200)
  })
})

describe('a sign-in', () => {
  test('is over when it was not used for the idle lifetime', async () => {
    const { cookie } = await enter()
    wait(IDLE_LIFETIME.milliseconds() + 1)
    expect((await who(cookie)).json.code).toBe('not-signed-in')
  })

  test('lives on while it is used, but not beyond the absolute lifetime', async () => {
    const { cookie } = await enter()
    const step = IDLE_LIFETIME.milliseconds() * 0.6
    for (let spent = step; spent < ABSOLUTE_LIFETIME.milliseconds(); spent += step) {
      wait(step)
      expect((await who(cookie)).status).toBe(200)
    }
    wait(step)
    expect((await who(cookie)).status).toBe(401)
  })

  test('what is over is forgotten, what holds is not', async () => {
    await enter()
    wait(IDLE_LIFETIME.milliseconds() + 1)
    const { cookie } = await enter()
    await forgetEndedSessions(fresh.database)
    expect(fresh.database.select().from(signInTable).all()).toHaveLength(1)
    expect((await who(cookie)).status).toBe(200)
  })

  test('ends by signing out, on this device only', async () => {
    const [here, there] = [await enter(), await enter()]
    const out = await ask(signingOut, { method: 'POST', body: {}, cookie: here.cookie })
    expect(out.headers.get('set-cookie')).toMatch(/Max-Age=0/)
    expect((await who(here.cookie)).status).toBe(401)
    expect((await who(there.cookie)).status).toBe(200)
  })

  test('ends everywhere when asked', async () => {
    const [here, there] = [await enter(), await enter()]
    await ask(signingOut, { method: 'POST', body: { everywhere: true }, cookie: here.cookie })
    expect((await who(there.cookie)).status).toBe(401)
  })

  test.each(['', '__Host-lockwire=', '__Host-lockwire=guess', `__Host-lockwire=${'a'.repeat(5000)}`])(
    'cookie %.30s is nobody',
    async (cookie) => {
      expect((await who(cookie)).json.code).toBe('not-signed-in')
    },
  )

  test('says who it is, where they are crew, and where else they are signed in', async () => {
    const [mine] = [club.addEvent(1), club.addEvent(2)]
    const chief = club.addAccount('chief', 'chief@marram.example')
    club.addCrew(mine, chief, 'chief')
    await enter('chief@marram.example')
    wait(1000)
    const { cookie } = await enter('chief@marram.example')
    const { json } = await who(cookie)
    expect(json).toMatchObject({ email: 'chief@marram.example', clubRoles: [], events: [{ id: mine, roles: ['chief'] }] })
    expect(json.signIns.map(({ current }) => current)).toEqual([true, false])
  })

  test("an organiser sees the club's events and no other club's", async () => {
    const event = club.addEvent(1)
    const other = await aClub(fresh.database, 'Another club')
    other.addEvent(1)
    const { cookie } = await enter()
    expect((await who(cookie)).json.events.map(({ id }) => id)).toEqual([event])
  })
})

describe('a password', () => {
  test.each([
    ['eleven char', 'too-short'],
    ['🔧🔧🔧🔧🔧🔧🔧🔧', 'too-short'],
    ['Password-1234', 'too-common'],
    ['lockwire lockwire', 'too-common'],
    ['ababababababab', 'too-common'],
    ['x'.repeat(201), 'too-long'],
    ['twelve chars', null],
    ['ottermere-ring-demo', null],
  ])('%.20s: %s', (password, fault) => {
    expect(passwordFault(password)).toBe(fault)
  })

  test('is kept as argon2id', async () => {
    expect(await hashPassword(PASSWORD)).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/)
  })
})
