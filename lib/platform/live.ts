import 'server-only'

/** Called when something of the event has changed; carries nothing, who hears it pulls (rule S8). */
type Listener = () => void

// Next bundles routes apart; all of them must meet the same listeners.
const holder = globalThis as typeof globalThis & { lockwireListeners?: Map<string, Set<Listener>> }

function listeners(): Map<string, Set<Listener>> {
  holder.lockwireListeners ??= new Map()
  return holder.lockwireListeners
}

/** Tells everybody who listens that this event has changed. Call it after the commit, never inside the transaction. */
export function announce(eventId: string): void {
  for (const listener of listeners().get(eventId) ?? []) listener()
}

/** Listens to an event until the returned function is called. */
export function listen(eventId: string, listener: Listener): () => void {
  const all = listeners()
  const own = all.get(eventId) ?? new Set()
  all.set(eventId, own.add(listener))
  return () => {
    own.delete(listener)
    if (own.size === 0) all.delete(eventId)
  }
}

/** Yields at once and then each time the event has changed, several changes at once as one, until the signal aborts. For streams. */
export async function* changesOf(eventId: string, signal: AbortSignal): AsyncGenerator<undefined> {
  let [changed, wake] = [true, () => {}]
  const notice = () => {
    changed = true
    wake()
  }
  const stop = listen(eventId, notice)
  signal.addEventListener('abort', notice, { once: true })
  try {
    while (!signal.aborted) {
      if (!changed) await new Promise<void>((resolve) => (wake = resolve))
      if (signal.aborted) return
      changed = false
      yield undefined
    }
  } finally {
    stop()
    signal.removeEventListener('abort', notice)
  }
}
