import type { SubjectState } from '@/lib/inspection/state'
import { hasPassed, isValidOn } from '@/lib/pass/may-run'
import { decodeToken } from '@/lib/pass/token'

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
  const band = state.passes.findLast(
    ({ state: stands, record }) => stands === 'live' && record.kind === 'band' && coversDay(record.token, day),
  )
  if (hasPassed(state)) return band?.record.kind === 'band' ? { is: 'banded', band: band.record.bandNumber } : { is: 'ready' }
  return state.presentedHeads.length === 0 ? { is: 'not begun' } : { is: 'begun', toSee: state.open.length }
}

function coversDay(token: string, day: string): boolean {
  const decoded = decodeToken(token)
  return decoded.ok && decoded.token.payload.type === 'band' && isValidOn(decoded.token.payload, day)
}
