import type { LogEntry } from '@/lib/inspection/log-entry'
import { isKnown, type RecordKind } from '@/lib/inspection/record'
import type { SubjectState } from '@/lib/inspection/state'

/** As much of a draft as its edges depend on. */
export interface EdgeInput {
  readonly kind: RecordKind
  readonly check?: string
  readonly outcome?: string
  readonly change?: { readonly what: string }
  readonly says?: { readonly what: string; readonly on?: boolean }
}

export interface Edges {
  readonly basis: readonly string[]
  readonly answers: readonly string[]
}

const NONE: Edges = { basis: [], answers: [] }

/**
 * What a new record names (rule M5): in `basis` every head of its subject and check that this device holds and the fail beneath a dispensation, nothing else;
 * in `answers` every hold, due recall and repair that asks for its check, ended or not. A pass names the passes it replaces and answers all it must.
 */
export function workOutEdges(draft: EdgeInput, actor: string, state: SubjectState, dayLog: readonly LogEntry[]): Edges {
  switch (draft.kind) {
    case 'finding':
    case 'ruling':
    case 'dispensation':
      return onCheck(draft, actor, state)
    case 'presented':
      return { basis: state.presentedHeads.map(({ hash }) => hash), answers: [] }
    case 'pass':
    case 'band':
      return { basis: state.passes.filter((pass) => pass.state === 'live').map(({ hash }) => hash), answers: state.toAnswer }
    case 'entry-changed':
      return draft.change?.what === 'returned' ? { basis: state.withdrawnBy, answers: [] } : NONE
    case 'day':
      return draft.says?.what === 'wet' && draft.says.on === false ? { basis: wetOn(dayLog), answers: [] } : NONE
    default:
      return NONE
  }
}

function onCheck(draft: EdgeInput, actor: string, state: SubjectState): Edges {
  const check = draft.check === undefined ? undefined : state.checks.get(draft.check)
  if (check === undefined) return NONE
  // One's own look may be taken back, another's never (rule T1): naming it would only have this quarantined.
  const undoes = draft.kind === 'finding' && draft.outcome === 'unseen'
  const heads = undoes ? check.heads.filter((head) => head.record.actor === actor) : check.heads
  const beneath = heads.flatMap((head) => (undoes ? [] : head.beneath))
  return {
    basis: [...new Set([...heads.map(({ hash }) => hash), ...beneath])],
    answers: draft.kind === 'dispensation' ? [] : check.toAnswer,
  }
}

function wetOn(dayLog: readonly LogEntry[]): readonly string[] {
  return dayLog.flatMap(({ hash, record }) =>
    isKnown(record) && record.kind === 'day' && record.says.what === 'wet' && record.says.on ? [hash] : [],
  )
}
