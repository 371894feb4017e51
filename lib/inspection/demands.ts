import type { DayLog } from './day-log'
import type { Presented } from './presented'
import type { ReadEntry, SubjectLog } from './read-log'
import type { AnyRecord } from './record'
import type { Block } from './state'
import { kindOfKey } from './subject'
import { isDue } from './trigger'

/** A hold, due recall, wet switch or unknown stop, ended or not, with the checks it comes to for this subject (rules F5, F13, T3). */
export interface Demand extends Omit<Block, 'checksLeft'> {
  /** Checks to be seen for it. */
  readonly checks: readonly string[]
  /** The checks can be worked out: without a book or a `presented` it simply stands. */
  readonly isDerivable: boolean
  /** The chief lifted it. */
  readonly isLifted: boolean
}

interface Named {
  readonly kind: Block['kind']
  readonly reason: string
  readonly stations: readonly string[]
  readonly checks: readonly string[]
  readonly stickerRemoved: boolean | null
}

/** Collects the demands on a subject. Quarantine takes none of them away (rule T1). */
export function readDemands(log: SubjectLog, day: DayLog, presented: Presented): readonly Demand[] {
  const lifted = new Set(
    log
      .of('lifted')
      .filter((entry) => entry.isFull)
      .flatMap(({ record }) => record.holds),
  )
  const changes = log.of('entry-changed')
  const make = (entry: ReadEntry, named: Named) => demand(entry, named, lifted, presented)
  return [
    ...log.of('hold').map((entry) => {
      const { reason, stations, checks, stickerRemoved } = entry.record
      return make(entry, { kind: 'hold', reason, stations, checks, stickerRemoved })
    }),
    ...log
      .of('recall')
      .filter((entry) => isDue(entry.record, day, changes))
      .map((entry) => {
        const { trigger, stations, checks } = entry.record
        return make(entry, { kind: 'recall', reason: trigger.when, stations, checks, stickerRemoved: null })
      }),
    ...wetDemands(log, day, presented, make),
    ...[...log.unknownStops, ...day.unknownStops].map((entry) =>
      make(entry, { kind: 'unknown', reason: entry.record.kind, stations: [], checks: [], stickerRemoved: null }),
    ),
  ]
}

/** *Wet on* holds every car for its checks tagged wet; one that has none is not touched by it. */
function wetDemands(
  log: SubjectLog,
  day: DayLog,
  presented: Presented,
  make: (entry: ReadEntry, named: Named) => Demand,
): readonly Demand[] {
  if (kindOfKey(log.key) !== 'car' || !presented.isDerivable) return []
  const checks = [...presented.applicable].filter((id) => presented.definitions.get(id)?.some((check) => check.tags?.includes('wet')))
  if (checks.length === 0) return []
  return day.wetOn.map((entry) => {
    const made = make(entry, { kind: 'wet', reason: 'wet-declared', stations: [], checks, stickerRemoved: null })
    return day.wetInForce.has(entry.hash) ? made : { ...made, isLifted: true }
  })
}

function demand(entry: ReadEntry<AnyRecord>, named: Named, lifted: ReadonlySet<string>, presented: Presented): Demand {
  const { applicable, definitions, isDerivable } = presented
  const ofCheck = (named: string) => (applicable.has(named) ? [named] : cornersOf(named, presented))
  const ofStation = (station: string) => [...applicable].filter((id) => definitions.get(id)?.some((check) => check.station === station))
  const perStation = named.stations.map(ofStation)
  const namesNothing = named.stations.length + named.checks.length === 0
  const perCheck = named.checks.map(ofCheck)
  const namesUnknown = [...perStation, ...perCheck].some((checks) => checks.length === 0)
  return {
    hash: entry.hash,
    kind: named.kind,
    reason: named.reason,
    stations: named.stations,
    checks: [...new Set(isDerivable ? [...perCheck, ...perStation].flat() : named.checks)],
    isDerivable,
    onlyChiefLifts: namesNothing || (isDerivable && namesUnknown),
    isLifted: lifted.has(entry.hash),
    at: entry.record.at,
    stickerRemoved: named.stickerRemoved,
  }
}

/** A check asked per corner may be named without its corner, and then means all of them. */
function cornersOf(named: string, { applicable, definitions }: Presented): readonly string[] {
  return [...applicable].filter((id) => definitions.get(id)?.some((check) => id === `${named}.${check.place}`))
}
