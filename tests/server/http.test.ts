import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest'
import * as z from 'zod/mini'
import { contract, type Contract } from '@/lib/contracts/contract'
import { problem, PROBLEM_CODES } from '@/lib/contracts/problem'
import { call } from '@/lib/http/call'
import { ERRORS } from '@/lib/http/errors'
import { resetAllowances } from '@/lib/http/rate'
import { handle } from '@/lib/http/server'
import { handleStream } from '@/lib/http/stream'
import { announce, changesOf } from '@/lib/platform/live'
import { refuse } from '@/lib/platform/refusal'
import { startSession } from '@/lib/platform/session'
import { aClub } from '../support/a-club'
import { ask, ORIGIN } from '../support/ask'
import { freshDatabase } from '../support/fresh-database'

let fresh: ReturnType<typeof freshDatabase>
beforeEach(() => {
  fresh = freshDatabase()
  resetAllowances()
})
afterEach(() => fresh.close())

const LIMIT = 1_000
const echo = contract({
  name: 'echo',
  method: 'POST',
  path: '/api/echo',
  auth: 'public',
  action: 'public',
  limitBytes: LIMIT,
  rate: { times: 3, perSeconds: 60 },
  body: z.strictObject({ text: z.string() }),
  response: z.object({ text: z.string() }),
})
const seen = vi.fn()
const echoing = handle(echo, ({ body }) => {
  seen(body)
  return { text: body.text, secret: 'never sent' }
})
beforeEach(() => seen.mockClear())

const post = (asked: Parameters<typeof ask>[1]) => ask(echoing, { method: 'POST', ...asked })

