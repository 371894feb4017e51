import type { BookCheck } from '@/lib/checklist/book'
import type { Answer } from './answer'

/**
 * Whether the checklist asks a photograph with this answer. What could not be seen cannot be shown; what was put right shows itself only where
 * every answer is to be shown.
 */
export function wantsPhoto(check: Pick<BookCheck, 'photo'>, answer: Pick<Answer, 'say'>): boolean {
  if (check.photo === 'always') return answer.say !== 'could-not-see'
  return check.photo === 'on-fail' && answer.say === 'fail'
}

/** Stands in the record's words where one was asked and none could be taken: a camera that fails must never keep a fail from being recorded. */
export const NO_PHOTO_WORDS = 'No photograph could be taken.'
