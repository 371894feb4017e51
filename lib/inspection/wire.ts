import type { Book } from '@/lib/checklist/book'
import type { CheckState, SubjectState } from './state'
import { kindOfKey } from './subject'
import { hasReservation, isOpen } from './verdict'

export type WireStationState = 'ok' | 'advisory' | 'fail' | 'ask' | 'none' | 'na' | 'held'

/** One bolt of the wire. */
export interface WireStation {
  readonly station: string
  readonly title: string
  readonly short: string
  /** `ask`: begun, or somebody could not see or decide what is required; `none`: nobody has looked; `na`: nothing here applies. */
  readonly state: WireStationState
  /** Required checks still to be seen here. */
  readonly open: number
}

/** The wire of a subject: its stations in the book's order, each with the worst that can be said of it. */
export function wireStations(state: SubjectState, book: Book): readonly WireStation[] {
  const byStation = new Map<string, CheckState[]>()
  for (const check of state.checks.values()) {
    const station = book.byId.get(check.check)?.station
    if (station === undefined) continue
    const list = byStation.get(station)
    if (list) list.push(check)
    else byStation.set(station, [check])
  }
  const kind = kindOfKey(state.key)
  return book.checklist.stations
    .filter((station) => station.subject === kind)
    .map(({ id, title, short }) => {
      const checks = byStation.get(id) ?? []
      const isKnown = state.depth !== null || checks.length > 0
      const isInBook = book.checks.some((check) => check.station === id)
      // Before the car is presented its facts are not known, so no station may say that nothing applies.
      const stands = isKnown ? stationState(id, checks, state) : isInBook ? 'none' : 'na'
      return { station: id, title, short, state: stands, open: checks.filter(isUnfinished).length }
    })
}

/** The wire in words: "11 of 14 stations ok, brakes failed, 2 to see". Stations where nothing applies are not counted. */
export function wireSentence(stations: readonly WireStation[]): string {
  const counted = stations.filter(({ state }) => state !== 'na')
  const inState = (...states: readonly WireStationState[]) => counted.filter(({ state }) => states.includes(state))
  const names = (list: readonly WireStation[], what: string) =>
    list.length === 0 ? [] : [`${list.map(({ short }) => short).join(', ')} ${what}`]
  const toSee = inState('ask', 'none').length
  return [
    `${inState('ok', 'advisory').length} of ${counted.length} stations ok`,
    ...names(inState('fail'), 'failed'),
    ...names(inState('held'), 'held'),
    ...names(inState('advisory'), 'with advisories'),
    ...(toSee === 0 ? [] : [`${toSee} to see`]),
  ].join(', ')
}

function stationState(station: string, checks: readonly CheckState[], { blocks }: SubjectState): WireStationState {
  if (checks.some((check) => check.standing === 'fail')) return 'fail'
  const ids = new Set(checks.map(({ check }) => check))
  // A hold that only the chief lifts touches the stations it names; one that names none touches no bolt, and the verdict says *held*.
  const touches = blocks.some(
    ({ stations, checksLeft }) => checksLeft.some((check) => ids.has(check)) || (checksLeft.length === 0 && stations.includes(station)),
  )
  if (touches) return 'held'
  const asked = checks.filter((check) => check.standing !== 'does-not-apply' && (check.required || check.heads.length > 0))
  if (asked.length === 0) return 'na'
  if (asked.every((check) => check.standing === 'not-seen' && check.heads.length === 0)) return 'none'
  if (asked.some(isUnfinished)) return 'ask'
  return asked.some(hasReservation) ? 'advisory' : 'ok'
}

function isUnfinished(check: CheckState): boolean {
  return isOpen(check) || (check.required && check.unanswered.length > 0)
}
