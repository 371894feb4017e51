import type { OutcomeState } from './outcome-shape'

export interface WireBolt {
  readonly label: string
  readonly state: OutcomeState
}

/** What lies between two neighbouring bolts: wire; a cut end hanging from one of them; or nothing yet. */
export type WireLink = 'whole' | 'cut-after' | 'cut-before' | 'none'

/** Closed: the wire may pass through. */
export function isClosed(state: OutcomeState): boolean {
  return state === 'ok' || state === 'advisory' || state === 'na'
}

/** Broken: the wire that reached it is cut. */
export function isBroken(state: OutcomeState): boolean {
  return state === 'fail' || state === 'held'
}

/** The link between neighbours: whole between two closed ones, cut where a closed one meets a broken one, else nothing. */
export function linkBetween(left: OutcomeState, right: OutcomeState): WireLink {
  if (isClosed(left) && isClosed(right)) return 'whole'
  if (isClosed(left) && isBroken(right)) return 'cut-after'
  if (isBroken(left) && isClosed(right)) return 'cut-before'
  return 'none'
}

/** Links before each bolt and after the last: always one more than bolts. The ends of the wire are tucked in: no link. */
export function wireLinks(bolts: readonly WireBolt[]): readonly WireLink[] {
  const inner = bolts.slice(1).map((bolt, index) => linkBetween(bolts[index]?.state ?? 'none', bolt.state))
  return ['none', ...inner, 'none']
}
