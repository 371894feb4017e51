const FIRST_MINUTES = 1
const LONGEST_MINUTES = 120
/** With these the last try comes about a day after the first. */
const MOST_TRIES = 18

/**
 * How long to wait after the `tries`-th failed try, ms: doubling from one minute to two hours, spread by a quarter to both sides by `random`
 * (0 to 1, handed in); null when it is given up, about a day after the first try.
 */
export function nextTry(tries: number, random: number): number | null {
  if (tries > MOST_TRIES) return null
  const minutes = Math.min(LONGEST_MINUTES, FIRST_MINUTES * 2 ** Math.max(0, tries - 1))
  return Math.round(minutes * 60_000 * (0.75 + 0.5 * random))
}
