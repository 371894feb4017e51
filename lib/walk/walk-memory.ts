/** Where a walk was left: the screen reopens at the very check, with what had been typed (LOOK, "Interruption-proof"). */
export interface LeftAt {
  readonly place: string
  readonly check: string | null
  readonly values: Readonly<Record<string, string>>
  /** Device clock, ms. */
  readonly at: number
}

/** Where such memory is kept; a browser's localStorage fits. */
export interface TextStore {
  readonly getItem: (key: string) => string | null
  readonly setItem: (key: string, value: string) => void
  readonly removeItem: (key: string) => void
}

const keyOf = (subject: string) => `lockwire.walk.${subject}`

/** Remembers where the walk of a subject stands. Only a convenience: nothing recorded depends on it, so a full store is no harm. */
export function rememberWalk(store: TextStore, subject: string, left: LeftAt): void {
  // Without room the walk opens at its first hole instead.
  attempt(() => store.setItem(keyOf(subject), JSON.stringify(left)), undefined)
}

/** Where the walk of a subject was left; null when it never was, or the memory cannot be read. */
export function recallWalk(store: TextStore, subject: string): LeftAt | null {
  const left = attempt<unknown>(() => JSON.parse(store.getItem(keyOf(subject)) ?? 'null'), null)
  return isLeftAt(left) ? left : null
}

/** Forgets it, when the walk is done. */
export function forgetWalk(store: TextStore, subject: string): void {
  attempt(() => store.removeItem(keyOf(subject)), undefined)
}

/** Does it, or gives `otherwise` where the store is full, closed to us, or holds what is no JSON. */
function attempt<T>(work: () => T, otherwise: T): T {
  try {
    return work()
  } catch {
    return otherwise
  }
}

function isLeftAt(value: unknown): value is LeftAt {
  if (typeof value !== 'object' || value === null) return false
  const { place, check, values, at } = value as Partial<Record<keyof LeftAt, unknown>>
  const isText = (text: unknown) => typeof text === 'string'
  return (
    isText(place) &&
    (check === null || isText(check)) &&
    typeof at === 'number' &&
    typeof values === 'object' &&
    values !== null &&
    Object.values(values).every(isText)
  )
}
