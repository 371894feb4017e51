import { applicableChecks } from '@/lib/checklist/applicable-checks'
import type { Book } from '@/lib/checklist/book'
import type { CarFacts } from '@/lib/checklist/car-facts'
import type { Block, KillReason, PassState, SubjectState, Verdict } from '@/lib/inspection/state'
import { subjectKey, type SubjectKey } from '@/lib/inspection/subject'
import { addDays, civilDate } from '@/lib/rules/civil-date'
import type { ListedBlock, ListedEntry, ListedKey, ListedPass, ListedPerson, PassList } from './pass-list'
import { passId } from './pass-payload'
import { decodeToken } from './token'
import { typedCode } from './typed-code'

/** An entry as the event's rows (and what records changed about it) have it. */
export interface EntryForList {
  readonly id: string
  readonly code: number
  readonly number: string
  readonly plate: string
  readonly plateTail: string
  readonly colour: string
  readonly model: string
  readonly group: string
  readonly groupName: string
  readonly withdrawn: boolean
  readonly facts: CarFacts
  readonly people: readonly { readonly person: string; readonly role: 'driver' | 'passenger' | 'instructor' }[]
}

export interface PassListInput {
  readonly seq: number
  readonly version: number
  /** Server time, ms. */
  readonly at: number
  readonly eventCode: number
  readonly day: string
  readonly entries: readonly EntryForList[]
  readonly states: ReadonlyMap<SubjectKey, SubjectState>
  readonly names: ReadonlyMap<string, string>
  readonly keys: readonly ListedKey[]
  /** For words and for which fits are asked; null where it cannot be opened, and then every fit is open. */
  readonly book: Book | null
}

/** The pass list from the fold: what the pit exit needs of every entry, in words it can show as they are. */
export function buildPassList(input: PassListInput): PassList {
  const { seq, version, at, eventCode, day, keys } = input
  return { seq, version, at, eventCode, day, keys, entries: input.entries.map((entry) => listEntry(entry, input)) }
}

/** One entry's line of the list; also what a device overlays with its own log. */
export function listEntry(entry: EntryForList, input: Pick<PassListInput, 'states' | 'names' | 'book' | 'day'>): ListedEntry {
  const state = input.states.get(subjectKey({ car: entry.id })) ?? null
  const verdict: Verdict = entry.withdrawn ? 'withdrawn' : (state?.verdict ?? 'not presented')
  return {
    entry: entry.id,
    code: entry.code,
    number: entry.number,
    plate: entry.plate,
    plateTail: entry.plateTail,
    colour: entry.colour,
    model: entry.model,
    group: entry.group,
    groupName: entry.groupName,
    verdict,
    blocks: [...(verdict === 'withdrawn' ? [WITHDRAWN] : []), ...(state ? blocksOf(state, input.book) : [])],
    passes: (state?.passes ?? []).flatMap((pass) => listPass(pass)),
    people: entry.people.map(({ person, role }) => listPerson(entry, person, role, input)),
  }
}

const WITHDRAWN: ListedBlock = { kind: 'withdrawn', words: 'withdrawn', seeAgain: [], at: null, stickerRemoved: null }

/** Holds, due recalls and fails of a subject in words, newest first. */
export function blocksOf(state: SubjectState, book: Book | null): readonly ListedBlock[] {
  const fails = state.fails.map((check): ListedBlock => {
    const head = state.checks.get(check)?.heads.find(({ outcome }) => outcome === 'fail')
    return { kind: 'fail', words: failWords(check, head?.record, book), seeAgain: [], at: head?.record.at ?? null, stickerRemoved: null }
  })
  return [...state.blocks.map((block) => listBlock(block, book)), ...fails].sort((a, b) => (b.at ?? 0) - (a.at ?? 0))
}

function listBlock(block: Block, book: Book | null): ListedBlock {
  const words = book?.checklist.holdReasons.find(({ id }) => id === block.reason)?.text ?? block.reason.replace(/-/g, ' ')
  const stations = new Set([...block.stations, ...block.checksLeft.flatMap((check) => book?.byId.get(check)?.station ?? [])])
  const seeAgain = block.onlyChiefLifts ? ['only the chief lifts it'] : [...stations].map((id) => book?.stations.get(id)?.title ?? id)
  return { kind: block.kind, words, seeAgain, at: block.at, stickerRemoved: block.stickerRemoved }
}

