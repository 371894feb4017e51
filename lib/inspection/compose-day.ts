import { readDay } from './day-log'
import type { LogEntry } from './log-entry'
import type { RecallTrigger } from './record'
import { readLog } from './read-log'
import type { SubjectKey } from './subject'
import { recordsMeeting } from './trigger'

/** What a *wet off* names in `basis`: the *wet on* records in force. */
export function wetOffBasis(entries: readonly LogEntry[]): readonly string[] {
  return [...readDay(entries).wetInForce].sort()
}

/**
 * What a new recall names in `answers`: the records that met its trigger before it was made and shall not make it due at once ("after session 1"
 * on the second day; rain that is over). What meets it now is not named: while it is wet, or a passenger is already in, it is due straight away.
 */
export function recallAnswers(entries: readonly LogEntry[], key: SubjectKey, trigger: RecallTrigger): readonly string[] {
  if (trigger.when === 'time' || trigger.when === 'passenger') return []
  const day = readDay(entries)
  return recordsMeeting(trigger, day, readLog(entries, key).of('entry-changed')).filter((hash) => !day.wetInForce.has(hash))
}
