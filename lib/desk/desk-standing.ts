import type { SubjectState } from '@/lib/inspection/state'
import { bandToday } from '@/lib/pass/live-band'
import { hasPassed } from '@/lib/pass/may-run'

/** How somebody stands at the desk today. `banded` alone may sit in a car. */
export type DeskStanding =
  | { readonly is: 'banded'; readonly band: string }
  /** Held, or something fails. */
  | { readonly is: 'stopped'; readonly why: 'held' | 'not passed' }
  /** All is seen: a band is all that is missing. */
  | { readonly is: 'ready' }
  | { readonly is: 'begun'; readonly toSee: number }
  | { readonly is: 'not begun' }

/** How a person's state reads at the desk on that venue day. */
export function deskStanding(state: SubjectState, day: string): DeskStanding {
  if (state.blocks.length > 0) return { is: 'stopped', why: 'held' }
  if (state.fails.length > 0) return { is: 'stopped', why: 'not passed' }
  const band = bandToday(state, day)
  if (band !== null) return { is: 'banded', band }
  if (hasPassed(state)) return { is: 'ready' }
  return state.presentedHeads.length === 0 ? { is: 'not begun' } : { is: 'begun', toSee: state.open.length }
}
