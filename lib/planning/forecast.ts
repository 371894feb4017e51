import { afterWorking, workingMinutes, type Span } from './working-time'

export interface GroupToForecast {
  readonly group: string
  /** Instants at which its cars were done: passed for the first time that day. */
  readonly doneAt: readonly number[]
  readonly toGo: number
  /** First session of the day; null where the timetable has none. */
  readonly firstSessionAt: number | null
}

export interface GroupForecast {
  readonly group: string
  readonly done: number
  readonly toGo: number
  readonly firstSessionAt: number | null
  /** When its last car is through at the pace of the morning; null where none is left, or too little has been seen to say. */
  readonly lastAt: number | null
  /** Nothing left, in time, too late, or nobody can say yet. */
  readonly is: 'all through' | 'in time' | 'late' | 'too early to say'
}

/** Fewer cars than this say nothing about a pace. */
const ENOUGH = 3
/** The pace of the last so many cars: a morning's beginning is slower than its middle. */
const RECENT = 20

/** Cars an hour of working time as measured; null where too few are done. `opensAt`: when the bay began. */
export function paceOf(doneAt: readonly number[], opensAt: number, now: number, holes: readonly Span[]): number | null {
  const done = doneAt.filter((at) => at >= opensAt && at <= now).sort((a, b) => a - b)
  if (done.length < ENOUGH) return null
  const recent = done.slice(-RECENT)
  const before = done[done.length - recent.length - 1] ?? opensAt
  // Up to now and not up to the last car: a bay that stands still gets slower with each minute.
  const minutes = workingMinutes({ from: before, to: now }, holes)
  return minutes <= 0 ? null : (recent.length / minutes) * 60
}

/**
 * When each group's last car is through if the bay goes on at the pace measured, group after group by their first sessions. Nothing is promised:
 * too few cars, and it says so.
 */
export function forecast(
  groups: readonly GroupToForecast[],
  opensAt: number,
  now: number,
  holes: readonly Span[],
): readonly GroupForecast[] {
  const perHour = paceOf(
    groups.flatMap(({ doneAt }) => doneAt),
    opensAt,
    now,
    holes,
  )
  const inOrder = [...groups].sort(
    (a, b) => (a.firstSessionAt ?? Number.POSITIVE_INFINITY) - (b.firstSessionAt ?? Number.POSITIVE_INFINITY),
  )
  const last = new Map<string, number | null>()
  let before = 0
  for (const { group, toGo } of inOrder) {
    before += toGo
    last.set(group, perHour === null || toGo === 0 ? null : afterWorking(now, (before / perHour) * 60, holes))
  }
  return groups.map(({ group, doneAt, toGo, firstSessionAt }) => {
    const lastAt = last.get(group) ?? null
    return { group, done: doneAt.length, toGo, firstSessionAt, lastAt, is: standing(toGo, lastAt, firstSessionAt) }
  })
}

function standing(toGo: number, lastAt: number | null, firstSessionAt: number | null): GroupForecast['is'] {
  if (toGo === 0) return 'all through'
  if (lastAt === null) return 'too early to say'
  return firstSessionAt !== null && lastAt > firstSessionAt ? 'late' : 'in time'
}
