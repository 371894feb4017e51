/** Locks by name within one page: first come, first served. */
export interface LockQueue {
  readonly lock: <T>(name: string, work: () => Promise<T>) => Promise<T>
  readonly tryLock: <T>(name: string, work: () => Promise<T>) => Promise<T | null>
}

/** For tests, and for browsers without Web Locks: there it keeps one tab in order, and the counter's `expect` guards the rest. */
export function lockQueue(): LockQueue {
  const tails = new Map<string, Promise<unknown>>()

  function lock<T>(name: string, work: () => Promise<T>): Promise<T> {
    const before = tails.get(name) ?? Promise.resolve()
    const mine = before.then(work, work)
    // The tail never rejects: whoever waits behind a failed holder still gets the lock.
    const tail = mine.then(noop, noop).then(() => {
      if (tails.get(name) === tail) tails.delete(name)
    })
    tails.set(name, tail)
    return mine
  }

  async function tryLock<T>(name: string, work: () => Promise<T>): Promise<T | null> {
    return tails.has(name) ? null : lock(name, work)
  }

  return { lock, tryLock }
}

function noop(): void {}
