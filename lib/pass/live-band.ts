import type { SubjectState } from '@/lib/inspection/state'
import { hasPassed, isValidOn } from './may-run'
import { decodeToken } from './token'

/** The number of somebody's band as the pit exit reads it, null without one: it lives, is for that venue day, nothing stands against them and they still read passed. */
export function bandToday(state: SubjectState, day: string): string | null {
  return state.blocks.length === 0 && hasPassed(state) ? liveBand(state, day) : null
}

function liveBand(state: SubjectState, day: string): string | null {
  const band = state.passes.findLast(
    ({ state: stands, record }) => stands === 'live' && record.kind === 'band' && coversDay(record.token, day),
  )
  return band?.record.kind === 'band' ? band.record.bandNumber : null
}

function coversDay(token: string, day: string): boolean {
  const decoded = decodeToken(token)
  return decoded.ok && decoded.token.payload.type === 'band' && isValidOn(decoded.token.payload, day)
}
