import type { Depth } from '@/lib/checklist/checklist'
import type { KnownRecord, RecordOf } from './record'
import type { SubjectKey } from './subject'

export const VERDICTS = [
  'withdrawn',
  'held',
  'not passed',
  'in progress',
  'declared only',
  'not presented',
  'passed with advisories',
  'passed',
] as const
export type Verdict = (typeof VERDICTS)[number]

/** How a check stands: the most severe of its heads (rule F2), or why it has none that counts. */
export type Standing = 'ok' | 'advisory' | 'fail' | 'could-not-see' | 'undecided' | 'not-seen' | 'does-not-apply'

/** A finding, ruling or dispensation on one check that nothing has replaced. */
export interface Head {
  readonly hash: string
  readonly record: RecordOf<'finding'> | RecordOf<'ruling'> | RecordOf<'dispensation'>
  /** What it says: a dispensation ranks as advisory. */
  readonly outcome: 'ok' | 'advisory' | 'fail' | 'could-not-see' | 'unseen'
  readonly quarantined: boolean
  /** An ok or advisory on a perishable check of another venue day (rule F9), or carried forward on one (F11): shown, not counted. */
  readonly lapsed: boolean
  /** The fails a dispensation accepts: whoever replaces it names them too (rule M5). Empty for anything else. */
  readonly beneath: readonly string[]
}

export interface CheckState {
  readonly check: string
  readonly standing: Standing
  readonly heads: readonly Head[]
  /** Heads that count and do not agree. */
  readonly disagreement: boolean
  readonly required: boolean
  /** Why it must be seen again: hashes of holds, due recalls and repairs that no head of it answers yet. */
  readonly unanswered: readonly string[]
  /** Every hold, due recall, wet switch and repair that names this check or its station, ended or not: a new finding's `answers` (rule M5). */
  readonly toAnswer: readonly string[]
  /** The accepted fail is on, with these conditions (rule F4). */
  readonly dispensation: { readonly hash: string; readonly conditions: string; readonly until: string | null } | null
}

/** A hold, due recall or wet switch that has not ended. */
export interface Block {
  readonly hash: string
  readonly kind: 'hold' | 'recall' | 'wet' | 'unknown'
  readonly reason: string
  /** Stations it names. */
  readonly stations: readonly string[]
  /** Checks still to be seen for it; empty where only the chief can lift it. */
  readonly checksLeft: readonly string[]
  readonly onlyChiefLifts: boolean
  readonly at: number
  readonly stickerRemoved: boolean | null
}

export interface SubjectState {
  readonly key: SubjectKey
  readonly verdict: Verdict
  readonly withdrawn: boolean
  /** The withdrawals in force; a `returned` names them in `basis`. */
  readonly withdrawnBy: readonly string[]
  readonly blocks: readonly Block[]
  readonly checks: ReadonlyMap<string, CheckState>
  /** Deepest depth of the `presented` heads; null before the first. */
  readonly depth: Depth | null
  readonly presentedHeads: readonly { readonly hash: string; readonly record: RecordOf<'presented'> }[]
  /** Required checks that keep the subject from passing, in checklist order. */
  readonly open: readonly string[]
  readonly fails: readonly string[]
  readonly advisories: readonly string[]
  /** Hashes a new pass or band must carry in `answers` to live (rule F7). */
  readonly toAnswer: readonly string[]
  /** All defects ever recorded of the subject, oldest first: fails (quarantined ones too) and what was put right on the spot. */
  readonly defectHistory: readonly Defect[]
  readonly passes: readonly PassState[]
}

export interface Defect {
  readonly hash: string
  readonly check: string
  /** Put right on the spot, or ended by a later look at ok or advisory. */
  readonly putRight: boolean
  /** Taken back by whoever recorded it (rule F4). */
  readonly undone: boolean
}

export type KillReason =
  | 'fail-not-answered'
  | 'hold-not-answered'
  | 'recall-not-answered'
  | 'repair-not-answered'
  | 'pins-changed'
  | 'entry-changed'
  | 'fail-stands-again'
  | 'void'
  | 'replaced'
  | 'withdrawn'

/** What has become of a pass or a band. Dead is for ever (rule F7). */
export interface PassState {
  readonly hash: string
  readonly record: RecordOf<'pass'> | RecordOf<'band'>
  readonly state: 'live' | 'dead' | 'quarantined'
  readonly killedBy: readonly { readonly reason: KillReason; readonly hash: string }[]
  /** It runs under a dispensation's conditions. */
  readonly conditions: readonly string[]
}

/** What the fold is told besides the log: the venue's day and what no record can say. */
export interface FoldContext {
  /** The venue day asked about. */
  readonly day: string
  /** The event's last day, on which dated kit is judged and dispensations without a date end. */
  readonly lastDay: string
  /** Subjects with a signed declaration (verdict *declared only* before anybody looks). */
  readonly declared: ReadonlySet<SubjectKey>
  /**
   * The book of a checklist and limits by their hashes; null where this device does not hold them, which leaves everything not seen.
   * Called for every subject: memoise it.
   */
  readonly openBook: (checklistHash: string, limitsHash: string) => import('@/lib/checklist/book').Book | null
}

export type { KnownRecord }
