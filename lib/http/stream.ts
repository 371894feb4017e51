import 'server-only'
import * as z from 'zod/mini'
import type { Contract } from '@/lib/contracts/contract'
import type { ActorFor, StreamCommand } from '@/lib/platform/command'
import { isRefusal } from '@/lib/platform/refusal'
import { enter } from './enter'
import { faultOf } from './fault'
import { problemResponse } from './problem-response'
import type { RouteHandler } from './server'

/** Often enough that no proxy takes a quiet stream for a dead one, and that a dead one is noticed. */
export const HEARTBEAT_MS = 15_000

/** As `handle`, for server-sent events: one `data:` line of the contract's response shape each time the command yields. */
export function handleStream<C extends Contract>(contract: C, command: StreamCommand<C>): RouteHandler {
  return async function handler(request, context) {
    try {
      const entered = await enter(contract, request, context)
      if (isRefusal(entered)) return problemResponse(entered)
      const { input, actor, deps } = entered
      const source = await command(input, actor as ActorFor<C['auth']>, deps)
      if (isRefusal(source)) return problemResponse(source)
      const headers = {
        'content-type': 'text/event-stream; charset=utf-8',
        // Without no-transform a compressing proxy, Next's own among them, keeps events back until it has enough of them.
        'cache-control': 'no-store, no-transform',
        'x-accel-buffering': 'no',
      }
      return new Response(events(contract, source, deps.signal), { status: 200, headers })
    } catch (error) {
      return problemResponse(faultOf(error, contract.name))
    }
  }
}

function events(contract: Contract, source: AsyncIterable<unknown>, signal: AbortSignal): ReadableStream<Uint8Array> {
  const encoder = new TextEncoder()
  const iterator = source[Symbol.asyncIterator]()
  let heartbeat: ReturnType<typeof setInterval> | undefined
  async function stop(): Promise<void> {
    clearInterval(heartbeat)
    await iterator.return?.()
  }
  return new ReadableStream<Uint8Array>({
    start(controller) {
      const beat = () => controller.enqueue(encoder.encode(': still here\n\n'))
      beat()
      heartbeat = setInterval(beat, HEARTBEAT_MS)
      signal.addEventListener('abort', () => void stop(), { once: true })
    },
    async pull(controller) {
      try {
        const next = await iterator.next()
        if (!next.done) {
          controller.enqueue(encoder.encode(`data: ${JSON.stringify(z.parse(contract.response, next.value))}\n\n`))
          return
        }
        clearInterval(heartbeat)
        if (!signal.aborted) controller.close()
      } catch (error) {
        clearInterval(heartbeat)
        faultOf(error, contract.name)
        controller.error(error)
      }
    },
    cancel: stop,
  })
}
