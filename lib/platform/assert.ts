/** For what cannot happen: throws with what was true instead. Expected failures are values, not asserts. */
export function assert(condition: unknown, whatWasTrueInstead: string): asserts condition {
  if (!condition) throw new Error(`impossible: ${whatWasTrueInstead}`)
}
