/** Every order of a list of at most six; beyond that, 500 seeded shuffles with the given order and its reverse. */
export function* everyOrder<T>(items: readonly T[], seed: number): Generator<readonly T[]> {
  if (items.length <= 6) {
    yield* permutations(items)
    return
  }
  yield items
  yield [...items].reverse()
  const next = randomFrom(seed)
  for (let round = 0; round < 500; round += 1) yield shuffled(items, next)
}

function* permutations<T>(items: readonly T[]): Generator<readonly T[]> {
  if (items.length <= 1) {
    yield items
    return
  }
  for (const [index, first] of items.entries()) {
    for (const rest of permutations(items.filter((_, other) => other !== index))) yield [first, ...rest]
  }
}

function shuffled<T>(items: readonly T[], next: () => number): readonly T[] {
  const list = [...items]
  for (let last = list.length - 1; last > 0; last -= 1) {
    const other = Math.floor(next() * (last + 1))
    const kept = list[last] as T
    list[last] = list[other] as T
    list[other] = kept
  }
  return list
}

/** A small seeded generator of numbers in [0, 1): the same seed gives the same run everywhere. */
export function randomFrom(seed: number): () => number {
  let state = seed >>> 0
  return () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0
    return state / 2 ** 32
  }
}
