import type { BayOrderView } from '@/lib/contracts/bay-order'
import { bayOrder, type CallUpWindow } from '@/lib/planning/bay-order'
import { queueInSteadyFlow } from '@/lib/planning/erlang'
import { peopleAtLeast, peopleNeeded } from '@/lib/planning/staffing'
import { workingMinutes } from '@/lib/planning/working-time'

type View = BayOrderView
type Doubt = View['windows'][number]['cars'][number]['doubt']

export interface CarInOrder {
  readonly entry: string
  readonly number: string
  readonly model: string
  readonly group: string
  readonly doubt: Doubt
}

export interface Hole {
  readonly kind: View['holes'][number]['kind']
  readonly from: number
  readonly to: number
}

/** Everything about one venue day that its order is worked out from. */
export interface DayToOrder {
  readonly day: string
  readonly days: readonly string[]
  readonly timeZone: string
  readonly opensAt: number
  readonly plan: View['plan']
  readonly isPlanned: boolean
  readonly publishedAt: number | null
  readonly groups: readonly { readonly id: string; readonly name: string; readonly firstSessionAt: number | null }[]
  /** In the order of their numbers. */
  readonly cars: readonly CarInOrder[]
  readonly holes: readonly Hole[]
  /** What was told, by entry. */
  readonly told: ReadonlyMap<string, { readonly from: number; readonly to: number }>
}

/** The order of a day: who is called when, what stands in the way, and how many people it takes. */
export function orderOf(day: DayToOrder): View {
  const { plan } = day
  const byEntry = new Map(day.cars.map((car) => [car.entry, car]))
  const cars = day.cars.map(({ entry, group, doubt }) => ({ entry, group, isDoubtful: doubt !== null, minutes: plan.carMin }))
  const groups = day.groups.map(({ id, firstSessionAt }) => ({ group: id, firstSessionAt }))
  const order = bayOrder(cars, groups, { opensAt: day.opensAt, lanes: plan.lanes, windowMin: plan.windowMin, holes: day.holes })
  return {
    day: day.day,
    days: [...day.days],
    timeZone: day.timeZone,
    plan,
    isPlanned: day.isPlanned,
    publishedAt: day.publishedAt,
    toldOtherwise: order.windows.flatMap((window) => window.entries.filter((entry) => !isTold(window, day.told.get(entry)))).length,
    groups: day.groups.map((group) => ({ ...group, ...staffingOf(group, day) })),
    windows: order.windows.map(({ entries, ...window }) => ({
      ...window,
      cars: entries.flatMap((entry) => {
        const car = byEntry.get(entry)
        return car === undefined ? [] : [{ entry, number: car.number, model: car.model, doubt: car.doubt }]
      }),
    })),
    holes: day.holes.filter(({ from, to }) => to > day.opensAt && from < lastOf(day)).map((hole) => ({ ...hole })),
    withoutWindows: withoutWindows(day),
    lateWindow: order.lateWindow === null ? null : { ...order.lateWindow },
  }
}

function isTold({ from, to }: CallUpWindow, told: { readonly from: number; readonly to: number } | undefined): boolean {
  return told?.from === from && told.to === to
}

function lastOf({ groups, opensAt }: DayToOrder): number {
  return Math.max(opensAt, ...groups.flatMap(({ firstSessionAt }) => (firstSessionAt === null ? [] : [firstSessionAt])))
}

function withoutWindows(day: DayToOrder): View['withoutWindows'] {
  const cars = day.cars.filter(({ group }) => day.groups.some(({ id, firstSessionAt }) => id === group && firstSessionAt !== null)).length
  const minutes = workingMinutes({ from: day.opensAt, to: lastOf(day) }, day.holes)
  if (minutes <= 0 || cars === 0) return null
  const queue = queueInSteadyFlow((cars / minutes) * 60, 60 / day.plan.carMin, day.plan.lanes)
  const settles = Number.isFinite(queue.meanWaitMin)
  return { settles, meanWaitMin: settles ? queue.meanWaitMin : null, over10Min: queue.longerThan(10) }
}

type Staffing = Omit<View['groups'][number], 'id' | 'name' | 'firstSessionAt'>

/** A group is through in time only if all that are called before it are. */
function staffingOf({ id, firstSessionAt }: DayToOrder['groups'][number], day: DayToOrder): Staffing {
  const own = day.cars.filter(({ group }) => group === id)
  const counts = { cars: own.length, doubtful: own.filter(({ doubt }) => doubt !== null).length }
  if (firstSessionAt === null) return { ...counts, carsBefore: own.length, workingMin: null, peopleAtLeast: null, peopleNeeded: null }
  const before = new Set(
    day.groups.filter((group) => group.firstSessionAt !== null && group.firstSessionAt <= firstSessionAt).map((group) => group.id),
  )
  const carsBefore = day.cars.filter(({ group }) => before.has(group)).length
  const minutes = Math.floor(workingMinutes({ from: day.opensAt, to: firstSessionAt }, day.holes))
  const work = { cars: carsBefore, meanMin: day.plan.carMin, sdMin: day.plan.carSdMin, minutes }
  return { ...counts, carsBefore, workingMin: minutes, peopleAtLeast: peopleAtLeast(work), peopleNeeded: peopleNeeded(work) }
}
