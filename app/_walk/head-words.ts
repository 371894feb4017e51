import type { BookCheck } from '@/lib/checklist/book'
import type { Head } from '@/lib/inspection/state'
import type { RecordOf } from '@/lib/inspection/record'
import { dayWords } from '@/app/_crew/say-when'
import { explainJudgement } from '@/lib/rules/explain'

/** On what grounds a head says what it says: reason, own words, and the figure that decided; empty where it gave none. */
export function headWords({ record }: Head, check: BookCheck, noteOf: (hash: string) => string | null): string {
  if (record.kind === 'dispensation') return dispensationWords(record)
  if (record.kind === 'ruling') return `ruled by the chief: ${record.why}`
  const reason = record.reason ?? record.found?.reason
  const { judgement } = record
  const parts = [
    record.found ? 'put right here' : '',
    check.reasons.find(({ id }) => id === reason)?.text ?? '',
    ...(record.notes ?? []).map((hash) => noteOf(hash) ?? 'own words that are not on this device'),
    judgement ? explainJudgement(judgement.code, judgement.facts) : '',
  ]
  return parts.filter((part) => part !== '').join('. ')
}

/** A fail that runs under conditions, with why and for how long: said wherever the fail was. */
export function dispensationWords({
  reason,
  conditions,
  until,
}: Pick<RecordOf<'dispensation'>, 'reason' | 'conditions' | 'until'>): string {
  const end = until === null ? 'to the end of the event' : `to the end of ${dayWords(until)}`
  return `fail accepted by the chief, ${end}. Only with: ${conditions}. Because: ${reason}`
}
