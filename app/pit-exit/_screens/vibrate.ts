import type { PitAnswer } from '@/lib/pass/pit-answer'

/** ms of trembling and rest, told apart in a glove: one short, two middling, three long. */
const PATTERNS: Readonly<Record<PitAnswer['answer'], readonly number[]>> = {
  PASSED: [80],
  CHECK: [150, 120, 150],
  HOLD: [500, 150, 500, 150, 500],
}

/** Lets the hand feel the answer, where the device can. */
export function vibrate(answer: PitAnswer['answer']): void {
  if ('vibrate' in navigator) navigator.vibrate([...PATTERNS[answer]])
}
