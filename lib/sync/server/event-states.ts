import 'server-only'
import { readDay } from '@/lib/inspection/day-log'
import { foldLog } from '@/lib/inspection/fold-subject'
import { readLog } from '@/lib/inspection/read-log'
import type { FoldContext, SubjectState } from '@/lib/inspection/state'
import { subjectKey, type SubjectKey } from '@/lib/inspection/subject'
import type { EventLog } from './event-log'
import type { EventFrame } from './event-frame'

interface Folded {
  readonly tag: string
  readonly state: SubjectState
}

const folded = new WeakMap<EventLog, Map<SubjectKey, Folded>>()

/** How these subjects stand; each folded again only when its records, the event's own, the ordinary rows or the day changed. */
export function eventStates(
  frame: EventFrame,
  log: EventLog,
  keys: Iterable<SubjectKey>,
  context: FoldContext,
): ReadonlyMap<SubjectKey, SubjectState> {
  const memo = folded.get(log) ?? new Map<SubjectKey, Folded>()
  folded.set(log, memo)
  const day = readDay(log.bySubject.get(subjectKey({ event: frame.event.id })) ?? [])
  const states = new Map<SubjectKey, SubjectState>()
  for (const key of keys) {
    if (key.startsWith('event:')) continue
    const own = log.bySubject.get(key) ?? []
    const tag = `${own.length} ${log.eventVersion} ${frame.event.snapshotVersion} ${context.day}`
    const known = memo.get(key)
    const state = known?.tag === tag ? known.state : foldLog(readLog(own, key), day, context)
    memo.set(key, { tag, state })
    states.set(key, state)
  }
  return states
}
