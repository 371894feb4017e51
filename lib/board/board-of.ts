import type { Book } from '@/lib/checklist/book'
import type { Board, BoardGroup, BoardRow } from '@/lib/contracts/board'
import type { SubjectState } from '@/lib/inspection/state'
import { subjectKey } from '@/lib/inspection/subject'
import { wireSentence, wireStations } from '@/lib/inspection/wire'
import { bandToday } from '@/lib/pass/live-band'
import { compareNumbers } from './compare-numbers'
import { firstSessionOn, forecastOf, morningOf, type TimetableLine } from './forecast-of'
import type { DayReading } from './day-reading'
import { needsOfCar, needsOfPerson } from './needs-of'

/** An entry as its rows say it. */
export interface EntryFacts {
  readonly id: string
  readonly number: string
  readonly plate: string
  readonly plateTail: string
  readonly model: string
  readonly colour: string
  readonly group: string
  readonly withdrawn: boolean
  readonly people: readonly { readonly id: string; readonly name: string; readonly isDriver: boolean }[]
}

export interface EventFacts {
  readonly timeZone: string
  readonly checklistHash: string
  readonly limitsHash: string
  /** In their running order. */
  readonly groups: readonly Pick<BoardGroup, 'id' | 'name'>[]
  readonly timetable: readonly TimetableLine[]
  readonly entries: readonly EntryFacts[]
}

const NOTHING_TO_SAY = { is: 'too early to say', lastAt: null, toGo: 0 } as const

/** The board: how every entry stands by this reading of the log, grouped and sorted by number. */
export function boardOf(event: EventFacts, reading: DayReading, at: number): Board {
  const book = reading.bookOf(event.checklistHash, event.limitsHash)
  const stations = book?.checklist.stations.filter(({ subject }) => subject === 'car') ?? []
  const order = new Map(event.groups.map(({ id }, index) => [id, index]))
  const place = (row: BoardRow) => order.get(row.group) ?? order.size
  const rows = event.entries
    .map((entry) => rowOf(entry, reading, book))
    .toSorted((a, b) => place(a) - place(b) || compareNumbers(a.number, b.number))
  const groupOf = new Map(rows.map(({ id, group }) => [id, group]))
  const left = new Set(rows.filter(({ verdict }) => verdict === 'withdrawn').map(({ id }) => id))
  const running = event.entries.filter(({ id }) => !left.has(id))
  const groups = event.groups.map((group) => ({
    ...group,
    firstSessionAt: firstSessionOn(reading.day, group.id, event.timetable),
    ...countsOf(rows.filter((row) => row.group === group.id)),
    ...peopleOf(
      running.filter((entry) => groupOf.get(entry.id) === group.id),
      reading,
    ),
  }))
  const mornings = rows
    .filter(({ verdict }) => verdict !== 'withdrawn')
    .map(({ id, group }) => morningOf(reading.stateOf(subjectKey({ car: id })), group, reading.day))
  const forecasts = forecastOf(groups, mornings, event.timetable, at)
  return {
    at,
    seq: reading.seq,
    day: reading.day,
    timeZone: event.timeZone,
    stations: stations.map(({ id, title, short }) => ({ station: id, title, short })),
    groups: groups.map((group) => ({ ...group, forecast: forecasts.get(group.id) ?? NOTHING_TO_SAY })),
    rows,
  }
}

/** Whether a verdict lets a car run, with a pass. */
export function isPassed({ verdict }: Pick<BoardRow, 'verdict'>): boolean {
  return verdict === 'passed' || verdict === 'passed with advisories'
}

function countsOf(rows: readonly BoardRow[]): Pick<BoardGroup, 'entries' | 'passed'> {
  const running = rows.filter(({ verdict }) => verdict !== 'withdrawn')
  return { entries: running.length, passed: running.filter(isPassed).length }
}

/** Who is to sit in these cars, each counted once, and who of them may. */
function peopleOf(entries: readonly EntryFacts[], reading: DayReading): Pick<BoardGroup, 'people' | 'banded'> {
  const people = new Set(entries.flatMap((entry) => entry.people.map(({ id }) => id)))
  const banded = [...people].filter((person) => bandToday(reading.stateOf(subjectKey({ person })), reading.day) !== null)
  return { people: people.size, banded: banded.length }
}

function rowOf(entry: EntryFacts, reading: DayReading, book: Book | null): BoardRow {
  const state = reading.stateOf(subjectKey({ car: entry.id }))
  const own = pinnedBook(state, reading) ?? book
  const bolts = own === null ? [] : wireStations(state, own)
  const now = reading.entryNow(entry.id)
  const isLookedAt = state.depth !== null || state.checks.size > 0
  return {
    id: entry.id,
    number: now?.number ?? entry.number,
    // A record tells only the plate's end.
    plate: now === null || now.plateTail === entry.plateTail ? entry.plate : `…${now.plateTail}`,
    model: entry.model,
    colour: entry.colour,
    group: now?.group ?? entry.group,
    drivers: entry.people.filter(({ isDriver }) => isDriver).map(({ name }) => name),
    verdict: entry.withdrawn ? 'withdrawn' : state.verdict,
    wire: (book?.checklist.stations ?? [])
      .filter(({ subject }) => subject === 'car')
      .map(({ id }) => bolts.find(({ station }) => station === id)?.state ?? 'na'),
    sentence: own === null ? 'The checklist is not at hand' : wireSentence(bolts),
    open: isLookedAt ? state.open.length : null,
    needs: entry.withdrawn
      ? []
      : [
          ...needsOfCar(state, reading.setAsideOf(state.key), own),
          ...entry.people.flatMap(({ id, name }) => needsOfPerson(name, reading.stateOf(subjectKey({ person: id })))),
        ],
  }
}

/** The book that the car was presented under; null before that. */
function pinnedBook({ presentedHeads }: SubjectState, reading: DayReading): Book | null {
  const pinned = presentedHeads.at(-1)?.record
  return pinned === undefined ? null : reading.bookOf(pinned.checklist, pinned.limits)
}
