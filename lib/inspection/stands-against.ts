import { readDay } from './day-log'
import type { LogEntry } from './log-entry'
import { isKnown, type AnyRecord, type KnownRecord, type RecordOf } from './record'
import { readLog, type ReadEntry } from './read-log'
import type { Block, SubjectState } from './state'
import type { SubjectKey } from './subject'
import { isDue } from './trigger'

/** How a hold or recall ended: lifted by the chief, or everything it named seen again, told by the last look that answers it. */
export type Ending =
  | { readonly how: 'lifted'; readonly at: number; readonly actor: string; readonly why: string }
  | { readonly how: 'seen'; readonly at: number; readonly actor: string }
  | { readonly how: 'dry'; readonly at: null; readonly actor: null }

/** A hold, recall, wet switch or unknown stop upon one subject, standing, waiting or ended: for lists; what it does is the fold's. */
export interface Against {
  readonly hash: string
  readonly kind: Block['kind']
  readonly record: AnyRecord
  /** By the corrected clock of whoever made it, ms. */
  readonly at: number
  readonly actor: string
  /** `waiting`: a recall that is not due yet. */
  readonly state: 'standing' | 'waiting' | 'ended'
  /** What is left of it; null unless it stands. */
  readonly block: Block | null
  /** Null unless it has ended. */
  readonly ending: Ending | null
}

/** All that was ever held against one subject, newest first. `entries` are its records and the event's own. */
export function standsAgainst(entries: readonly LogEntry[], key: SubjectKey, state: SubjectState): readonly Against[] {
  const log = readLog(entries, key)
  const day = readDay(entries)
  const changes = log.of('entry-changed')
  const lifts = log.of('lifted').filter(({ isFull }) => isFull)
  const blocks = new Map(state.blocks.map((block) => [block.hash, block]))

  const line = (entry: ReadEntry, kind: Against['kind'], isWaiting: boolean): Against => {
    const block = blocks.get(entry.hash) ?? null
    const lift = endingByLift(entry.hash, lifts)
    const ending = block !== null || (isWaiting && lift === null) ? null : (lift ?? endingByLooks(entry.hash, log.of('finding')))
    const state = block !== null ? 'standing' : ending !== null ? 'ended' : 'waiting'
    return { hash: entry.hash, kind, record: entry.record, at: atOf(entry.record), actor: entry.record.actor, state, block, ending }
  }
  const asked = new Set(state.toAnswer)
  return [
    ...log.of('hold').map((entry) => line(entry, 'hold', false)),
    ...log.of('recall').map((entry) => line(entry, 'recall', !isDue(entry.record, day, changes))),
    ...day.wetOn.filter(({ hash }) => asked.has(hash) || blocks.has(hash)).map((entry) => line(entry, 'wet', false)),
    ...[...log.unknownStops, ...day.unknownStops].map((entry) => line(entry, 'unknown', false)),
  ].sort((a, b) => b.at - a.at || (a.hash < b.hash ? -1 : 1))
}

function endingByLift(hash: string, lifts: readonly ReadEntry<RecordOf<'lifted'>>[]): Ending | null {
  const lift = lifts.find(({ record }) => record.holds.includes(hash))?.record
  return lift === undefined ? null : { how: 'lifted', at: atOf(lift), actor: lift.actor, why: lift.why }
}

/** The look that came last of those that answer it; none where a wet switch simply ended. */
function endingByLooks(hash: string, findings: readonly ReadEntry<RecordOf<'finding'>>[]): Ending {
  const looks = findings.filter(({ record, isFull }) => isFull && record.answers.includes(hash)).map(({ record }) => record)
  const last = looks.reduce<RecordOf<'finding'> | null>((most, one) => (most !== null && atOf(most) >= atOf(one) ? most : one), null)
  return last === null ? { how: 'dry', at: null, actor: null } : { how: 'seen', at: atOf(last), actor: last.actor }
}

function atOf(record: AnyRecord): number {
  return isKnown(record) ? correctedAt(record) : record.at
}

/** When a record was made by the clock of whoever made it, put right by what was then known of it, ms. */
export function correctedAt({ at, offset }: Pick<KnownRecord, 'at' | 'offset'>): number {
  return at + offset
}
