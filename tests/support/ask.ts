import type { Problem } from '@/lib/contracts/problem'
import type { RouteHandler } from '@/lib/http/server'

export const ORIGIN = 'http://localhost:3000'

export interface Asked {
  readonly method?: string
  readonly path?: string
  readonly params?: Readonly<Record<string, string>>
  readonly body?: unknown
  /** Bytes as they are, instead of a body made to JSON. */
  readonly raw?: BodyInit
  readonly headers?: Readonly<Record<string, string>>
  /** null: no origin header at all. */
  readonly origin?: string | null
  readonly cookie?: string
}

export interface Answer<T> {
  readonly status: number
  /** As the test expects it: the contract's own parsing is under test, so it is not used to read it. */
  readonly json: T
  readonly headers: Headers
  /** The cookie to send back, from `set-cookie`. */
  readonly cookie: string
}

/** Asks a route handler as a browser on our own origin would, unless told otherwise. */
export async function ask<T = Problem>(handler: RouteHandler, asked: Asked = {}): Promise<Answer<T>> {
  const { method = 'GET', path = '/api/x', params, origin = ORIGIN } = asked
  const text = asked.raw ?? (asked.body === undefined ? undefined : JSON.stringify(asked.body))
  const headers = new Headers({ 'content-type': 'application/json', ...asked.headers })
  if (origin !== null) headers.set('origin', origin)
  if (asked.cookie) headers.set('cookie', asked.cookie)
  const init: RequestInit & { duplex?: 'half' } = { method, headers }
  if (text !== undefined) Object.assign(init, { body: text, duplex: 'half' })
  const response = await handler(new Request(`${ORIGIN}${path}`, init), { params: Promise.resolve(params) })
  const cookie = (response.headers.get('set-cookie') ?? '').split(';')[0] ?? ''
  // A file is no JSON; what a test then looks at is its status.
  const isJson = response.headers.get('content-type')?.includes('json') ?? false
  return { status: response.status, json: (isJson ? await response.json() : {}) as T, headers: response.headers, cookie }
}
