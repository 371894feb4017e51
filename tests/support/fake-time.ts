/** A clock that moves only when told, with its timers. */
export interface FakeTime {
  now: number
  readonly setTimer: (work: () => void, ms: number) => unknown
  readonly clearTimer: (timer: unknown) => void
  /** Moves on, running what falls due in order, and lets promises settle in between. */
  readonly pass: (ms: number) => Promise<void>
  readonly waiting: () => number
}

export function fakeTime(start: number): FakeTime {
  const timers = new Map<number, { readonly at: number; readonly work: () => void }>()
  let count = 0
  const time: FakeTime = {
    now: start,
    setTimer: (work, ms) => {
      count += 1
      timers.set(count, { at: time.now + ms, work })
      return count
    },
    clearTimer: (timer) => {
      timers.delete(timer as number)
    },
    pass: async (ms) => {
      const end = time.now + ms
      await settle()
      for (;;) {
        const due = [...timers].filter(([, { at }]) => at <= end).sort(([, a], [, b]) => a.at - b.at)[0]
        if (due === undefined) break
        timers.delete(due[0])
        time.now = Math.max(time.now, due[1].at)
        due[1].work()
        await settle()
      }
      time.now = end
    },
    waiting: () => timers.size,
  }
  return time
}

/** Lets whatever is only waiting for promises (signatures included) come to rest. */
async function settle(): Promise<void> {
  for (let turn = 0; turn < 12; turn += 1) await new Promise((resolve) => setImmediate(resolve))
}
