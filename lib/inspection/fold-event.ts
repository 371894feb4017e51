import { readDay } from './day-log'
import { foldLog } from './fold-subject'
import type { LogEntry } from './log-entry'
import { readOwn } from './read-log'
import type { FoldContext, SubjectState } from './state'
import { subjectKey, type SubjectKey } from './subject'

/** How every subject stands that has a record or a declaration. Goes through the log once, then through each subject's own records. */
export function foldEvent(entries: readonly LogEntry[], context: FoldContext): Map<SubjectKey, SubjectState> {
  const bySubject = new Map<SubjectKey, LogEntry[]>()
  for (const key of context.declared) bySubject.set(key, [])
  const ofEvent: LogEntry[] = []
  for (const entry of entries) {
    if ('event' in entry.record.subject) {
      ofEvent.push(entry)
      continue
    }
    const key = subjectKey(entry.record.subject)
    const own = bySubject.get(key)
    if (own) own.push(entry)
    else bySubject.set(key, [entry])
  }
  const day = readDay(ofEvent)
  const keys = [...bySubject.keys()].sort()
  return new Map(keys.map((key) => [key, foldLog(readOwn(bySubject.get(key) ?? [], key), day, context)]))
}
