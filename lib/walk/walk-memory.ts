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
  try {
    store.setItem(keyOf(subject), JSON.stringify(left))
  } catch {
    // Without room the walk opens at its first hole instead.
  }
}

/** Where the walk of a subject was left; null when it never was, or the memory cannot be read. */
export function recallWalk(store: TextStore, subject: string): LeftAt | null {
  try {
    const left: unknown = JSON.parse(store.getItem(keyOf(subject)) ?? 'null')
    return isLeftAt(left) ? left : null
  } catch {
    return null
  }
}

/** Forgets it, when the walk is done. */
export function forgetWalk(store: TextStore, subject: string): void {
  try {
    store.removeItem(keyOf(subject))
  } catch {
    // Nothing to forget where nothing can be kept.
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
