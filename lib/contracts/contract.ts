import * as z from 'zod/mini'
import type { Action } from '@/lib/permissions/policy'

/**
 * Who may knock at all. `public`: anybody, a sign-in is looked at where there is one. `session`: a sign-in.
 * `device`: an enrolled device by its signed request token. `either`: one of the two.
 */
export type Auth = 'public' | 'session' | 'device' | 'either'
export type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE'

/** How often one account or device (for `public`: one network address) may ask. */
export interface Rate {
  readonly times: number
  readonly perSeconds: number
}

export const NOTHING = z.strictObject({})
type Nothing = typeof NOTHING
/** The response of a download: bytes, with no shape of ours. */
export const FILE = z.unknown()
type Shape = z.ZodMiniType

/** One endpoint, written once for server and client: where it is, who may, how much, and what crosses. */
export interface Contract<
  P extends Shape = Shape,
  Q extends Shape = Shape,
  B extends Shape = Shape,
  R extends Shape = Shape,
  A extends Auth = Auth,
> {
  /** Unique and stable; names its rate limiter and its operation. */
  readonly name: string
  readonly method: Method
  /** Next's own notation: `/api/events/[event]/crew`. Where it has `[event]`, roles are those held at that event. */
  readonly path: string
  readonly auth: A
  /** The line of POLICY that must allow it; `public` where the command itself asks for a secret. */
  readonly action: Action | 'public'
  /** A device that is retired or reported lost may still ask, with the roles of its enrolment: its stops must arrive. */
  readonly evenRetired: boolean
  /** Largest request body, bytes; 0 for none. */
  readonly limitBytes: number
  readonly rate: Rate
  readonly params: P
  readonly query: Q
  readonly body: B
  /** What a success sends; each event's data for a stream. */
  readonly response: R
}

interface Definition<P extends Shape, Q extends Shape, B extends Shape, R extends Shape, A extends Auth> {
  readonly name: string
  readonly method: Method
  readonly path: string
  readonly auth: A
  readonly action: Action | 'public'
  readonly evenRetired?: boolean
  readonly limitBytes: number
  readonly rate: Rate
  readonly params?: P
  readonly query?: Q
  readonly body?: B
  readonly response: R
}

/** Declares a contract; what it leaves out is empty and refuses everything. */
export function contract<R extends Shape, A extends Auth, P extends Shape = Nothing, Q extends Shape = Nothing, B extends Shape = Nothing>(
  definition: Definition<P, Q, B, R, A>,
): Contract<P, Q, B, R, A> {
  return {
    ...definition,
    evenRetired: definition.evenRetired ?? false,
    params: definition.params ?? (NOTHING as unknown as P),
    query: definition.query ?? (NOTHING as unknown as Q),
    body: definition.body ?? (NOTHING as unknown as B),
  }
}

/** What a command is given: every part parsed. */
export interface InputOf<C extends Contract> {
  readonly params: z.output<C['params']>
  readonly query: z.output<C['query']>
  readonly body: z.output<C['body']>
}
export type OutputOf<C extends Contract> = z.input<C['response']>
/** What a caller gets. */
export type AnswerOf<C extends Contract> = z.output<C['response']>
/** What a caller gives; a part that is empty may be left out. */
export type CallInput<C extends Contract> = Part<'params', z.input<C['params']>> &
  Part<'query', z.input<C['query']>> &
  Part<'body', z.input<C['body']>>
// The strict empty object is Record<string, never> to the type system.
type Part<Name extends string, T> = string extends keyof T ? { readonly [N in Name]?: T } : { readonly [N in Name]: T }
