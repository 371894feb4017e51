/** A radio read-back as this device heard it (rule P5). */
export interface HeardReadBack {
  /** Corrected clock, ms. */
  readonly at: number
  readonly numbers: readonly string[]
  readonly agrees: boolean
}

/** What the marshal told this device and no record says. It only ever adds blocks or doubts; losing it makes the pit exit stricter, never milder. */
export interface PitMemory {
  /** Group id, or `ANY_GROUP`; null while nobody said. */
  readonly runningGroup: string | null
  readonly readBacks: readonly HeardReadBack[]
}

export const EMPTY_PIT_MEMORY: PitMemory = { runningGroup: null, readBacks: [] }

type TextStore = Pick<Storage, 'getItem' | 'setItem'>

const keyOf = (event: string, device: string) => `lockwire.pit.${event}.${device}`

/** Keeps it over a reload; says whether it could. */
export function rememberPit(store: TextStore, event: string, device: string, memory: PitMemory): boolean {
  try {
    store.setItem(keyOf(event, device), JSON.stringify(memory))
    return true
  } catch {
    // A full or closed store: it holds until this page is left.
    return false
  }
}

/** What was kept; empty where nothing was or it cannot be read. */
export function recallPit(store: TextStore, event: string, device: string): PitMemory {
  try {
    const kept: unknown = JSON.parse(store.getItem(keyOf(event, device)) ?? 'null')
    return isPitMemory(kept) ? kept : EMPTY_PIT_MEMORY
  } catch {
    return EMPTY_PIT_MEMORY
  }
}

function isPitMemory(value: unknown): value is PitMemory {
  if (typeof value !== 'object' || value === null) return false
  const { runningGroup, readBacks } = value as Partial<Record<keyof PitMemory, unknown>>
  return (runningGroup === null || typeof runningGroup === 'string') && Array.isArray(readBacks) && readBacks.every(isHeard)
}

function isHeard(value: unknown): value is HeardReadBack {
  if (typeof value !== 'object' || value === null) return false
  const { at, numbers, agrees } = value as Partial<Record<keyof HeardReadBack, unknown>>
  return typeof at === 'number' && typeof agrees === 'boolean' && Array.isArray(numbers) && numbers.every((one) => typeof one === 'string')
}
