export interface Row {
  readonly what: string
  readonly value: string
  readonly aim?: string
  readonly met?: boolean
}

/** Hands a measured row to `scripts/bench.mjs`. */
export function row(measured: Row): void {
  process.stdout.write(`${JSON.stringify(measured)}\n`)
}

/** The middle of some figures; the upper of the two middle ones where there are two. */
export function median(figures: readonly number[]): number {
  const sorted = [...figures].sort((a, b) => a - b)
  const middle = sorted[Math.floor(sorted.length / 2)]
  if (middle === undefined) throw new Error('there is no median of no figures')
  return middle
}

/** How long each of `rounds` runs took, ms, after `warmUp` runs that do not count. */
export function timed(work: () => unknown, rounds: number, warmUp: number): readonly number[] {
  for (let round = 0; round < warmUp; round++) work()
  return Array.from({ length: rounds }, () => {
    const began = performance.now()
    work()
    return performance.now() - began
  })
}
