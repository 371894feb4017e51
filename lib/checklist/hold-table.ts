/** What is to be looked at again, as the table names it; `resolveHold` finds it in a checklist, or says in words that the checklist lacks it. */
export type See = {
  readonly words: string
  /** Only where the car has it: a checklist or a car without it leaves nothing to look at. */
  readonly whereFitted?: true
} & (
  | {
      readonly what: 'stations'
      /** A station is meant when its id begins so: `brake` means `brakes` and `brakes-cooling`, and not `cooling`. */
      readonly named: readonly string[]
    }
  | {
      readonly what: 'checks'
      /** Ids, without their corner or place. */
      readonly named: readonly string[]
    }
  | { readonly what: 'every-station' }
  | { readonly what: 'perishable' }
  | { readonly what: 'tagged'; readonly tag: 'wet' | 'passenger' }
)

/** One line of the hold table. A part that is null is not touched by it; an empty one is ended by the chief alone (rule F5). */
export interface HoldRow {
  readonly id: string
  readonly words: string
  readonly car: readonly See[] | null
  readonly person: readonly See[] | null
  readonly fit: readonly See[] | null
  /** Whom of those aboard it touches: who sat in it, or who is going to. */
  readonly who: 'who was in it' | 'who is going to ride or drive' | null
  /** No look ends it. */
  readonly isChiefOnly: boolean
  /** A recall that comes with it: to be shown again after one more session. */
  readonly recallAfterSession: readonly See[] | null
  /** Said with it wherever it stands. */
  readonly warning: string | null
  /** `crew`: somebody says it of one car. `event`: a switch of the whole event, never picked for one car. */
  readonly by: 'crew' | 'event'
}

const stations = (words: string, ...named: readonly string[]): See => ({ what: 'stations', words, named })
const checks = (words: string, ...named: readonly string[]): See => ({ what: 'checks', words, named })
const ifFitted = (see: See): See => ({ ...see, whereFitted: true })

const WHEELS = stations('wheels and tyres', 'wheel', 'tyre')
const SUSPENSION = stations('suspension and steering', 'suspension', 'steering')
const BRAKES = stations('brakes', 'brake')
const BODY = stations('body, aero and towing eyes', 'body', 'aero')
const ENGINE = stations('engine bay, cooling and leaks', 'engine', 'cooling')
const FUEL = stations('fuel', 'fuel')
const EXHAUST = stations('exhaust and noise', 'exhaust', 'noise')
const SEAT = stations('seat', 'seat')
const HARNESS = stations('harness and belts', 'harness', 'belt')
const CAGE = ifFitted(stations('cage and roll-over', 'cage', 'roll'))
const HIGH_VOLTAGE = ifFitted(stations('high voltage', 'high', 'voltage'))
const LEAKS = checks('leaks', 'engine.leaks', 'engine.fuel-hydraulic')
const NUTS = checks('wheel nuts', 'wheels.nuts')
const CLEARANCE = checks('clearance lock to lock', 'wheels.clearance')
const TYRES_REACHED = checks('tyres that fluid reached', 'tyres.inner-edge')
const FIT: See = { what: 'every-station', words: 'fit: reach, belts and head clearance', whereFitted: true }
const HELMET = stations('helmet and kit', 'helmet', 'kit')
const PAPERS = stations('licence, indemnity and briefing', 'sign', 'licence', 'paper', 'briefing')
const QUARANTINE = 'If it has high voltage: quarantine it, 15 m or more from people, cars and buildings.'

const PLAIN = {
  car: null,
  person: null,
  fit: null,
  who: null,
  isChiefOnly: false,
  recallAfterSession: null,
  warning: null,
  by: 'crew',
} as const satisfies Partial<HoldRow>

/**
 * Why something is held, and what is to be seen again then. The bay may add stations to a hold; only the chief may take some away, by lifting it.
 * Source: ours, from the practice of the trade; a checklist may name more under the same id, never less.
 */
