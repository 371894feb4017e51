import type { QuarantineCode } from './log-entry'

/** Why a record's permission was taken away (rule T1), within a sentence. */
export const QUARANTINE_WORDS: Readonly<Record<QuarantineCode, string>> = {
  'wrong-role': 'the role does not allow it',
  'device-retired': 'its device was retired',
  'device-lost': 'its device was reported lost',
  'milder-than-rule': 'milder than its own figures',
  'unseen-of-another': 'it takes back another person’s finding',
  'shown-differs': 'made while the screen showed another number or plate',
  'unknown-enrolment': 'nobody vouches for its device',
  'not-all-heads-named': 'it does not name all it would settle',
}
