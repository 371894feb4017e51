import 'server-only'
import { RateLimiterMemory, RateLimiterRes } from 'rate-limiter-flexible'
import { sha256 } from '@/lib/platform/sha256'

/** Wrong tries for one e-mail before it has to wait, and how long it waits. */
export const WRONG_TRIES = 10
export const WAIT_SECONDS = 15 * 60

// By e-mail, known or not, so that the answer tells nothing; never by address, which a whole paddock shares.
let tries = newLimiter()

/** Counts a try before the password is looked at, so that tries at the same moment cannot slip past; seconds to wait, or 0. */
export async function countTry(email: string): Promise<number> {
  try {
    await tries.consume(sha256(email))
    return 0
  } catch (error) {
    if (!(error instanceof RateLimiterRes)) throw error
    return Math.max(1, Math.ceil(error.msBeforeNext / 1000))
  }
}

/** A right password wipes the wrong tries. */
export async function forgetTries(email: string): Promise<void> {
  await tries.delete(sha256(email))
}

/** Forgets everything; for tests. */
export function resetTries(): void {
  tries = newLimiter()
}

function newLimiter(): RateLimiterMemory {
  return new RateLimiterMemory({ keyPrefix: 'sign-in', points: WRONG_TRIES, duration: WAIT_SECONDS })
}
