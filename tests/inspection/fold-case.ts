import type { LogEntry } from '@/lib/inspection/log-entry'
import type { FoldContext, PassState, Standing, Verdict } from '@/lib/inspection/state'
import type { SubjectKey } from '@/lib/inspection/subject'

/** What must be so of one subject on one day, once all records are there. What is not named is not asked. */
export interface Expected {
  readonly of?: SubjectKey
  readonly on?: Partial<FoldContext>
  readonly verdict?: Verdict
  readonly standings?: Readonly<Record<string, Standing>>
  /** Hashes of the heads of a check. */
  readonly heads?: Readonly<Record<string, readonly LogEntry[]>>
  readonly disagreements?: readonly string[]
  readonly passes?: readonly (readonly [LogEntry, PassState['state']])[]
  /** The blocks, each with whether only the chief can lift it. */
  readonly blocks?: readonly (readonly [LogEntry, 'only the chief lifts' | 'ends when seen'])[]
  readonly open?: readonly string[]
  /** Defects in the history: check, then what became of it. */
  readonly defects?: readonly (readonly [string, 'put right' | 'undone' | 'open'])[]
}

/** One of the numbered cases: records that may come in any order, and what they must mean. */
export interface FoldCase {
  readonly number: number
  readonly title: string
  readonly build: () => { readonly records: readonly LogEntry[]; readonly expected: readonly Expected[] }
}
