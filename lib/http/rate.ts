import 'server-only'
import { RateLimiterMemory, RateLimiterRes } from 'rate-limiter-flexible'
import type { Contract } from '@/lib/contracts/contract'
import type { Actor } from '@/lib/platform/actor'
import { type Refusal, refuse } from '@/lib/platform/refusal'

const limiters = new Map<string, RateLimiterMemory>()

/**
 * Takes one from the asker's allowance; a refusal when it is used up. Counted by account or device: a paddock shares one network address.
 * Nobody is counted by address, ten times as generously, because a whole crew joins through one.
 */
export async function takeFromAllowance(request: Request, contract: Contract, actor: Actor): Promise<Refusal | null> {
  const key = keyOf(request, actor)
  const points = contract.rate.times * (actor.kind === 'nobody' ? 10 : 1)
  const name = `${contract.name}:${actor.kind === 'nobody' ? 'address' : 'own'}`
  let limiter = limiters.get(name)
  if (!limiter) {
    limiter = new RateLimiterMemory({ keyPrefix: name, points, duration: contract.rate.perSeconds })
    limiters.set(name, limiter)
  }
  try {
    await limiter.consume(key)
    return null
  } catch (error) {
    if (!(error instanceof RateLimiterRes)) throw error
    return refuse('rate-limited', { retryAfterSeconds: Math.max(1, Math.ceil(error.msBeforeNext / 1000)) })
  }
}

function keyOf(request: Request, actor: Actor): string {
  switch (actor.kind) {
    case 'account':
      return `account:${actor.accountId}`
    case 'device':
      return `device:${actor.deviceId}`
    case 'nobody':
      // Whoever forges this header only leaves the common allowance; secrets behind these routes are too long to guess.
      return `address:${request.headers.get('x-forwarded-for') ?? 'unknown'}`
  }
}

/** Forgets all allowances; for tests. */
export function resetAllowances(): void {
  limiters.clear()
}
