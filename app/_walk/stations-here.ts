import { factsPinned } from '@/app/_crew/facts-pinned'
import { applicableChecks } from '@/lib/checklist/applicable-checks'
import type { Station } from '@/lib/checklist/checklist'
import { judgedKind, subjectKey } from '@/lib/inspection/subject'
import type { DayClient } from '@/lib/sync/client/day-client'
import type { WalkSubject } from './use-walk'

/** The stations of which something applies to this subject: only those can be seen again, and so only those are offered. */
export function stationsHere(day: DayClient, subject: WalkSubject): readonly Station[] {
  const told = 'car' in subject ? (day.entry(subject.car)?.facts ?? {}) : {}
  const { book, facts } = factsPinned(day, subjectKey(subject), told)
  if (book === null) return []
  const kind = judgedKind(subject)
  const known = new Set(facts.flatMap((one) => applicableChecks(book, kind, one).map(({ station }) => station)))
  return book.checklist.stations.filter(({ id }) => known.has(id))
}
