import { uuidv7 } from 'uuidv7'
import { sha256Hex } from '@/lib/checklist/hash'
import type { DayTools } from './day-tools'

/** The real clock, ids, hash, randomness and timers of a browser. */
export const browserTools: DayTools = {
  now: () => Date.now(),
  newId: uuidv7,
  sha256: sha256Hex,
  randomBytes: (count) => crypto.getRandomValues(new Uint8Array(count)),
  random: () => Math.random(),
  setTimer: (work, ms) => setTimeout(work, ms),
  clearTimer: (timer) => clearTimeout(timer as ReturnType<typeof setTimeout>),
}
