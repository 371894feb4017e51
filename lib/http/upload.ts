import 'server-only'
import * as z from 'zod/mini'
import type { Contract } from '@/lib/contracts/contract'
import type { ActorFor, UploadCommand } from '@/lib/platform/command'
import { isRefusal } from '@/lib/platform/refusal'
import { enter } from './enter'
import { faultOf } from './fault'
import { problemResponse } from './problem-response'
import type { RouteHandler } from './server'

/**
 * As `handle`, for bytes that are no JSON: the same order of checks, the size enforced on the stream. What is sent says nothing by its
 * content type: the command looks at the bytes.
 */
export function handleUpload<C extends Contract>(contract: C, command: UploadCommand<C>): RouteHandler {
  return async function handler(request, context) {
    try {
      const entered = await enter(contract, request, context, 'upload')
      if (isRefusal(entered)) return problemResponse(entered)
      const { input, bytes, actor, deps } = entered
      const result = await command(input, bytes, actor as ActorFor<C['auth']>, deps)
      if (isRefusal(result)) return problemResponse(result)
      const headers = { 'content-type': 'application/json', 'cache-control': 'no-store' }
      return new Response(JSON.stringify(z.parse(contract.response, result)), { status: 200, headers })
    } catch (error) {
      return problemResponse(faultOf(error, contract.name))
    }
  }
}
