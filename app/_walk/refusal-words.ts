import { explainJudgement } from '@/lib/rules/explain'
import type { DayProblem } from '@/lib/sync/client/day-problem'
import type { AnswerRefusal } from '@/lib/walk/answer'

/** Why an answer was not taken: what the limit says, what was kept, what to do. */
export function refusalWords({ refused, judgement }: AnswerRefusal): DayProblem {
  const words = judgement ? explainJudgement(judgement.code, judgement.facts) : ''
  if (refused === 'milder-than-rule')
    return {
      code: 'not-allowed',
      what: `The limit says otherwise: ${words}`,
      kept: 'Nothing was recorded; the values are still here.',
      todo: 'Record it as it is. Only the chief can accept a fail, with a dispensation.',
    }
  return {
    code: 'not-allowed',
    what: words || 'A value is missing.',
    kept: 'Nothing was recorded yet.',
    todo: 'Take the value, or say that you could not see it.',
  }
}