function failWords(check: string, record: { readonly kind: string; readonly reason?: unknown } | undefined, book: Book | null): string {
  const definition = book?.byId.get(check)
  const name = definition?.short ?? check
  const reason = definition?.reasons.find(({ id }) => id === record?.reason)?.text
  return reason ? `${name}: ${reason.toLowerCase()}` : `${name} failed`
}

function listPass(pass: PassState): readonly ListedPass[] {
  if (pass.record.kind !== 'pass') return []
  const decoded = decodeToken(pass.record.token)
  // A record whose token cannot be read names no pass; the record itself stays in the log.
  if (!decoded.ok) return []
  const { payload } = decoded.token
  const { validFrom, days } = payload
  const why = pass.killedBy.map(({ reason }) => KILL_WORDS[reason])[0] ?? ''
  return [
    { id: passId(payload), typedCode: typedCode(pass.record.token), state: pass.state, why, validFrom, days, conditions: pass.conditions },
  ]
}

/** Why a pass died, as the pit exit says it. */
export const KILL_WORDS: Readonly<Record<KillReason, string>> = {
  'fail-not-answered': 'something failed that it did not know of',
  'hold-not-answered': 'held since',
  'recall-not-answered': 'a recall fell due',
  'repair-not-answered': 'something was put right since',
  'pins-changed': 'what had to be looked at has changed',
  'entry-changed': 'number, plate or car facts have changed',
  'fail-stands-again': 'a fail it ran with stands again',
  void: 'declared void',
  replaced: 'replaced by a newer one',
  withdrawn: 'the entry was withdrawn',
}

function listPerson(
  entry: EntryForList,
  person: string,
  role: ListedPerson['role'],
  { states, names, book, day }: Pick<PassListInput, 'states' | 'names' | 'book' | 'day'>,
): ListedPerson {
  const state = states.get(subjectKey({ person })) ?? null
  const fitState = states.get(subjectKey({ fit: entry.id, person })) ?? null
  const bands = (state?.passes ?? []).filter((pass) => pass.record.kind === 'band')
  const live = bands.findLast((pass) => pass.state === 'live' && coversDay(pass, day))
  const blocks = state ? blocksOf(state, book) : []
  const band = !live ? (bands.length > 0 ? 'dead' : 'none') : blocks.length > 0 ? 'held' : 'live'
  const fit = fitOf(fitState, entry, book)
  const last = live ?? bands.at(-1)
  return {
    person,
    name: names.get(person) ?? 'somebody without a name',
    role,
    bandNumber: last?.record.kind === 'band' ? last.record.bandNumber : null,
    band,
    why:
      band === 'live'
        ? fit === 'failed'
          ? 'does not fit this car'
          : fit === 'open'
            ? 'fit in this car not seen'
            : ''
        : whyNoBand(band, blocks),
    fit,
  }
}

function whyNoBand(band: Exclude<ListedPerson['band'], 'live'>, blocks: readonly ListedBlock[]): string {
  const words = blocks.map((block) => block.words).join(', ')
  if (band === 'none') return words ? `no band: ${words}` : 'no band yet'
  return band === 'held' ? `held: ${words}` : words ? `band is dead: ${words}` : 'band is dead: to be seen again'
}

function coversDay(pass: PassState, day: string): boolean {
  const decoded = decodeToken(pass.record.token)
  if (!decoded.ok) return false
  const { validFrom, days } = decoded.token.payload
  return validFrom <= day && day < addDays(civilDate(validFrom), days)
}

function fitOf(state: SubjectState | null, entry: EntryForList, book: Book | null): ListedPerson['fit'] {
  if (state && state.fails.length > 0) return 'failed'
  if (state && (state.verdict === 'passed' || state.verdict === 'passed with advisories')) return 'passed'
  if (state && state.blocks.length > 0) return 'open'
  if (book === null) return 'open'
  return applicableChecks(book, 'fit', entry.facts).some((check) => check.required) ? 'open' : 'not-asked'
}
