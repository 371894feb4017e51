import { recallsByClock, type RecallByClock } from '@/lib/pass/recalls-by-clock'
import type { DayClient, DayEntry } from '@/lib/sync/client/day-client'
import type { Subject } from '@/lib/inspection/subject'
import { subjectKey } from '@/lib/inspection/subject'

/** Every recall that this device's clock alone makes due, of cars, of their people and of fits (rule F13). `clock` is the device's own, ms. */
export function recallsHere(day: DayClient, clock: number): readonly RecallByClock[] {
  const entries = day.entries()
  const people = new Set(entries.flatMap((entry) => entry.people.map(({ person }) => person)))
  return [...entries.flatMap((entry) => subjectsOf(entry)), ...[...people].map((person) => ({ person }))].flatMap((subject) =>
    recallsOf(day, subject, clock),
  )
}

/** The same of one subject. */
export function recallsOf(day: DayClient, subject: Exclude<Subject, { event: string }>, clock: number): readonly RecallByClock[] {
  const snapshot = day.snapshot()
  const log = day.log(subjectKey(subject))
  if (snapshot === null || !log.some(({ record }) => record.kind === 'recall')) return []
  return recallsByClock([...log, ...day.dayLog()], subject, snapshot.timetable, clock + day.status().clockOffset)
}

function subjectsOf(entry: DayEntry): readonly Exclude<Subject, { event: string }>[] {
  return [{ car: entry.id }, ...entry.people.map(({ person }) => ({ fit: entry.id, person }))]
}
