import 'server-only'
import type { Contract } from '@/lib/contracts/contract'
import type { ActorFor, DownloadCommand, FileAnswer } from '@/lib/platform/command'
import { isRefusal } from '@/lib/platform/refusal'
import { enter } from './enter'
import { faultOf } from './fault'
import { problemResponse } from './problem-response'
import type { RouteHandler } from './server'

/** How long the asker's own browser may keep a file that never changes, seconds: short enough that what was erased is gone tomorrow. */
const KEPT_SECONDS = 86_400

/** As `handle`, for one file: the same order of checks, and a browser never makes another type of it than the one named. */
export function handleDownload<C extends Contract>(contract: C, command: DownloadCommand<C>): RouteHandler {
  return async function handler(request, context) {
    try {
      const entered = await enter(contract, request, context)
      if (isRefusal(entered)) return problemResponse(entered)
      const { input, actor, deps } = entered
      const file = await command(input, actor as ActorFor<C['auth']>, deps)
      if (isRefusal(file)) return problemResponse(file)
      const headers = headersOf(file)
      // The right to see it was asked anew above, so an unchanged file need not travel again.
      if (file.etag !== null && request.headers.get('if-none-match') === headers.get('etag')) {
        return new Response(null, { status: 304, headers })
      }
      headers.set('content-length', String(file.bytes.byteLength))
      return new Response(new Uint8Array(file.bytes), { status: 200, headers })
    } catch (error) {
      return problemResponse(faultOf(error, contract.name))
    }
  }
}

function headersOf({ type, saveAs, etag }: FileAnswer): Headers {
  const headers = new Headers({
    'content-type': type,
    'x-content-type-options': 'nosniff',
    'content-security-policy': "default-src 'none'; frame-ancestors 'none'",
    'cache-control': etag === null ? 'no-store' : `private, max-age=${KEPT_SECONDS}, immutable`,
  })
  if (etag !== null) {
    headers.set('etag', `"${etag}"`)
    // Two people may share one browser: what one may see is not kept for the other.
    headers.set('vary', 'cookie, authorization')
  }
  if (saveAs !== null) headers.set('content-disposition', `attachment; filename*=UTF-8''${encodeURIComponent(saveAs)}`)
  return headers
}
