import type { Board, BoardGroup } from '@/lib/contracts/board'
import type { SubjectState } from '@/lib/inspection/state'
import { forecast } from '@/lib/planning/forecast'
import type { Span } from '@/lib/planning/working-time'

/** One line of the timetable, as the forecast needs it. */
export interface TimetableLine {
  readonly day: string
  readonly kind: 'session' | 'briefing' | 'engine-curfew' | 'break'
  readonly group: string | null
  readonly startsAt: number
  readonly endsAt: number
}

/** How one car's morning went; instants by the corrected clock of the device that recorded them. */
export interface CarMorning {
  readonly group: string
  readonly presentedAt: number | null
  /** Its first pass of the day. */
  readonly doneAt: number | null
}

/** When a car was first presented and first passed on a venue day. A pass that died later was issued all the same: it says how fast the bay works. */
export function morningOf({ presentedHeads, passes }: SubjectState, group: string, day: string): CarMorning {
  const instants = (records: readonly { readonly record: { readonly at: number; readonly offset: number; readonly day: string } }[]) =>
    records.filter(({ record }) => record.day === day).map(({ record }) => record.at + record.offset)
  return { group, presentedAt: earliest(instants(presentedHeads)), doneAt: earliest(instants(passes)) }
}

/** The first session of a group on a venue day by the timetable. */
export function firstSessionOn(day: string, group: string, timetable: readonly TimetableLine[]): number | null {
  return earliest(
    timetable.filter((line) => line.kind === 'session' && line.day === day && line.group === group).map(({ startsAt }) => startsAt),
  )
}

/** Times in which the bay stands still for everybody. */
export function holesOf(timetable: readonly TimetableLine[]): readonly Span[] {
  return timetable
    .filter(({ kind, group }) => kind !== 'session' && group === null)
    .map(({ startsAt, endsAt }) => ({ from: startsAt, to: endsAt }))
}

/** What each group's morning comes to at the pace measured so far; by group id. */
export function forecastOf(
  groups: readonly Pick<BoardGroup, 'id' | 'entries' | 'firstSessionAt'>[],
  mornings: readonly CarMorning[],
  timetable: readonly TimetableLine[],
  now: number,
): ReadonlyMap<string, Board['groups'][number]['forecast']> {
  const began = earliest(mornings.flatMap(({ presentedAt }) => (presentedAt === null ? [] : [presentedAt])))
  const asked = groups.map(({ id, entries, firstSessionAt }) => {
    const doneAt = mornings.flatMap(({ group, doneAt: at }) => (group === id && at !== null ? [at] : []))
    return { group: id, doneAt, toGo: Math.max(0, entries - doneAt.length), firstSessionAt }
  })
  const said = forecast(asked, began ?? now, now, holesOf(timetable))
  return new Map(said.map(({ group, is, lastAt, toGo }) => [group, { is, lastAt, toGo }]))
}

function earliest(instants: readonly number[]): number | null {
  return instants.length === 0 ? null : Math.min(...instants)
}
