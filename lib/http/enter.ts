import 'server-only'
import type { Contract, InputOf } from '@/lib/contracts/contract'
import type { Actor } from '@/lib/platform/actor'
import { now } from '@/lib/platform/clock'
import type { Deps } from '@/lib/platform/command'
import { env } from '@/lib/platform/env'
import { isRefusal, type Refusal, refuse } from '@/lib/platform/refusal'
import { servedDatabase } from '@/lib/platform/served-database'
import { isAllowed } from './allow'
import { checkOrigin } from './check-origin'
import { findActor } from './find-actor'
import { parseInput } from './parse-input'
import { takeFromAllowance } from './rate'
import { readBody } from './read-body'

/** As Next gives it to a route handler; for a path without a variable part it resolves to undefined, whatever Next's own type says. */
export interface RouteContext {
  readonly params: Promise<object | undefined>
}

export interface Entered<C extends Contract> {
  readonly input: InputOf<C>
  /** What was sent, as it came: what an upload is made of. */
  readonly bytes: Uint8Array
  readonly actor: Actor
  readonly deps: Deps
}

/**
 * The one door, in this order: size → origin → actor → may they → rate → strict parse. Whether they may is asked before anything is
 * looked up, so that an answer never tells somebody without the right what exists. The bytes of an `upload` are nobody's JSON and are not parsed.
 */
export async function enter<C extends Contract>(
  contract: C,
  request: Request,
  context: RouteContext,
  sent: 'json' | 'upload' = 'json',
): Promise<Entered<C> | Refusal> {
  const [database, instant, { origin }] = [servedDatabase(), now(), env()]
  const bytes = await readBody(request, contract.limitBytes)
  if (isRefusal(bytes)) return bytes
  const foreign = checkOrigin(request, contract, origin)
  if (foreign) return foreign
  const actor = await findActor(request, contract, bytes, database, instant)
  if (isRefusal(actor)) return actor
  // A path without a variable part comes with no params at all.
  const params = ((await context.params) ?? {}) as Readonly<Record<string, unknown>>
  const eventId = typeof params.event === 'string' ? params.event : null
  if (!isAllowed(database, contract, actor, eventId)) return refuse('forbidden')
  const limited = await takeFromAllowance(request, contract, actor)
  if (limited) return limited
  const input = parseInput(contract, request, params, sent === 'json' ? bytes : new Uint8Array())
  if (isRefusal(input)) return input
  const deps: Deps = {
    database,
    now: instant,
    origin,
    userAgent: request.headers.get('user-agent') ?? '',
    cookie: request.headers.get('cookie') ?? '',
    replyHeaders: new Headers(),
    signal: request.signal,
  }
  return { input, bytes, actor, deps }
}
