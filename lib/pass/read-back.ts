import { sameNumber } from './look-up'
import { hasPassed, isBlocked, isValidOn, livePasses } from './may-run'
import type { ListedEntry, PassList } from './pass-list'
import type { PitBlock } from './pit-device'

/** What is read out on the radio: every number that may not run although it has had a pass, and how many passes live. */
export interface ReadBack {
  readonly numbers: readonly string[]
  readonly livePasses: number
}

/** What the bay reads out of its newer list (rule P5). Both ends count by this, or they would never agree. */
export function readBackOf(list: PassList): ReadBack {
  const numbers = list.entries
    .filter((entry) => hadPass(entry, list.day) && countRunning(entry, list.day) === 0)
    .map(({ number }) => number)
  return { numbers, livePasses: list.entries.reduce((sum, entry) => sum + countRunning(entry, list.day), 0) }
}

export interface ReadBackHeard {
  /** The count agrees: the list counts as fresh from now on. */
  readonly agrees: boolean
  /** Blocks to add to the device's own, whether the count agrees or not. None is ever lifted by what was not named. */
  readonly blocks: readonly PitBlock[]
  /** Numbers that are not on this list: misheard, or newer than it. */
  readonly unknown: readonly string[]
  /** How many live passes this list has, the named ones left out. */
  readonly counted: number
}

/** Hears a read-back against the list of this device, at `at` (ms). The caller records it, and keeps `at` as `readBackAt` where it agrees. */
export function applyReadBack(list: PassList | null, heard: ReadBack, at: number): ReadBackHeard {
  const blocks = heard.numbers.map((number): PitBlock => ({ about: { number }, words: 'named on the radio as not to run', at }))
  if (list === null) return { agrees: false, blocks, unknown: heard.numbers, counted: 0 }
  const isNamed = (entry: ListedEntry) => heard.numbers.some((number) => sameNumber(number, entry.number))
  const unknown = heard.numbers.filter((number) => !list.entries.some((entry) => sameNumber(number, entry.number)))
  const counted = list.entries.filter((entry) => !isNamed(entry)).reduce((sum, entry) => sum + countRunning(entry, list.day), 0)
  return { agrees: unknown.length === 0 && counted === heard.livePasses, blocks, unknown, counted }
}

function hadPass(entry: ListedEntry, day: string): boolean {
  return entry.passes.some((pass) => isValidOn(pass, day))
}

/** Live passes of the day with which the car may run, as far as the car goes. */
function countRunning(entry: ListedEntry, day: string): number {
  return isBlocked(entry) || !hasPassed(entry) ? 0 : livePasses(entry, day).length
}
