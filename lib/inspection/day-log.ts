import type { LogEntry } from './log-entry'
import { readLog, type ReadEntry } from './read-log'
import { subjectKey, type SubjectKey } from './subject'
import type { RecordOf, UnknownRecord } from './record'

export type DayEntry = ReadEntry<RecordOf<'day'>>

/** What the event itself has said that day. */
export interface DayLog {
  /** Every `day` record; a quarantined one still stops (rule T1). */
  readonly said: readonly DayEntry[]
  /** *Wet on* records, in force or past. */
  readonly wetOn: readonly DayEntry[]
  /** Those that no believed *wet off* names. */
  readonly wetInForce: ReadonlySet<string>
  /** Stops of unknown kind upon the whole event: they block every subject (rule T3). */
  readonly unknownStops: readonly ReadEntry<UnknownRecord>[]
}

/** Reads the event-level records out of a log. */
export function readDay(entries: readonly LogEntry[]): DayLog {
  const keys = new Set<SubjectKey>()
  for (const { record } of entries) if ('event' in record.subject) keys.add(subjectKey(record.subject))
  const logs = [...keys].sort().map((key) => readLog(entries, key))
  const said = logs.flatMap((log) => log.of('day'))
  const wetOn = said.filter(({ record }) => record.says.what === 'wet' && record.says.on)
  const ended = new Set(said.filter((entry) => entry.isFull && isWetOff(entry)).flatMap(({ record }) => record.basis))
  return {
    said,
    wetOn,
    wetInForce: new Set(wetOn.map(({ hash }) => hash).filter((hash) => !ended.has(hash))),
    unknownStops: logs.flatMap((log) => log.unknownStops),
  }
}

function isWetOff({ record }: DayEntry): boolean {
  return record.says.what === 'wet' && !record.says.on
}
