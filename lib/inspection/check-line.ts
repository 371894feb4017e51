import type { ReadEntry } from './read-log'
import type { FindingOutcome, RecordOf } from './record'

/** A record that says how a check stands. */
export type CheckLine = ReadEntry<RecordOf<'finding'> | RecordOf<'ruling'> | RecordOf<'dispensation'>>

const SEVERITY: Readonly<Record<FindingOutcome, number>> = { ok: 0, advisory: 1, unseen: 2, 'could-not-see': 3, fail: 4 }

/** What the line says; a dispensation ranks as advisory (rule F4). */
export function outcomeOf({ record }: CheckLine): FindingOutcome {
  return record.kind === 'dispensation' ? 'advisory' : record.outcome
}

/** How severe an outcome is: fail > could-not-see > unseen > advisory > ok (rule F2). */
export function severity(outcome: FindingOutcome): number {
  return SEVERITY[outcome]
}

/** Whether the line stops, so that quarantine leaves it its effect (rule T1). */
export function isStop(line: CheckLine): boolean {
  return severity(outcomeOf(line)) >= SEVERITY.unseen
}

/** A finding carried forward from an earlier event is no look (rule F11). */
export function isCarried({ record }: CheckLine): boolean {
  return record.kind === 'finding' && record.carriedFrom !== undefined
}

/** A finding by which somebody looked at the thing here and now. */
export function isLook({ record }: CheckLine): boolean {
  return record.kind === 'finding' && record.carriedFrom === undefined && record.outcome !== 'unseen'
}
