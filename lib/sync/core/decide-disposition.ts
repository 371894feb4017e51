import type { Depth } from '@/lib/checklist/checklist'
import { DEPTHS } from '@/lib/checklist/checklist'
import type { QuarantineCode } from '@/lib/inspection/log-entry'
import { isKnown, type AnyRecord, type RecordOf } from '@/lib/inspection/record'
import type { Role } from '@/lib/permissions/policy'
import type { JudgementOutcome } from '@/lib/rules/judgement'
import { isChiefAct, mayRecordAny } from './may-record'

/** What the server knows about a record's maker, device and subject, as all records before it leave them. */
export interface DispositionContext {
  /** False: nobody this server trusts vouches for the key. */
  readonly enrolled: boolean
  readonly device: {
    readonly state: 'active' | 'retired' | 'lost'
    /** Last deviceSeq that stands once it is retired or lost; null: none does. */
    readonly lastGoodSeq: number | null
    /** Whom it was enrolled for. */
    readonly people: readonly string[]
  }
  /** Roles of the actor at this event now; empty when they ended. */
  readonly actorRoles: readonly Role[]
  /** Number and plate tail of the subject's car; null where the subject has none. */
  readonly shown: { readonly number: string; readonly plateTail: string } | null
  /** `presented` records of the subject that no later one replaces. */
  readonly presentedHeads: readonly RecordOf<'presented'>[]
  /** Who made a record of this subject; null when the server has no such record. */
  readonly makerOf: (hash: string) => string | null
  /** What the rule itself says for this finding's values under the pins in force, the most severe where pins differ; null without a rule. */
  readonly judge: (finding: RecordOf<'finding'>) => JudgementOutcome | null
  /** Whether a head named by a ruling fails by its rule, so that no ruling may call it ok. */
  readonly failsByRule: (hash: string) => boolean
}

/**
 * The server's one decision about a record (rule T1): null for accepted, else why its permission is taken away.
 * It never decides about stops: a quarantined fail, hold or void goes on stopping, which is the fold's business.
 * The first reason that applies is given, the gravest first.
 */
export function decideDisposition(record: AnyRecord, context: DispositionContext): QuarantineCode | null {
  if (!context.enrolled) return 'unknown-enrolment'
  const { state, lastGoodSeq, people } = context.device
  if (state !== 'active' && record.deviceSeq > (lastGoodSeq ?? 0)) return state === 'lost' ? 'device-lost' : 'device-retired'
  if (!people.includes(record.actor) || !mayRecordAny(record, context.actorRoles)) return 'wrong-role'
  if (!isKnown(record)) return null
  // A tablet that others unlock too is not the chief's own: whoever holds it could have typed six digits (rule M3).
  if (isChiefAct(record) && people.length !== 1) return 'wrong-role'
  if (record.kind === 'presented' && takesAway(record, context.presentedHeads) && !isScrutineer(context.actorRoles)) return 'wrong-role'
  if (record.kind === 'finding') {
    if (record.outcome === 'unseen' && record.basis.some((hash) => context.makerOf(hash) !== record.actor)) return 'unseen-of-another'
    if (isMilder(record, context.judge(record))) return 'milder-than-rule'
  }
  if (record.kind === 'ruling' && isPermitting(record.outcome) && record.basis.some(context.failsByRule)) return 'milder-than-rule'
  return context.shown !== null && differs(record.shown, context.shown) ? 'shown-differs' : null
}

/** Lower depth than a head's, or a fact that a head has and this one lacks (rule F12). */
export function takesAway(record: Pick<RecordOf<'presented'>, 'depth' | 'facts'>, heads: readonly RecordOf<'presented'>[]): boolean {
  return heads.some(
    (head) =>
      rank(record.depth) < rank(head.depth) ||
      Object.entries(head.facts).some(([name, value]) => value !== null && (record.facts[name] ?? null) === null),
  )
}

function rank(depth: Depth): number {
  return DEPTHS.indexOf(depth)
}

function isScrutineer(roles: readonly Role[]): boolean {
  return roles.includes('scrutineer') || roles.includes('chief')
}

const SEVERITY: Readonly<Record<JudgementOutcome, number>> = { ok: 0, advisory: 1, undecided: 2, fail: 3 }

function isMilder(finding: RecordOf<'finding'>, byRule: JudgementOutcome | null): boolean {
  if (byRule === null || !isPermitting(finding.outcome)) return false
  if (byRule === 'fail') return true
  return finding.judgement !== undefined && SEVERITY[finding.judgement.outcome] < SEVERITY[byRule]
}

function isPermitting(outcome: string): boolean {
  return outcome === 'ok' || outcome === 'advisory'
}

function differs(
  shown: { readonly number: string; readonly plateTail: string },
  is: { readonly number: string; readonly plateTail: string },
): boolean {
  return shown.number !== is.number || shown.plateTail !== is.plateTail
}
