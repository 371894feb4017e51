import 'server-only'
import * as z from 'zod/mini'
import type { Contract, InputOf } from '@/lib/contracts/contract'
import { isRefusal, type Refusal, refuse } from '@/lib/platform/refusal'
import { parseJson } from './parse-json'

/** Everything the contract takes from a request, strictly; an id in the path that cannot be one is `missing`, as any other that is not there. */
export function parseInput<C extends Contract>(
  contract: C,
  request: Request,
  params: Readonly<Record<string, unknown>>,
  bytes: Uint8Array,
): InputOf<C> | Refusal {
  const path = z.safeParse(contract.params, params)
  if (!path.success) return refuse('missing')
  const query = z.safeParse(contract.query, queryOf(request))
  if (!query.success) return invalid(query.error.issues)
  if (bytes.byteLength > 0 && !isJson(request)) return refuse('not-json')
  const json = parseJson(bytes)
  if (isRefusal(json)) return json
  const body = z.safeParse(contract.body, json.value)
  if (!body.success) return invalid(body.error.issues)
  return { params: path.data, query: query.data, body: body.data } as InputOf<C>
}

function queryOf(request: Request): Readonly<Record<string, string>> {
  return Object.fromEntries(new URL(request.url).searchParams)
}

function isJson(request: Request): boolean {
  return (request.headers.get('content-type') ?? '').split(';')[0]?.trim().toLowerCase() === 'application/json'
}

function invalid(issues: readonly z.core.$ZodIssue[]): Refusal {
  // No more than fifty: a hostile body must not make a large answer.
  return refuse('invalid', { issues: issues.slice(0, 50).map((issue) => ({ path: issue.path.join('.'), message: issue.message })) })
}
