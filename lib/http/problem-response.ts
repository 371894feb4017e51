import 'server-only'
import type { Problem } from '@/lib/contracts/problem'
import { now } from '@/lib/platform/clock'
import type { Refusal } from '@/lib/platform/refusal'
import { ERRORS } from './errors'

/** A refusal as `application/problem+json` (RFC 9457). */
export function problemResponse(refusal: Refusal): Response {
  const words = ERRORS[refusal.code]
  const body: Problem = {
    type: 'about:blank',
    title: refusal.details.what ?? words.what,
    status: words.status,
    code: refusal.code,
    what: refusal.details.what ?? words.what,
    kept: refusal.details.kept ?? words.kept,
    todo: refusal.details.todo ?? words.todo,
    issues: [...(refusal.details.issues ?? [])],
    serverTime: now(),
  }
  const headers = new Headers({ 'content-type': 'application/problem+json', 'cache-control': 'no-store' })
  if (refusal.details.retryAfterSeconds !== undefined) headers.set('retry-after', String(refusal.details.retryAfterSeconds))
  return new Response(JSON.stringify(body), { status: words.status, headers })
}
