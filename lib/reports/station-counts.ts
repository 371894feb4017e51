import type { Book } from '@/lib/checklist/book'
import { isKnown } from '@/lib/inspection/record'
import { subjectKey } from '@/lib/inspection/subject'
import type { ReportedRecord } from './reported-log'

export interface StationCount {
  readonly station: string
  readonly title: string
  /** Cars, people or fits of which something was looked at. */
  readonly subjects: number
  readonly ok: number
  readonly advisory: number
  readonly fail: number
  readonly couldNotSee: number
  /** Faults that were put right on the spot: they stand in no other column's stead. */
  readonly putRight: number
}

/** What was found per station, look by look; an answer that was taken back counts as none. Quarantined looks are left out. */
export function stationCounts(log: readonly ReportedRecord[], book: Book): readonly StationCount[] {
  const findings = log.flatMap(({ record, disposition }) =>
    disposition === 'accepted' && isKnown(record) && record.kind === 'finding' ? [record] : [],
  )
  return [...book.stations.values()].map(({ id, title }) => {
    const own = findings.filter(({ check, outcome }) => book.byId.get(check)?.station === id && outcome !== 'unseen')
    const count = (outcome: string) => own.filter((finding) => finding.outcome === outcome).length
    return {
      station: id,
      title,
      subjects: new Set(own.map(({ subject }) => subjectKey(subject))).size,
      ok: count('ok'),
      advisory: count('advisory'),
      fail: count('fail'),
      couldNotSee: count('could-not-see'),
      putRight: own.filter(({ found }) => found !== undefined).length,
    }
  })
}
