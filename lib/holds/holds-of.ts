import type { Book } from '@/lib/checklist/book'
import type { HoldLine, Holds, TwoPasses } from '@/lib/contracts/holds'
import { readDay } from '@/lib/inspection/day-log'
import { readLog } from '@/lib/inspection/read-log'
import { correctedAt, standsAgainst, type Against } from '@/lib/inspection/stands-against'
import type { SubjectState } from '@/lib/inspection/state'
import { subjectKey, type SubjectKey } from '@/lib/inspection/subject'
import { againstWords } from '@/lib/pass/against-words'
import { civilDate } from '@/lib/rules/civil-date'
import { dateInWords } from '@/lib/rules/date-in-words'
import type { TriggerNames } from '@/lib/pass/trigger-words'
import { typedCode } from '@/lib/pass/typed-code'
import type { HoldsReading } from './holds-reading'

/** The event's rows as the list needs them. */
export interface HoldsFacts extends TriggerNames {
  readonly eventId: string
  readonly checklistHash: string
  readonly limitsHash: string
  readonly entries: readonly {
    readonly id: string
    readonly number: string
    readonly plate: string
    readonly model: string
    readonly people: readonly string[]
  }[]
  /** Everybody of the event, crew included. */
  readonly names: ReadonlyMap<string, string>
}

type About = Pick<HoldLine, 'entry' | 'number' | 'plate' | 'model' | 'person'>

/** Every hold, recall and dispensation of the event in words, newest first, and the cars of which two passes live. */
export function holdsOf(facts: HoldsFacts, reading: HoldsReading, at: number): Holds {
  const book = reading.bookOf(facts.checklistHash, facts.limitsHash)
  const lines = subjectsOf(facts, reading).flatMap(({ key, about }) => linesOf(key, about, facts, reading, book))
  return {
    at,
    day: reading.day,
    timeZone: facts.event.timeZone,
    isWet: readDay(reading.recordsOf(subjectKey({ event: facts.eventId }))).wetInForce.size > 0,
    lines: lines.toSorted((a, b) => b.at - a.at || (a.id < b.id ? -1 : 1)),
    twoPasses: facts.entries.flatMap((entry) => twoPassesOf(entry, facts, reading)),
  }
}

/** Cars, then each person once, under the first car they sit in, then each of them in each car. */
function subjectsOf({ entries, names }: HoldsFacts, reading: HoldsReading): readonly { readonly key: SubjectKey; readonly about: About }[] {
  const seen = new Set<string>()
  return entries.flatMap((entry) => {
    const { id, plate, model, people } = entry
    const about: About = { entry: id, number: reading.entryNow(id)?.number ?? entry.number, plate, model, person: '' }
    const own = people.flatMap((person) => {
      const name = names.get(person) ?? 'somebody without a name'
      const fit = { key: subjectKey({ fit: id, person }), about: { ...about, person: `${name} in this car` } }
      if (seen.has(person)) return [fit]
      seen.add(person)
      return [{ key: subjectKey({ person }), about: { ...about, person: name } }, fit]
    })
    return [{ key: subjectKey({ car: id }), about }, ...own]
  })
}

function linesOf(key: SubjectKey, about: About, facts: HoldsFacts, reading: HoldsReading, book: Book | null): readonly HoldLine[] {
  const entries = reading.recordsOf(key)
  const state = reading.stateOf(key)
  const nameOf = (actor: string) => facts.names.get(actor) ?? 'somebody of the crew'
  const against = standsAgainst(entries, key, state).map((one): HoldLine => {
    const { what, seeAgain, alsoLook } = againstWords(one, state, book, facts)
    const { hash, kind, at, actor, block, record, ending } = one
    return {
      ...about,
      id: hash,
      kind,
      state: one.state,
      what,
      at,
      day: record.day,
      by: nameOf(actor),
      seeAgain: [...seeAgain],
      alsoLook: one.state === 'ended' ? [] : [...alsoLook],
      onlyChiefLifts: block?.onlyChiefLifts ?? false,
      stickerRemoved: block?.stickerRemoved ?? null,
      ending: endingOf(ending, nameOf),
    }
  })
  return [...against, ...dispensationsOf(key, about, entries, state, nameOf, book)]
}

function endingOf(ending: Against['ending'], nameOf: (actor: string) => string): HoldLine['ending'] {
  if (ending === null) return null
  const by = ending.actor === null ? '' : nameOf(ending.actor)
  return { how: ending.how, at: ending.at, by, why: ending.how === 'lifted' ? ending.why : '' }
}

/** Fails that run under conditions: exceptions as much as holds are, with the name and the reason. */
function dispensationsOf(
  key: SubjectKey,
  about: About,
  entries: ReturnType<HoldsReading['recordsOf']>,
  state: SubjectState,
  nameOf: (actor: string) => string,
  book: Book | null,
): readonly HoldLine[] {
  return readLog(entries, key)
    .of('dispensation')
    .map(({ hash, record }) => {
      const stands = state.checks.get(record.check)?.dispensation?.hash === hash
      const until = record.until === null ? 'to the event’s end' : `to the end of ${dateInWords(civilDate(record.until))}`
      const check = book?.byId.get(record.check)
      return {
        ...about,
        id: hash,
        kind: 'dispensation' as const,
        state: stands ? ('standing' as const) : ('ended' as const),
        what: `Fail accepted ${until} (${check?.short ?? record.check}). Only with: ${record.conditions}. Because: ${record.reason}`,
        at: correctedAt(record),
        day: record.day,
        by: nameOf(record.actor),
        seeAgain: [],
        alsoLook: [],
        onlyChiefLifts: false,
        stickerRemoved: null,
        ending: null,
      }
    })
}

function twoPassesOf(entry: HoldsFacts['entries'][number], facts: HoldsFacts, reading: HoldsReading): readonly TwoPasses[] {
  const live = reading.stateOf(subjectKey({ car: entry.id })).passes.filter(({ state }) => state === 'live')
  if (live.length < 2) return []
  const passes = live.map(({ hash, record }) => ({
    hash,
    typedCode: typedCode(record.token),
    at: correctedAt(record),
    by: facts.names.get(record.actor) ?? 'somebody of the crew',
  }))
  return [{ entry: entry.id, number: reading.entryNow(entry.id)?.number ?? entry.number, plate: entry.plate, model: entry.model, passes }]
}
