import type { PassState, SubjectState } from '@/lib/inspection/state'

/** The newest live pass or band of this venue day; null without one. */
export function livePass(state: SubjectState, day: string): PassState | null {
  return state.passes.findLast((pass) => pass.state === 'live' && pass.record.day === day) ?? null
}
