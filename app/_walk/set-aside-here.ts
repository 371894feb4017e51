import type { LogEntry } from '@/lib/inspection/log-entry'
import { isKnown } from '@/lib/inspection/record'
import type { SubjectKey } from '@/lib/inspection/subject'
import type { DayClient } from '@/lib/sync/client/day-client'

/** Records of a subject whose permission the server took away and that nobody adopted yet. One whose key nobody vouches for cannot be adopted. */
export function setAsideHere(day: DayClient, key: SubjectKey): readonly LogEntry[] {
  const log = day.log(key)
  const adopted = new Set(
    log.flatMap(({ record, disposition }) =>
      isKnown(record) && record.kind === 'adopted' && disposition.state !== 'quarantined' ? [record.adopts] : [],
    ),
  )
  return log.filter(
    ({ hash, disposition }) => disposition.state === 'quarantined' && disposition.code !== 'unknown-enrolment' && !adopted.has(hash),
  )
}