describe('the one door', () => {
  test('what the contract does not name is not sent', async () => {
    const answer = await ask<object>(echoing, { method: 'POST', body: { text: 'hello' } })
    expect(answer.status).toBe(200)
    expect(answer.json).toEqual({ text: 'hello' })
    expect(answer.headers.get('cache-control')).toBe('no-store')
  })

  test.each([
    ['malformed JSON', '{"text":', 400, 'malformed'],
    ['bytes that are no UTF-8', Buffer.from([0x22, 0xff, 0x22]), 400, 'malformed'],
    ['JSON nested deeper than any contract', `${'['.repeat(200)}${']'.repeat(200)}`, 400, 'malformed'],
    ['a key that is not asked for', '{"text":"a","more":1}', 422, 'invalid'],
    ['a prototype key', '{"text":"a","__proto__":{"admin":true}}', 422, 'invalid'],
    ['a wrong type', '{"text":7}', 422, 'invalid'],
    ['no body', '', 422, 'invalid'],
  ])('%s is refused as a problem, and the command never sees it', async (_, raw, status, code) => {
    const answer = await post({ raw })
    expect(answer.status).toBe(status)
    expect(answer.headers.get('content-type')).toBe('application/problem+json')
    expect(problem.parse(answer.json).code).toBe(code)
    expect(seen).not.toHaveBeenCalled()
  })

  test('brackets within a text are no nesting', async () => {
    expect((await post({ body: { text: `\\"${'['.repeat(100)}` } })).status).toBe(200)
  })

  test('a body of the limit is taken, one byte more is not', async () => {
    const frame = '{"text":""}'.length
    expect((await post({ body: { text: 'a'.repeat(LIMIT - frame) } })).status).toBe(200)
    expect((await post({ body: { text: 'a'.repeat(LIMIT - frame + 1) } })).status).toBe(413)
  })

  test('a body without length is read no further than the limit', async () => {
    let given = 0
    const endless = new ReadableStream<Uint8Array>({
      pull(controller) {
        given += 400
        controller.enqueue(new Uint8Array(400))
      },
    })
    expect((await post({ raw: endless })).status).toBe(413)
    expect(given).toBeLessThan(LIMIT * 4)
  })

  test('a body shorter than it says was cut on the way: refused', async () => {
    const answer = await post({ raw: '{"text":"a"}', headers: { 'content-length': '900' } })
    expect(answer.json.code).toBe('malformed')
  })

  test('another content type is refused', async () => {
    const answer = await post({ raw: '{"text":"a"}', headers: { 'content-type': 'text/plain' } })
    expect(answer.json.code).toBe('not-json')
  })

  test.each(['https://elsewhere.example', 'null', null, `${ORIGIN}.elsewhere.example`])(
    'an unsafe request from origin %s is refused',
    async (origin) => {
      const answer = await post({ origin, body: { text: 'a' } })
      expect(answer.status).toBe(403)
      expect(answer.json.code).toBe('foreign-origin')
      expect(seen).not.toHaveBeenCalled()
    },
  )

  test('a device token does not open a route for sign-ins to other origins', async () => {
    const answer = await post({ origin: null, headers: { authorization: 'Device a.b.c' }, body: { text: 'a' } })
    expect(answer.json.code).toBe('foreign-origin')
  })

  test('too many requests wait, and are told how long', async () => {
    const answers = []
    for (let time = 0; time < 31; time++) answers.push(await post({ body: { text: 'a' } }))
    expect(answers.slice(0, 30).every(({ status }) => status === 200)).toBe(true)
    expect(answers[30]?.json.code).toBe('rate-limited')
    expect(Number(answers[30]?.headers.get('retry-after'))).toBeGreaterThan(0)
  })

  test('a bug is a fault without a word of what it was', async () => {
    const broken = handle(echo, () => {
      throw new Error('secret detail')
    })
    const answer = await ask(broken, { method: 'POST', body: { text: 'a' } })
    expect(answer.status).toBe(500)
    expect(JSON.stringify(answer.json)).not.toMatch(/secret|stack|\.ts/)
  })

  test.each([
    ['SQLITE_FULL', 507, 'no-room'],
    ['SQLITE_BUSY', 503, 'busy'],
  ])('%s is said as what it is', async (code, status, expected) => {
    const broken = handle(echo, () => {
      throw Object.assign(new Error('x'), { code })
    })
    const answer = await ask(broken, { method: 'POST', body: { text: 'a' } })
    expect([answer.status, answer.json.code]).toEqual([status, expected])
  })

  test('a refusal may carry more exact words', async () => {
    const refusing = handle(echo, () => refuse('missing', { what: 'No such car.' }))
    const answer = await ask(refusing, { method: 'POST', body: { text: 'a' } })
    expect(answer.json).toMatchObject({ status: 404, what: 'No such car.', kept: ERRORS.missing.kept, todo: ERRORS.missing.todo })
  })

  test('every code has a status of its own kind and words that end', () => {
    expect(Object.keys(ERRORS).sort()).toEqual([...PROBLEM_CODES].sort())
    for (const { status, what, kept, todo } of Object.values(ERRORS)) {
      expect(status === 0 || (status >= 400 && status < 600)).toBe(true)
      for (const words of [what, kept, todo]) expect(words).toMatch(/^[A-Z].*\.$/)
      expect(`${what}${kept}${todo}`).not.toMatch(/!|\bsafe\b/)
    }
  })
})

const eventEdit = contract({
  name: 'edit',
  method: 'POST',
  path: '/api/events/[event]/edit',
  auth: 'session',
  action: 'event:edit',
  limitBytes: LIMIT,
  rate: { times: 100, perSeconds: 60 },
  params: z.strictObject({ event: z.uuid() }),
  response: z.object({ done: z.boolean() }),
})

