/** What was met and is being put right on the spot, until it has been looked at again. */
export interface Mending {
  /** The values of the state met, as typed. */
  readonly typed: Readonly<Record<string, string>>
  readonly reason: string
  /** Free text; empty for none. */
  readonly note: string
}

/** Where a walk was left: the screen reopens at the very check, with what had been typed (LOOK, "Interruption-proof"). */
export interface LeftAt {
  readonly place: string
  /** Check id; null for the place's closing sentence. */
  readonly check: string | null
  readonly typed: Readonly<Record<string, string>>
  /** Kept too: a repair that a reload forgot would be recorded as if nothing had been wrong. */
  readonly mending: Mending | null
  /** Hashes of the photographs taken for the answer; the pictures lie in the device's own store. */
  readonly photos: readonly string[]
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
  // What an older build remembered knows of no photographs.
  const whole = isObject(left) ? { photos: [], ...left } : left
  return isLeftAt(whole) ? whole : null
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
  if (!isObject(value)) return false
  const { place, check, typed, mending, photos, at } = value
  const isAnswer = isTyped(typed) && (mending === null || isMending(mending)) && Array.isArray(photos) && photos.every(isText)
  return isText(place) && (check === null || isText(check)) && isAnswer && isTime(at)
}

function isMending(value: unknown): boolean {
  return isObject(value) && isTyped(value['typed']) && isText(value['reason']) && isText(value['note'])
}

function isTyped(value: unknown): boolean {
  return isObject(value) && Object.values(value).every(isText)
}

function isObject(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null
}

function isText(value: unknown): boolean {
  return typeof value === 'string'
}

function isTime(value: unknown): boolean {
  return typeof value === 'number'
}
