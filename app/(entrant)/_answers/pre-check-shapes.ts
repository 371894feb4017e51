import type { OutcomeState } from '@/app/_ui/outcome-shape'
import type { PreCheck } from '@/lib/checklist/pre-check'

/** The shape before the words of one answer. Only the answer's, never a car's: no car is passed by what is said of it. */
export const PRE_CHECK_SHAPES: Readonly<Record<PreCheck, OutcomeState>> = {
  'would be passed': 'ok',
  'will be looked at': 'advisory',
  'would not be passed': 'fail',
  'not answered': 'none',
}
