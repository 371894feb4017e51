import type { Depth } from '@/lib/checklist/checklist'

/** Minutes a car takes at a depth, and how much that scatters. Common practice: 3 for a known car, 5 for a road car, 8 to 12 for a caged or first-time one. */
const MINUTES: Readonly<Record<Depth, number>> = { 'look-over': 3, standard: 5, full: 10 }
/** Standard deviation over mean. Common practice. */
const SCATTER = 3 / 8

/** What stands in the form before anybody has planned the day. */
export function planProposal(depth: Depth): {
  readonly lanes: number
  readonly windowMin: number
  readonly carMin: number
  readonly carSdMin: number
} {
  const carMin = MINUTES[depth]
  return { lanes: 4, windowMin: 15, carMin, carSdMin: Math.round(carMin * SCATTER * 10) / 10 }
}

/** An hour and a half before the first session, the time most organisers give the bay; 07:30 where there is none. Common practice. */
export const BAY_BEFORE_MIN = 90
