import { nextWorking, workingSpans, type Span } from './working-time'

export interface CarToCall {
  readonly entry: string
  readonly group: string
  /** Would not be passed, or nothing is known of it: it needs the time to be mended. */
  readonly isDoubtful: boolean
  /** Minutes it is expected to take. */
  readonly minutes: number
}

export interface GroupToCall {
  readonly group: string
  /** Its first session that day; null where the timetable has none: it comes last. */
  readonly firstSessionAt: number | null
}

export interface Bay {
  readonly opensAt: number
  /** Lanes that work side by side. */
  readonly lanes: number
  /** Briefings, the engine curfew, breaks. */
  readonly holes: readonly Span[]
  /** Length of a call-up window, minutes. */
  readonly windowMin: number
}

export interface CallUpWindow extends Span {
  readonly group: string
  readonly entries: readonly string[]
  /** It ends after the group's first session has begun: those cars miss it unless more people help. */
  readonly isLate: boolean
}

export interface BayOrder {
  readonly windows: readonly CallUpWindow[]
  readonly holes: readonly Span[]
  /** For whoever comes late: after the last window, until the last group's first session has begun and an hour beyond. */
  readonly lateWindow: Span | null
}

/** Minutes under which a stretch before a hole is no window. */
const SHORTEST_MIN = 5
/** Share of the bay's time that is filled, so that a car that takes longer does not push all others. Common practice in appointment books. */
const FILLED = 0.85
/** Cars more in the very first window: somebody always comes late to it. Common practice in appointment books. */
const FIRST_EXTRA = 2

/**
 * Who is called when: group after group by their own first sessions, doubtful cars of a group first, in windows of working time that the bay can
 * fill. A car longer than a window has one all the same. The order in which cars are given is kept among equals.
 */
export function bayOrder(cars: readonly CarToCall[], groups: readonly GroupToCall[], bay: Bay): BayOrder {
  const inOrder = [...groups].sort(
    (a, b) => (a.firstSessionAt ?? Number.POSITIVE_INFINITY) - (b.firstSessionAt ?? Number.POSITIVE_INFINITY),
  )
  const windows: CallUpWindow[] = []
  let from = bay.opensAt
  for (const { group, firstSessionAt } of inOrder) {
    const own = cars.filter((car) => car.group === group)
    let waiting = [...own.filter(({ isDoubtful }) => isDoubtful), ...own.filter(({ isDoubtful }) => !isDoubtful)]
    while (waiting.length > 0) {
      const window = nextWindow(from, bay)
      const called = fill(waiting, window, bay.lanes, windows.length === 0)
      const isLate = firstSessionAt !== null && window.to > firstSessionAt
      windows.push({ ...window, group, entries: called.map(({ entry }) => entry), isLate })
      waiting = waiting.slice(called.length)
      from = window.to
    }
  }
  return { windows, holes: bay.holes, lateWindow: lateWindow(windows, inOrder) }
}

/** A window ends before a hole rather than on its far side, and none is so short that nobody would come for it. */
function nextWindow(at: number, bay: Pick<Bay, 'holes' | 'windowMin'>): Span {
  const { holes, windowMin } = bay
  const from = nextWorking(at, holes)
  const whole = { from, to: from + windowMin * 60_000 }
  const to = workingSpans(whole, holes)[0]?.to ?? whole.to
  return to - from < SHORTEST_MIN * 60_000 && to < whole.to ? nextWindow(to, bay) : { from, to }
}

function fill(waiting: readonly CarToCall[], { from, to }: Span, lanes: number, isFirst: boolean): readonly CarToCall[] {
  const room = ((to - from) / 60_000) * lanes * FILLED
  let taken = 0
  let count = 0
  for (const { minutes } of waiting) {
    if (taken + minutes > room + 1e-9 && count > 0) break
    taken += minutes
    count += 1
  }
  return waiting.slice(0, count + (isFirst ? FIRST_EXTRA : 0))
}

function lateWindow(windows: readonly CallUpWindow[], groups: readonly GroupToCall[]): Span | null {
  const last = windows.at(-1)
  if (last === undefined) return null
  const sessions = groups.flatMap(({ firstSessionAt }) => (firstSessionAt === null ? [] : [firstSessionAt]))
  return { from: last.to, to: Math.max(last.to, ...sessions) + 3_600_000 }
}
