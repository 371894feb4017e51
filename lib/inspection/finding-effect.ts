import type { FindingOutcome } from './record'

/** The effect of a finding or ruling: ok and advisory permit, all else stops. */
export function findingEffect(outcome: FindingOutcome): 'stops' | 'permits' {
  return outcome === 'ok' || outcome === 'advisory' ? 'permits' : 'stops'
}
