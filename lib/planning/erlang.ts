/** A queue in steady flow: arrivals at random, service times at random, some servers alike (M/M/c). */
export interface QueueInSteadyFlow {
  /** Share of the servers' time that is taken, 0 to 1 and over. */
  readonly load: number
  /** Probability that whoever comes must wait (Erlang C). */
  readonly waitProbability: number
  /** Mean number waiting; Infinity where it never settles. */
  readonly meanWaiting: number
  /** Mean wait, minutes; Infinity where it never settles. */
  readonly meanWaitMin: number
  /** Probability of a wait longer than so many minutes. */
  readonly longerThan: (minutes: number) => number
}

/**
 * Probability that all servers are busy where nobody waits (Erlang B), for an offered load in erlangs.
 * By the usual recursion, which neither overflows nor loses digits. Source: A. K. Erlang 1917; recursion in every textbook of teletraffic.
 */
export function erlangB(offered: number, servers: number): number {
  let blocked = 1
  for (let server = 1; server <= servers; server += 1) blocked = (offered * blocked) / (server + offered * blocked)
  return blocked
}

/** Probability of having to wait (Erlang C); 1 where the load is more than the servers can do. */
export function erlangC(offered: number, servers: number): number {
  const load = offered / servers
  if (load >= 1) return 1
  const blocked = erlangB(offered, servers)
  return blocked / (1 - load * (1 - blocked))
}

/** What `servers` who each do `perServerPerHour` make of `arrivalsPerHour`. A flow beyond them never settles: Infinity, never a negative number. */
export function queueInSteadyFlow(arrivalsPerHour: number, perServerPerHour: number, servers: number): QueueInSteadyFlow {
  const offered = arrivalsPerHour / perServerPerHour
  const load = offered / servers
  const waitProbability = erlangC(offered, servers)
  const sparePerHour = servers * perServerPerHour - arrivalsPerHour
  const meanWaitHours = sparePerHour <= 0 ? Number.POSITIVE_INFINITY : waitProbability / sparePerHour
  return {
    load,
    waitProbability,
    meanWaiting: arrivalsPerHour === 0 ? 0 : arrivalsPerHour * meanWaitHours,
    meanWaitMin: meanWaitHours * 60,
    longerThan: (minutes) => (sparePerHour <= 0 ? 1 : waitProbability * Math.exp((-sparePerHour * minutes) / 60)),
  }
}
