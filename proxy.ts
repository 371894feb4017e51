import { type NextRequest, NextResponse } from 'next/server'
import { env } from '@/lib/platform/env'

/** Pages where a camera reads codes: the decoder is WebAssembly, and without this word nothing decodes and no error shows. */
const SCANS = /^\/(?:bay|pit-exit|sign-on)(?:\/|$)/

/** Sets the policy and its nonce on every page and refuses what no page of ours is asked with. It authorises nobody: routes and pages do. */
export function proxy(request: NextRequest): NextResponse {
  // There are no server actions: a request that names one was not made by our pages.
  if (request.headers.has('next-action')) return refuse(400, 'There are no actions at this address.')
  if (request.nextUrl.pathname.startsWith('/_next/image')) return refuse(404, 'Pictures are not resized here.')
  if (request.method !== 'GET' && request.method !== 'HEAD') return refuse(405, 'Pages are only read. Nothing was changed.')

  const nonce = Buffer.from(crypto.getRandomValues(new Uint8Array(16))).toString('base64')
  const policy = contentSecurityPolicy(nonce, SCANS.test(request.nextUrl.pathname))
  const headers = new Headers(request.headers)
  headers.set('x-nonce', nonce)
  headers.set('content-security-policy', policy) // Next reads its nonce from here
  const response = NextResponse.next({ request: { headers } })
  response.headers.set('content-security-policy', policy)
  if (isHttps()) response.headers.set('strict-transport-security', 'max-age=31536000; includeSubDomains')
  return response
}

/** The policy of a page. `next dev` needs eval for its refresh and inline styles for its overlay; the built app has neither. */
export function contentSecurityPolicy(nonce: string, scans: boolean, dev = process.env.NODE_ENV === 'development'): string {
  const script = [
    "'self'",
    `'nonce-${nonce}'`,
    "'strict-dynamic'",
    ...(scans ? ["'wasm-unsafe-eval'"] : []),
    ...(dev ? ["'unsafe-eval'"] : []),
  ]
  const style = dev ? ["'self'", "'unsafe-inline'"] : ["'self'", `'nonce-${nonce}'`]
  return [
    "default-src 'self'",
    `script-src ${script.join(' ')}`,
    `style-src ${style.join(' ')}`,
    "img-src 'self' data: blob:",
    "media-src 'self' blob:",
    "font-src 'self'",
    `connect-src 'self'${dev ? ' ws:' : ''}`,
    "worker-src 'self'",
    "manifest-src 'self'",
    "object-src 'none'",
    "frame-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ')
}

/** From the configured origin, never from the request: in front of us may stand a proxy that ends TLS. */
function isHttps(): boolean {
  return env().origin.startsWith('https:')
}

function refuse(status: number, detail: string): NextResponse {
  return NextResponse.json(
    { type: 'about:blank', title: 'Refused', status, detail },
    { status, headers: { 'content-type': 'application/problem+json' } },
  )
}

export const config = {
  // All of /api stays outside: a body over 10 MB would arrive there silently cut, and each route has its own door.
  matcher: ['/((?!api/|_next/static/|icons/|wasm/|sw\\.js$|theme\\.js$|manifest\\.webmanifest$).*)'],
}
