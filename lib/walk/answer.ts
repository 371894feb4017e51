import type { BookCheck } from '@/lib/checklist/book'
import type { CarFacts } from '@/lib/checklist/car-facts'
import { judgeCheck } from '@/lib/checklist/judge-check'
import type { RecordOf } from '@/lib/inspection/record'
import type { Subject } from '@/lib/inspection/subject'
import type { CivilDate } from '@/lib/rules/civil-date'
import type { Judgement } from '@/lib/rules/judgement'

type Finding = RecordOf<'finding'>
export type Values = Readonly<Record<string, string | number | boolean | null>>

/** What a person says of one check. */
export type Answer =
  | { readonly say: 'ok'; readonly values: Values }
  | { readonly say: 'advisory' | 'fail'; readonly values: Values; readonly reason: string }
  | { readonly say: 'could-not-see' }
  /** It was wrong, was mended on the spot and has been looked at again: `values` are those of the state left. */
  | { readonly say: 'put-right'; readonly found: { readonly values: Values; readonly reason: string }; readonly values: Values }

/** Why an answer cannot stand as given. */
export type AnswerRefusal = { readonly refused: 'value-missing' | 'milder-than-rule'; readonly judgement: Judgement | null }

/** The finding's own fields, ready for `DayClient.record`; basis, answers and envelope are filled in there. */
export type FindingDraft = Pick<Finding, 'kind' | 'subject' | 'check' | 'outcome'> &
  Partial<Pick<Finding, 'reason' | 'measured' | 'found' | 'judgement' | 'paramsHash' | 'notes' | 'photos'>>

const SEVERITY = { ok: 0, advisory: 1, fail: 2 } as const

/**
 * Turns an answer into a finding, judged by the check's rule on `on` (the event's last day). A person may be more severe than the rule, never milder;
 * a measured check says ok or advisory only with its values. `note` is a reference to free text (`note:<ref>`).
 */
export function answerCheck(
  subject: Exclude<Subject, { event: string }>,
  check: BookCheck,
  answer: Answer,
  facts: CarFacts,
  on: CivilDate,
  note?: string,
): FindingDraft | AnswerRefusal {
  const notes = note === undefined ? {} : { notes: [note] }
  const base = { kind: 'finding', subject, check: check.id, ...notes } as const
  if (answer.say === 'could-not-see') return { ...base, outcome: 'could-not-see' }

  const judgement = judgeCheck(check, answer.values, facts, on)
  const outcome = answer.say === 'put-right' ? atLeastOk(judgement) : answer.say
  if (outcome !== 'fail' && isUndecided(check, answer.values, judgement)) return { refused: 'value-missing', judgement }
  if (judgement && judgement.outcome !== 'undecided' && SEVERITY[outcome] < SEVERITY[judgement.outcome])
    return { refused: 'milder-than-rule', judgement }
  return {
    ...base,
    outcome,
    ...('reason' in answer ? { reason: answer.reason } : {}),
    ...(hasValues(answer.values) ? { measured: answer.values } : {}),
    ...(judgement ? { judgement: { outcome: judgement.outcome, code: judgement.code, facts: judgement.facts } } : {}),
    ...(check.paramsHash !== null ? { paramsHash: check.paramsHash } : {}),
    ...(answer.say === 'put-right' ? { found: foundOf(answer.found) } : {}),
  }
}

/** Whether what `answerCheck` gave is a refusal. */
export function isRefusal(result: FindingDraft | AnswerRefusal): result is AnswerRefusal {
  return 'refused' in result
}

/** What was put right reads ok, or advisory where the rule still says so; a rule that still says fail is refused as milder. */
function atLeastOk(judgement: Judgement | null): 'ok' | 'advisory' {
  return judgement?.outcome === 'advisory' ? 'advisory' : 'ok'
}

/** A rule says what it lacks; where there is none, a measured check still wants something measured (rule F3). */
function isUndecided(check: BookCheck, values: Values, judgement: Judgement | null): boolean {
  return judgement ? judgement.outcome === 'undecided' : check.measure !== undefined && !hasValues(values)
}

function hasValues(values: Values): boolean {
  return Object.keys(values).length > 0
}

function foundOf(found: { readonly values: Values; readonly reason: string }): NonNullable<Finding['found']> {
  return { outcome: 'fail', reason: found.reason, ...(hasValues(found.values) ? { values: found.values } : {}) }
}
