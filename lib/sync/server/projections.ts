import 'server-only'
import type { Db } from '@/db/client'
import type { SubjectState } from '@/lib/inspection/state'
import type { SubjectKey } from '@/lib/inspection/subject'
import { subjectKey } from '@/lib/inspection/subject'
import { readToken } from '../core/read-token'
import type { EventFrame } from './event-frame'
import { foldContext } from './event-frame'
import type { EventLog } from './event-log'
import { eventStates } from './event-states'
import { logStatements } from './log-statements'

/** What `subject_state.body` holds: a subject's state as JSON, without its records. */
export interface SubjectStateBody {
  readonly key: string
  readonly verdict: string
  readonly withdrawn: boolean
  readonly depth: string | null
  readonly blocks: SubjectState['blocks']
  readonly open: readonly string[]
  readonly fails: readonly string[]
  readonly advisories: readonly string[]
  readonly checks: readonly {
    readonly check: string
    readonly standing: string
    readonly required: boolean
    readonly disagreement: boolean
    readonly unanswered: number
    readonly at: number | null
  }[]
  readonly presentedAt: number | null
  readonly passes: readonly { readonly hash: string; readonly state: string; readonly at: number }[]
  /** Passes that live at once and do not know each other: the organiser voids one (rule F7). */
  readonly livePasses: number
}

/** The subjects whose state these records may have changed: their own, and all where one was about the event itself. */
export function touchedSubjects(log: EventLog, keys: ReadonlySet<SubjectKey>, eventId: string): readonly SubjectKey[] {
  if (!keys.has(subjectKey({ event: eventId }))) return [...keys]
  return [...log.bySubject.keys()].filter((key) => !key.startsWith('event:'))
}

/** Folds these subjects again from the log and writes what they came to; inside the transaction that changed the log. */
export function refreshProjections(database: Db, frame: EventFrame, log: EventLog, keys: readonly SubjectKey[], now: number): void {
  const context = foldContext(database, frame, now)
  const { id: eventId, clubId } = frame.event
  const statements = logStatements(database)
  for (const [key, state] of eventStates(frame, log, keys, context)) {
    const body = JSON.stringify(bodyOf(state))
    statements.putState.run({ eventId, subjectKey: key, clubId, seq: log.seq, day: context.day, verdict: state.verdict, body })
    for (const pass of state.passes) {
      const token = readToken(pass.record.token)
      // A push takes no pass in whose token cannot be read.
      if (token === null) continue
      statements.putPass.run({
        eventId,
        recordHash: pass.hash,
        clubId,
        subjectKey: key,
        passId: token.id,
        typedCode: token.typedCode,
        state: pass.state,
        body: JSON.stringify({ killedBy: pass.killedBy, conditions: pass.conditions, at: pass.record.at }),
      })
    }
  }
}

function bodyOf(state: SubjectState): SubjectStateBody {
  const { key, verdict, withdrawn, depth, blocks, open, fails, advisories } = state
  const presented = state.presentedHeads.map(({ record }) => record.at)
  return {
    key,
    verdict,
    withdrawn,
    depth,
    blocks,
    open,
    fails,
    advisories,
    checks: [...state.checks.values()].map(({ check, standing, required, disagreement, unanswered, heads }) => ({
      check,
      standing,
      required,
      disagreement,
      unanswered: unanswered.length,
      at: heads.length === 0 ? null : Math.max(...heads.map(({ record }) => record.at)),
    })),
    presentedAt: presented.length === 0 ? null : Math.min(...presented),
    passes: state.passes.map(({ hash, state: is, record }) => ({ hash, state: is, at: record.at })),
    livePasses: state.passes.filter(({ state: is }) => is === 'live').length,
  }
}