describe('who may', () => {
  const command = vi.fn(() => ({ done: true }))
  const editing = handle(eventEdit, command)
  beforeEach(() => command.mockClear())

  test('without a sign-in nothing is done', async () => {
    const answer = await ask(editing, { method: 'POST', params: { event: '01900000-0000-7000-8000-000000000000' } })
    expect(answer.json.code).toBe('not-signed-in')
  })

  test('the right is asked before anything is parsed or looked up', async () => {
    const club = await aClub(fresh.database)
    const cookie = (await startSession(fresh.database, club.addAccount('marshal', 'm@marram.example'), '')).split(';')[0] ?? ''
    const answers = [{ event: club.addEvent() }, { event: '01900000-0000-7000-8000-000000000000' }, { event: 'nonsense' }].map((params) =>
      ask(editing, { method: 'POST', cookie, params, raw: '{"a' }),
    )
    for (const { status, json } of await Promise.all(answers)) {
      expect([status, json.code]).toEqual([403, 'forbidden'])
      expect(json.what).toBe(ERRORS.forbidden.what)
    }
    expect(command).not.toHaveBeenCalled()
  })

  test('an id that cannot be one is missing', async () => {
    const club = await aClub(fresh.database)
    const cookie = (await startSession(fresh.database, club.addAccount('organiser', 'o@marram.example'), '')).split(';')[0] ?? ''
    const answer = await ask(editing, { method: 'POST', cookie, params: { event: "x' OR 1=1" } })
    expect([answer.status, answer.json.code]).toEqual([404, 'missing'])
  })
})

describe('a stream', () => {
  const watch = contract({
    name: 'watch',
    method: 'GET',
    path: '/api/watch',
    auth: 'public',
    action: 'public',
    limitBytes: 0,
    rate: { times: 100, perSeconds: 60 },
    response: z.object({ time: z.int() }),
  })

  test('tells at once and at each change, and ends when the asker has gone', async () => {
    let ended = false
    const streaming = handleStream(watch, async function* (_input, _actor, { signal }) {
      let time = 0
      try {
        for await (const _change of changesOf('event', signal)) yield { time: ++time }
      } finally {
        ended = true
      }
    })
    const gone = new AbortController()
    const response = await streaming(new Request(`${ORIGIN}/api/watch`, { signal: gone.signal }), { params: Promise.resolve({}) })
    expect(response.headers.get('content-type')).toMatch('text/event-stream')
    expect(response.headers.get('cache-control')).toMatch('no-transform')
    const reader = (response.body as ReadableStream<Uint8Array>).getReader()
    const next = async () => new TextDecoder().decode((await reader.read()).value)
    expect(await next()).toMatch(/^:/)
    expect(await next()).toBe('data: {"time":1}\n\n')
    announce('another event')
    announce('event')
    expect(await next()).toBe('data: {"time":2}\n\n')
    gone.abort()
    await vi.waitFor(() => expect(ended).toBe(true))
  })
})

describe('a call', () => {
  const respond = (response: Response | Error) =>
    vi.stubGlobal('fetch', () => (response instanceof Error ? Promise.reject(response) : Promise.resolve(response)))
  afterEach(() => vi.unstubAllGlobals())
  const outcome = async (c: Contract = echo) => {
    const called = await call(c, { body: { text: 'a' } } as never)
    return called.ok ? called.value : called.problem.code
  }

  test.each([
    ['no network', new TypeError('failed to fetch'), 'no-network'],
    ['a page of the network in between', new Response('<html>sign in</html>'), 'not-our-server'],
    ['JSON that is not ours', new Response('{"ok":true}'), 'not-our-server'],
    ['an error that is not ours', new Response('{"error":"x"}', { status: 502 }), 'not-our-server'],
    ['an answer', new Response('{"text":"a"}'), { text: 'a' }],
  ])('%s is told apart', async (_, response, expected) => {
    respond(response)
    expect(await outcome()).toEqual(expected)
  })

  test("the server's own words reach the caller", async () => {
    respond(await echoing(new Request(`${ORIGIN}/api/echo`, { method: 'POST' }), { params: Promise.resolve({}) }))
    const called = await call(echo, { body: { text: 'a' } })
    expect(called).toMatchObject({ ok: false, problem: { code: 'foreign-origin', todo: ERRORS['foreign-origin'].todo } })
  })
})
