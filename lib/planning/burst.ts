/** What becomes of a burst of arrivals, as a fluid: cars are divisible, people never idle while somebody waits. */
export interface Burst {
  /** Cars waiting at the end of each slot. */
  readonly waiting: readonly number[]
  /** Wait of the last in line at the worst moment, minutes. */
  readonly worstWaitMin: number
  /** Minutes after the last slot until nobody waits. */
  readonly clearsAfterMin: number
}

/** Arrivals per slot of `slotMin` minutes against `people` who take `perCarMin` minutes a car. Source: fluid approximation of a queue, textbook. */
export function burst(arrivals: readonly number[], people: number, perCarMin: number, slotMin: number): Burst {
  const perSlot = (people * slotMin) / perCarMin
  const waiting: number[] = []
  let queue = 0
  for (const cars of arrivals) {
    queue = Math.max(0, queue + cars - perSlot)
    waiting.push(queue)
  }
  const minutes = (cars: number) => (cars * perCarMin) / people
  return { waiting, worstWaitMin: minutes(Math.max(0, ...waiting)), clearsAfterMin: minutes(queue) }
}
