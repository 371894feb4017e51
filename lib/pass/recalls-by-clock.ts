import { readDay } from '@/lib/inspection/day-log'
import type { LogEntry } from '@/lib/inspection/log-entry'
import { readLog } from '@/lib/inspection/read-log'
import type { RecordOf } from '@/lib/inspection/record'
import { sessionsOf, type TimetableBlock } from '@/lib/inspection/sessions'
import { subjectKey } from '@/lib/inspection/subject'
import { isDue } from '@/lib/inspection/trigger'
import type { PitBlock } from './pit-device'
import { triggerWords, type TriggerNames } from './trigger-words'

type Recall = RecordOf<'recall'>
type Subject = Recall['subject']

/** A recall that no record has made due and this device's own clock says is: it blocks here and now, and a `day` record must still say it (rule F13). */
export interface RecallByClock {
  readonly hash: string
  readonly recall: Recall
  /** When it fell due by the clock or the timetable, ms. */
  readonly since: number
}

/**
 * The recalls of one subject that the clock alone makes due. `entries` are its records and the event's own, `now` the corrected clock, ms. A clock only ever
 * adds a block: nothing that is seen meanwhile answers such a recall.
 */
export function recallsByClock(
  entries: readonly LogEntry[],
  subject: Subject,
  timetable: readonly TimetableBlock[],
  now: number,
): readonly RecallByClock[] {
  const log = readLog(entries, subjectKey(subject))
  const recalls = log.of('recall')
  if (recalls.length === 0) return []
  const day = readDay(entries)
  const changes = log.of('entry-changed')
  const lifted = new Set(
    log
      .of('lifted')
      .filter(({ isFull }) => isFull)
      .flatMap(({ record }) => record.holds),
  )
  return recalls.flatMap(({ hash, record }) => {
    if (lifted.has(hash) || isDue(record, day, changes)) return []
    const since = dueSince(record, timetable)
    return since === null || since > now ? [] : [{ hash, recall: record, since }]
  })
}

/** When the clock or the timetable makes it due; null where neither can say. */
export function dueSince({ trigger, at, offset }: Recall, timetable: readonly TimetableBlock[]): number | null {
  if (trigger.when === 'time') return trigger.at
  if (trigger.when !== 'session-over') return null
  // What was over when it was made does not make it due.
  const ends = sessionsOf(timetable, trigger.group)
    .filter(({ session, endsAt }) => session >= trigger.session && endsAt > at + offset)
    .map(({ endsAt }) => endsAt)
  return ends.length === 0 ? null : Math.min(...ends)
}

/** The same as the pit exit shows it. */
export function blockByClock({ recall, since }: RecallByClock, names: TriggerNames): PitBlock {
  const { subject } = recall
  const about = 'car' in subject ? { entry: subject.car } : 'fit' in subject ? { entry: subject.fit } : { person: subject.person }
  const words = `Recall due by this device’s clock: to be shown ${triggerWords(recall.trigger, names)}`
  return { about, words, at: since }
}
