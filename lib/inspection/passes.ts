import { outcomeOf, type CheckLine } from './check-line'
import type { DayLog } from './day-log'
import type { Demand } from './demands'
import { endingsOf, type CheckHeads } from './heads'
import { checksUnder, pinsOf, type Presented } from './presented'
import type { ReadEntry, SubjectLog } from './read-log'
import type { RecordOf } from './record'
import { isRepair, type Repair } from './repairs'
import type { FoldContext, KillReason, PassState } from './state'
import { kindOfKey } from './subject'

type PassEntry = ReadEntry<RecordOf<'pass'> | RecordOf<'band'>>
type ChangeEntry = ReadEntry<RecordOf<'entry-changed'>>

/** All of a subject's log that may kill a pass or band (rule F7). Each part only grows as records come, and so a dead pass stays dead. */
export interface Killers {
  readonly fails: readonly { readonly line: CheckLine; readonly heads: CheckHeads }[]
  /** Holds, wet switches and unknown stops, ended or not. */
  readonly holds: readonly string[]
  readonly recalls: readonly string[]
  readonly repairs: readonly string[]
  readonly presented: Presented['all']
  /** Every `presented`, believed or not: what a pass answers with its pins. */
  readonly anyPresented: Presented['all']
  readonly changes: readonly ChangeEntry[]
  readonly withdrawals: readonly ChangeEntry[]
  readonly voids: readonly ReadEntry<RecordOf<'void'>>[]
  readonly passes: readonly PassEntry[]
  /** What ended a fail and is no repair, and what the chief adopted: a pass names them to show that it knew. */
  readonly grounds: readonly string[]
}

const KILLING_CHANGES: readonly string[] = ['number', 'plate', 'facts']

export function readKillers(
  log: SubjectLog,
  day: DayLog,
  checks: readonly CheckHeads[],
  demands: readonly Demand[],
  repairs: readonly Repair[],
  presented: Presented,
  context: FoldContext,
): Killers {
  const fails = checks.flatMap((heads) => heads.group.lines.filter((line) => outcomeOf(line) === 'fail').map((line) => ({ line, heads })))
  const endings = fails.flatMap(({ line, heads }) => endersOf(line, heads))
  const hashesOf = (...kinds: readonly Demand['kind'][]) => demands.filter(({ kind }) => kinds.includes(kind)).map(({ hash }) => hash)
  return {
    fails,
    holds: [...hashesOf('hold', 'unknown'), ...wetThatTouches(log, day, presented, context)],
    recalls: hashesOf('recall'),
    repairs: repairs.map(({ hash }) => hash),
    presented: presented.all,
    anyPresented: log.of('presented'),
    changes: log.of('entry-changed').filter(({ record }) => KILLING_CHANGES.includes(record.change.what)),
    withdrawals: log.of('entry-changed').filter(({ record }) => record.change.what === 'withdrawn'),
    voids: log.of('void'),
    passes: [...log.of('pass'), ...log.of('band')],
    grounds: [
      ...endings,
      ...log
        .of('adopted')
        .filter((entry) => entry.isFull)
        .map(({ hash }) => hash),
    ],
  }
}

/** Lines that name the fail and may have ended it, expired dispensations too. */
function endersOf(fail: CheckLine, heads: CheckHeads): readonly string[] {
  return [...heads.edges]
    .filter(([line, targets]) => targets.includes(fail) && outcomeOf(line) !== 'fail' && !isRepair(line, heads))
    .map(([line]) => line.hash)
}

/** Wet switches for which any `presented`, replaced or not, has a check: a correction of the facts revives nothing. */
function wetThatTouches(log: SubjectLog, day: DayLog, presented: Presented, context: FoldContext): readonly string[] {
  const kind = kindOfKey(log.key)
  if (kind !== 'car') return []
  const touches = presented.all.some((entry) => checksUnder(entry, kind, context)?.some((check) => check.tags?.includes('wet')) ?? true)
  return touches ? day.wetOn.map(({ hash }) => hash) : []
}

/** Hashes that a new pass or band must name in `answers` to live (rule F7). */
export function hashesToAnswer(killers: Killers): readonly string[] {
  const { fails, holds, recalls, repairs, presented, changes, withdrawals, grounds } = killers
  const entries = [...fails.map(({ line }) => line), ...presented, ...changes, ...withdrawals]
  return [...new Set([...entries.map(({ hash }) => hash), ...holds, ...recalls, ...repairs, ...grounds])].sort()
}

/** What has become of each pass or band, oldest first. */
export function passStates(killers: Killers, conditions: readonly string[], context: FoldContext): readonly PassState[] {
  return killers.passes
    .map((entry): PassState => {
      const killedBy = killedByAny(entry, killers, context)
      const state = killedBy.length > 0 ? 'dead' : entry.isFull ? 'live' : 'quarantined'
      return { hash: entry.hash, record: entry.record, state, killedBy, conditions }
    })
    .sort((a, b) => a.record.at - b.record.at || a.record.deviceSeq - b.record.deviceSeq || (a.hash < b.hash ? -1 : 1))
}

function killedByAny(pass: PassEntry, killers: Killers, context: FoldContext): PassState['killedBy'] {
  const answers = new Set(pass.record.answers)
  const unanswered = (reason: KillReason, hashes: readonly string[]) =>
    hashes.filter((hash) => !answers.has(hash)).map((hash) => ({ reason, hash }))
  const because = (reason: KillReason, entries: readonly { readonly hash: string }[]) => entries.map(({ hash }) => ({ reason, hash }))
  return [
    ...unanswered(
      'fail-not-answered',
      killers.fails.map(({ line }) => line.hash),
    ),
    ...unanswered('hold-not-answered', killers.holds),
    ...unanswered('recall-not-answered', killers.recalls),
    ...unanswered('repair-not-answered', killers.repairs),
    ...because('pins-changed', presentedOtherwise(answers, killers)),
    ...unanswered(
      'entry-changed',
      killers.changes.map(({ hash }) => hash),
    ),
    ...because(
      'fail-stands-again',
      killers.fails
        .filter(({ line, heads }) => answers.has(line.hash) && !isEndedFor(answers, line, heads, context))
        .map(({ line }) => line),
    ),
    ...because(
      'void',
      killers.voids.filter(({ record }) => record.voids === pass.hash),
    ),
    ...because(
      'replaced',
      killers.passes.filter((other) => other !== pass && other.record.basis.includes(pass.hash)),
    ),
    ...unanswered(
      'withdrawn',
      killers.withdrawals.map(({ hash }) => hash),
    ),
  ]
}

/**
 * Whether an answered fail is over by something the pass knew, adoptions included. Asking what the pass knew, not what ended the fail
 * since, is what keeps a pass dead: whatever ends the fail later is not among its answers.
 */
function isEndedFor(answers: ReadonlySet<string>, fail: CheckLine, heads: CheckHeads, context: FoldContext): boolean {
  const isKnownFull = (line: CheckLine) => line.isFull && (line.adoptedBy.length === 0 || line.adoptedBy.some((hash) => answers.has(hash)))
  return endingsOf(fail, heads, context, isKnownFull).some((line) => answers.has(line.hash))
}

/** Any `presented` whose pins differ from all that the pass answers. */
function presentedOtherwise(answers: ReadonlySet<string>, { presented, anyPresented }: Killers): Presented['all'] {
  // A quarantined one counts here: were it adopted later, the pass it was answered by must not come back to life.
  const pinned = new Set(anyPresented.filter(({ hash }) => answers.has(hash)).map(pinsOf))
  return presented.filter((entry) => !pinned.has(pinsOf(entry)))
}
