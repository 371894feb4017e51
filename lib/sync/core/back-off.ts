const FIRST_MS = 1_000
const LONGEST_MS = 60_000

/**
 * How long to wait after `failures` failures in a row, ms: doubling from one second to one minute, spread over half to all of it by `random`
 * (0 to 1, handed in), so that forty phones that lost one access point do not come back in one second.
 */
export function backOffMs(failures: number, random: number): number {
  const full = Math.min(LONGEST_MS, FIRST_MS * 2 ** Math.max(0, failures - 1))
  return Math.round(full / 2 + (full / 2) * random)
}
