import type { OutcomeState } from '@/app/_ui/outcome-shape'
import type { Verdict } from '@/lib/inspection/state'

/** The shape that stands before a verdict's word. */
export const VERDICT_SHAPES: Readonly<Record<Verdict, OutcomeState>> = {
  passed: 'ok',
  'passed with advisories': 'advisory',
  'not passed': 'fail',
  held: 'held',
  withdrawn: 'na',
  'in progress': 'none',
  'declared only': 'none',
  'not presented': 'none',
}
