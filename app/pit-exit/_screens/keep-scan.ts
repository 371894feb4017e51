import type { PitAnswer } from '@/lib/pass/pit-answer'
import type { DayStatus } from '@/lib/sync/client/day-client'
import type { Asked } from './use-asking'

/** One answer of the pit exit as this device keeps it. What was scanned stands nowhere in it, only the pass it turned out to be. */
export interface KeptScan {
  /** Corrected clock, ms. */
  readonly at: number
  readonly how: 'camera' | 'number' | 'typed'
  readonly answer: PitAnswer['answer']
  readonly code: string
  readonly entry: string | null
  readonly pass: string | null
  /** Persons the marshal tapped; `unnamed` stands for somebody who is not named for the car. */
  readonly aboard: readonly string[]
}

/** The newest answers are kept; older ones make room. */
const MOST_KEPT = 500

/** Keeps an answer on this device. Only a trace of the day: no rule reads it, so a full store loses nothing but it. */
export function keepScan(
  store: Pick<Storage, 'getItem' | 'setItem'>,
  status: Pick<DayStatus, 'event' | 'device' | 'clockOffset'>,
  asked: Asked,
  answer: PitAnswer,
): void {
  const scan: KeptScan = {
    at: Date.now() + status.clockOffset,
    how: asked.ask.how,
    answer: answer.answer,
    code: answer.code,
    entry: answer.entry,
    pass: answer.pass,
    aboard: asked.aboard === null ? [] : [...asked.aboard.people, ...(asked.aboard.unnamed > 0 ? ['unnamed'] : [])],
  }
  const key = `lockwire.scans.${status.event?.id ?? ''}.${status.device.id}`
  const before = keptScans(store, key)
  try {
    store.setItem(key, JSON.stringify([...before, scan].slice(-MOST_KEPT)))
  } catch {
    // No room: the answer on the screen is the same without it.
    return
  }
}

function keptScans(store: Pick<Storage, 'getItem'>, key: string): readonly unknown[] {
  try {
    const kept: unknown = JSON.parse(store.getItem(key) ?? '[]')
    return Array.isArray(kept) ? kept : []
  } catch {
    return []
  }
}
