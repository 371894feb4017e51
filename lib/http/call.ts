import * as z from 'zod/mini'
import type { AnswerOf, CallInput, Contract } from '@/lib/contracts/contract'
import { type Problem, problem, type ProblemCode } from '@/lib/contracts/problem'
import { ERRORS } from './errors'

/** What a call came to. A problem is a value: its words are made to be shown as they are. */
export type Called<T> = { readonly ok: true; readonly value: T } | { readonly ok: false; readonly problem: Problem }

export interface CallOptions {
  readonly headers?: Readonly<Record<string, string>>
  readonly signal?: AbortSignal
}

/** Asks the server by a contract, with the sign-in's cookie. Never throws but for an abort: no network and foreign answers are problems too. */
export function call<C extends Contract>(contract: C, input: CallInput<C>, options: CallOptions = {}): Promise<Called<AnswerOf<C>>> {
  const { body } = input as { body?: object }
  return ask(contract, input, body === undefined ? null : { type: 'application/json', data: JSON.stringify(body) }, options)
}

/** As `call`, for a contract that takes bytes which are no JSON. */
export function upload<C extends Contract>(
  contract: C,
  input: CallInput<C>,
  bytes: Blob,
  options: CallOptions = {},
): Promise<Called<AnswerOf<C>>> {
  return ask(contract, input, { type: bytes.type, data: bytes }, options)
}

async function ask<C extends Contract>(
  contract: C,
  input: CallInput<C>,
  body: { readonly type: string; readonly data: string | Blob } | null,
  options: CallOptions,
): Promise<Called<AnswerOf<C>>> {
  const { params, query } = input as { params?: object; query?: object }
  let response: Response
  try {
    response = await fetch(urlOf(contract, params ?? {}, query ?? {}), {
      method: contract.method,
      credentials: 'same-origin',
      cache: 'no-store',
      headers: { accept: 'application/json', ...(body ? { 'content-type': body.type } : {}), ...options.headers },
      ...(body ? { body: body.data } : {}),
      ...(options.signal ? { signal: options.signal } : {}),
    })
  } catch (error) {
    if (options.signal?.aborted) throw error
    return failed('no-network')
  }
  return readAnswer(contract, response)
}

/** As `call`, throwing a `CallProblem`: the form swr wants. `useSWR(key, () => callOrThrow(contract, input))`. */
export async function callOrThrow<C extends Contract>(contract: C, input: CallInput<C>, options: CallOptions = {}): Promise<AnswerOf<C>> {
  const called = await call(contract, input, options)
  if (!called.ok) throw new CallProblem(called.problem)
  return called.value
}

export class CallProblem extends Error {
  override readonly name = 'CallProblem'
  constructor(readonly problem: Problem) {
    super(problem.what)
  }
}

/** The address of a call: path parts filled in, query added. */
export function urlOf(contract: Contract, params: object, query: object): string {
  const parts = new Map(Object.entries(params).map(([name, value]) => [name, String(value)]))
  const path = contract.path.replaceAll(/\[([^\]]+)\]/g, (_, name: string) => encodeURIComponent(parts.get(name) ?? ''))
  const search = new URLSearchParams(Object.entries(query).flatMap(([name, value]) => (value === undefined ? [] : [[name, String(value)]])))
  return search.size > 0 ? `${path}?${search}` : path
}

async function readAnswer<C extends Contract>(contract: C, response: Response): Promise<Called<AnswerOf<C>>> {
  let json: unknown
  try {
    json = await response.json()
  } catch {
    // A network's own page, or an answer cut short: not ours.
    return failed('not-our-server')
  }
  if (response.ok) {
    const read = z.safeParse(contract.response, json)
    return read.success ? { ok: true, value: read.data as AnswerOf<C> } : failed('not-our-server')
  }
  const read = problem.safeParse(json)
  return read.success ? { ok: false, problem: read.data } : failed('not-our-server')
}

function failed(code: ProblemCode): { readonly ok: false; readonly problem: Problem } {
  const { status, what, kept, todo } = ERRORS[code]
  return { ok: false, problem: { type: 'about:blank', title: what, status, code, what, kept, todo, issues: [], serverTime: 0 } }
}
