import { fileURLToPath } from 'node:url'
import type { Contract } from '@/lib/contracts/contract'
import type { RouteHandler } from '@/lib/http/server'

/** The route handler that stands where a contract says. */
export async function handlerOf({ path, method }: Pick<Contract, 'path' | 'method'>): Promise<RouteHandler> {
  const file = fileURLToPath(new URL(`../../app${path}/route.ts`, import.meta.url))
    .replaceAll('%5B', '[')
    .replaceAll('%5D', ']')
  const route = (await import(/* @vite-ignore */ file)) as Record<string, RouteHandler | undefined>
  const handler = route[method]
  if (!handler) throw new Error(`no ${method} in app${path}/route.ts`)
  return handler
}
