import type { Book } from '@/lib/checklist/book'
import type { CarFacts } from '@/lib/checklist/car-facts'
import { holdRow, holdWords, resolveHold } from '@/lib/checklist/resolve-hold'
import type { Block, KillReason, PassState, SubjectState, Verdict } from '@/lib/inspection/state'
import { kindOfKey, subjectKey, type SubjectKey } from '@/lib/inspection/subject'
import { listPerson } from './list-person'
import { CHIEF_ONLY, type ListedBlock, type ListedEntry, type ListedKey, type ListedPass, type PassList } from './pass-list'
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
  // What the scrutineer saw stands above what the entry said; before anybody has seen it, what nobody said may be anything.
  const pinned = state?.presentedHeads.map(({ record }) => record.facts) ?? []
  const facts = pinned.length === 0 ? [entry.facts] : pinned
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
    passes: (state?.passes ?? []).flatMap((pass) => listPass(pass, entry.code)),
    people: entry.people.map(({ person, role }) => {
      const own = input.states.get(subjectKey({ person })) ?? null
      const fit = input.states.get(subjectKey({ fit: entry.id, person })) ?? null
      const name = input.names.get(person) ?? 'somebody without a name'
      return listPerson({ person, role, name, state: own, blocks: own ? blocksOf(own, input.book) : [], fit }, facts, input)
    }),
  }
}

const WITHDRAWN: ListedBlock = { kind: 'withdrawn', words: 'withdrawn', seeAgain: [], at: null, stickerRemoved: null }

/** Holds, due recalls, wet switches, unknown stops and fails of a subject in words, newest first. */
export function blocksOf(state: SubjectState, book: Book | null): readonly ListedBlock[] {
  const fails = state.fails.map((check): ListedBlock => {
    const head = state.checks.get(check)?.heads.find(({ outcome }) => outcome === 'fail')
    return { kind: 'fail', words: failWords(check, head?.record, book), seeAgain: [], at: head?.record.at ?? null, stickerRemoved: null }
  })
  return [...state.blocks.map((block) => listBlock(block, state, book)), ...fails].sort((a, b) => (b.at ?? 0) - (a.at ?? 0))
}

function listBlock(block: Block, state: SubjectState, book: Book | null): ListedBlock {
  const words = blockWords(block, book)
  const stations = new Set([...block.stations, ...block.checksLeft.flatMap((check) => book?.byId.get(check)?.station ?? [])])
  const named = block.onlyChiefLifts ? [CHIEF_ONLY] : [...stations].map((id) => book?.stations.get(id)?.title ?? id)
  const byEye = block.onlyChiefLifts ? [] : alsoLookFor(block, state, book)
  const seeAgain = byEye.length === 0 ? named : [...named, `by eye: ${byEye.join(', ')}`]
  const warning = block.kind === 'hold' ? (holdRow(block.reason, book)?.warning ?? null) : null
  const line = { kind: block.kind, words, seeAgain, at: block.at, stickerRemoved: block.stickerRemoved }
  return warning === null ? line : { ...line, warning }
}

/** What the reason of a hold asks to be looked at and this checklist has nothing for; empty for whatever is no hold. */
export function alsoLookFor({ kind, reason }: Pick<Block, 'kind' | 'reason'>, state: SubjectState, book: Book | null): readonly string[] {
  const row = kind === 'hold' ? holdRow(reason, book) : null
  const part = kindOfKey(state.key)
  if (row === null || part === 'event') return []
  return resolveHold(
    row,
    part,
    book,
    state.presentedHeads.map(({ record }) => record.facts),
  ).alsoLook
}

/** What a block is, in words. */
export function blockWords({ kind, reason }: Pick<Block, 'kind' | 'reason'>, book: Book | null): string {
  if (kind === 'recall') return RECALL_WORDS[reason] ?? 'recall due'
  if (kind === 'unknown') return `stopped by a newer version of Lockwire (${reason})`
  return holdWords(reason, book)
}

/** A due recall by its trigger. */
const RECALL_WORDS: Readonly<Record<string, string>> = {
  'session-over': 'recall due: to be shown after its session',
  time: 'recall due: its time has come',
  wet: 'recall due: it is wet',
  passenger: 'recall due: a passenger rides along',
}

function failWords(check: string, record: { readonly kind: string; readonly reason?: unknown } | undefined, book: Book | null): string {
  const definition = book?.byId.get(check)
  const name = definition?.short ?? check
  const reason = definition?.reasons.find(({ id }) => id === record?.reason)?.text
  return reason ? `${name}: ${reason.toLowerCase()}` : `${name} failed`
}

function listPass(pass: PassState, entry: number): readonly ListedPass[] {
  if (pass.record.kind !== 'pass') return []
  const decoded = decodeToken(pass.record.token)
  // A record whose token cannot be read, or is of another car, names no pass of this one; the record itself stays in the log.
  if (!decoded.ok || decoded.token.payload.type !== 'pass' || decoded.token.payload.entry !== entry) return []
  const { payload } = decoded.token
  const { validFrom, days, passengerSeatUsable } = payload
  const why = [...new Set(pass.killedBy.map(({ reason }) => KILL_WORDS[reason]))].join('; ')
  return [
    {
      id: passId(payload),
      typedCode: typedCode(pass.record.token),
      state: pass.state,
      why,
      validFrom,
      days,
      conditions: pass.conditions,
      passengerSeatUsable,
    },
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
