import 'server-only'
import * as z from 'zod/mini'
import type { Contract } from '@/lib/contracts/contract'
import type { ActorFor, Command } from '@/lib/platform/command'
import { isRefusal } from '@/lib/platform/refusal'
import { enter, type RouteContext } from './enter'
import { faultOf } from './fault'
import { problemResponse } from './problem-response'

export type RouteHandler = (request: Request, context: RouteContext) => Promise<Response>

/** Makes a route handler of a contract and the command that answers it: the only way to write one. See `enter` for the order of checks. */
export function handle<C extends Contract>(contract: C, command: Command<C>): RouteHandler {
  return async function handler(request, context) {
    try {
      const entered = await enter(contract, request, context)
      if (isRefusal(entered)) return problemResponse(entered)
      const { input, actor, deps } = entered
      const result = await command(input, actor as ActorFor<C['auth']>, deps)
      if (isRefusal(result)) return problemResponse(result)
      // Parsed on the way out too: what the contract does not name is never sent.
      const body = JSON.stringify(z.parse(contract.response, result))
      deps.replyHeaders.set('content-type', 'application/json')
      deps.replyHeaders.set('cache-control', 'no-store')
      return new Response(body, { status: 200, headers: deps.replyHeaders })
    } catch (error) {
      return problemResponse(faultOf(error, contract.name))
    }
  }
}
