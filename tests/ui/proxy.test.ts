import { NextRequest } from 'next/server'
import { expect, test, vi } from 'vitest'
import { config, contentSecurityPolicy, proxy } from '@/proxy'

const page = (path: string, init: { method?: string; headers?: Record<string, string> } = {}) =>
  proxy(new NextRequest(`http://localhost:3000${path}`, init))

test('every page gets a nonce of its own, and the same one reaches the page', () => {
  const [one, other] = [page('/'), page('/')]
  const nonce = /'nonce-([^']+)'/.exec(one.headers.get('content-security-policy') ?? '')?.[1]

  expect(nonce).toMatch(/^[A-Za-z0-9+/]{22}==$/)
  expect(one.headers.get('x-middleware-request-x-nonce')).toBe(nonce)
  expect(other.headers.get('content-security-policy')).not.toContain(nonce)
})

test('a nonce sent by the visitor is not taken', () => {
  expect(page('/', { headers: { 'x-nonce': 'mine' } }).headers.get('x-middleware-request-x-nonce')).not.toBe('mine')
})

test.each([
  ['/bay', true],
  ['/bay/cars/1', true],
  ['/pit-exit', true],
  ['/sign-on', true],
  ['/', false],
  ['/sign-in', false],
  ['/events/bay', false],
])('%s may run the decoder: %s', (path, may) => {
  expect(page(path).headers.get('content-security-policy')?.includes("'wasm-unsafe-eval'")).toBe(may)
})

test('nothing inline, no eval and no frame in the built app', () => {
  const policy = contentSecurityPolicy('n', true, false)

  expect(policy).not.toContain("'unsafe-inline'")
  expect(policy).not.toContain("'unsafe-eval'")
  expect(policy).toContain("frame-ancestors 'none'")
  expect(policy).toContain("base-uri 'none'")
})

test('what no page of ours is asked with is refused before any page runs', () => {
  expect(page('/bay', { headers: { 'next-action': 'abc' } }).status).toBe(400)
  expect(page('/bay', { method: 'POST' }).status).toBe(405)
  expect(page('/_next/image?url=%2Fa.png&w=64&q=75').status).toBe(404)
  expect(page('/bay', { method: 'POST' }).headers.get('content-type')).toBe('application/problem+json')
})

test.each([
  ['https://bay.example.org', 'max-age=31536000; includeSubDomains'],
  ['http://localhost:3000', null],
])('from %s the browser is told to stay with https: %s', async (origin, header) => {
  vi.stubEnv('LOCKWIRE_ORIGIN', origin)
  vi.resetModules()
  const { proxy: fresh } = await import('@/proxy')

  expect(fresh(new NextRequest(`${origin}/`)).headers.get('strict-transport-security')).toBe(header)
  vi.unstubAllEnvs()
})

test('uploads never pass through here, where they would be cut: all of /api is outside', () => {
  const matcher = new RegExp(`^${config.matcher[0] ?? ''}$`)

  expect(matcher.test('/api/sync/push')).toBe(false)
  expect(matcher.test('/api/events/e1/import')).toBe(false)
  expect(matcher.test('/sw.js')).toBe(false)
  expect(matcher.test('/_next/static/chunks/a.js')).toBe(false)
  expect(matcher.test('/bay')).toBe(true)
  expect(matcher.test('/_next/image')).toBe(true)
  expect(matcher.test('/p/K7QM')).toBe(true)
})