export const HOLD_TABLE: readonly HoldRow[] = [
  { ...PLAIN, id: 'light-contact', words: 'Light contact, one corner', car: [WHEELS, SUSPENSION, BRAKES, BODY, LEAKS] },
  {
    ...PLAIN,
    id: 'heavy-contact',
    words: 'Heavy contact, barrier',
    // All that there is, and in words whatever of a car this checklist has nothing for.
    car: [
      { what: 'every-station', words: 'the whole car' },
      ...[WHEELS, SUSPENSION, BRAKES, BODY, ENGINE, FUEL, EXHAUST, SEAT, HARNESS, CAGE, HIGH_VOLTAGE],
    ],
    person: [HELMET],
    who: 'who was in it',
    warning: QUARANTINE,
  },
  {
    ...PLAIN,
    id: 'roll-over-fire',
    words: 'Roll-over, or fire with damage',
    car: [],
    person: [HELMET],
    who: 'who was in it',
    isChiefOnly: true,
    warning: `Not today. ${QUARANTINE}`,
  },
  {
    ...PLAIN,
    id: 'gravel-grass',
    words: 'Gravel or grass',
    car: [WHEELS, BRAKES, ENGINE, stations('undertray', 'body'), checks('throttle', 'engine.throttle')],
  },
  {
    ...PLAIN,
    id: 'kerb-strike',
    words: 'Kerb strike, landing',
    car: [WHEELS, SUSPENSION, checks('sump', 'engine.leaks'), EXHAUST, HIGH_VOLTAGE],
    warning: 'If it has high voltage under the floor: quarantine it until it has been looked at.',
  },
  {
    ...PLAIN,
    id: 'fluid-dropped',
    words: 'Fluid dropped',
    car: [ENGINE, FUEL, BRAKES, TYRES_REACHED, EXHAUST],
    recallAfterSession: [LEAKS],
  },
  { ...PLAIN, id: 'noise-over', words: 'Noise over the limit', car: [EXHAUST] },
  {
    ...PLAIN,
    id: 'brakes-changed',
    words: 'Pads, discs, hose, caliper or fluid changed',
    car: [BRAKES, NUTS],
    recallAfterSession: [checks('brake pedal', 'brakes.pedal')],
  },
  {
    ...PLAIN,
    id: 'suspension-changed',
    words: 'Springs, dampers, camber or ride height changed',
    car: [SUSPENSION, CLEARANCE, checks('brake hoses', 'brakes.hoses'), NUTS],
  },
  {
    ...PLAIN,
    id: 'wheel-set-changed',
    words: 'Wheel set changed',
    car: [NUTS, WHEELS, CLEARANCE],
  },
  {
    ...PLAIN,
    id: 'harness-touched',
    words: 'Seat, harness or cage touched',
    car: [SEAT, HARNESS, CAGE],
    fit: [FIT],
    who: 'who is going to ride or drive',
  },
  {
    ...PLAIN,
    id: 'other-driver',
    words: 'Another driver in it',
    person: [{ what: 'every-station', words: 'the person' }, PAPERS, HELMET],
    fit: [FIT],
    who: 'who is going to ride or drive',
  },
  {
    ...PLAIN,
    id: 'passenger-in',
    words: 'A passenger in it',
    car: [{ what: 'tagged', tag: 'passenger', words: 'passenger seat and belts' }],
    person: [{ what: 'every-station', words: 'the person' }, PAPERS, HELMET],
    fit: [FIT],
    who: 'who is going to ride or drive',
  },
  {
    ...PLAIN,
    id: 'wet-declared',
    words: 'Wet declared',
    car: [{ what: 'tagged', tag: 'wet', words: 'tyres, lights and wipers for the wet' }],
    by: 'event',
  },
  {
    ...PLAIN,
    id: 'second-day',
    words: 'Second day: not yet asked what was touched overnight',
    car: [{ what: 'perishable', words: 'all that perishes' }],
    warning: 'Ask “what did you touch overnight?” and have it signed.',
  },
  { ...PLAIN, id: 'driving-standard', words: 'Driving standard', person: [], who: 'who was in it', isChiefOnly: true },
  { ...PLAIN, id: 'no-briefing', words: 'No briefing', person: [], who: 'who was in it', isChiefOnly: true },
]

/** What may always be said: something no line of the table fits. Naming nothing to see again, it is ended by the chief alone. */
export const SOMETHING_ELSE: HoldRow = { ...PLAIN, id: 'something-else', words: 'Something else', car: [], isChiefOnly: true }
