/** Runs little of something heavy at once: others wait their turn, and when too much waits the next is told so. */
export interface Turns {
  /** Null at once, without doing it, when more than the allowed weight would be in here. */
  readonly take: <T>(weight: number, work: () => Promise<T>) => Promise<T | null>
}

/** `atOnce` works run beside each other; what runs and waits together weighs at most `mostWeight`, one alone always fits. */
export function turns(atOnce: number, mostWeight: number): Turns {
  const waiting: (() => void)[] = []
  let [running, weighs] = [0, 0]
  return {
    take: async (weight, work) => {
      if (weighs > 0 && weighs + weight > mostWeight) return null
      weighs += weight
      try {
        if (running >= atOnce) await new Promise<void>((go) => waiting.push(go))
        else running += 1
        try {
          return await work()
        } finally {
          // The turn is handed on, so nobody can slip in between.
          const next = waiting.shift()
          if (next) next()
          else running -= 1
        }
      } finally {
        weighs -= weight
      }
    },
  }
}
