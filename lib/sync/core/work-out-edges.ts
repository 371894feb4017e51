import { answersFor, basisFor, basisForUndo, passAnswers, passBasis, presentedBasis, returnedBasis } from '@/lib/inspection/compose'
import { recallAnswers, wetOffBasis } from '@/lib/inspection/compose-day'
import type { LogEntry } from '@/lib/inspection/log-entry'
import type { RecallTrigger, RecordKind } from '@/lib/inspection/record'
import type { SubjectState } from '@/lib/inspection/state'

/** As much of a draft as its edges depend on. */
export interface EdgeInput {
  readonly kind: RecordKind
  readonly check?: string
  readonly outcome?: string
  readonly change?: { readonly what: string }
  readonly says?: { readonly what: string; readonly on?: boolean }
  readonly trigger?: RecallTrigger
}

/** What this device knows of the draft's subject at the moment of saving. */
export interface EdgeGrounds {
  readonly actor: string
  readonly state: SubjectState
  /** Records of the subject and of the event itself. */
  readonly entries: readonly LogEntry[]
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
export function workOutEdges(draft: EdgeInput, { actor, state, entries }: EdgeGrounds): Edges {
  const check = draft.check ?? ''
  switch (draft.kind) {
    case 'finding':
      // One's own look may be taken back, another's never (rule T1): naming it would only have this quarantined.
      if (draft.outcome === 'unseen') return { basis: basisForUndo(state, check, actor), answers: [] }
      return { basis: basisFor(state, check), answers: answersFor(state, check) }
    case 'ruling':
      return { basis: basisFor(state, check), answers: answersFor(state, check) }
    case 'dispensation':
      return { basis: basisFor(state, check), answers: [] }
    case 'presented':
      return { basis: presentedBasis(state), answers: [] }
    case 'pass':
    case 'band':
      return { basis: passBasis(state), answers: passAnswers(state) }
    case 'recall':
      return draft.trigger === undefined ? NONE : { basis: [], answers: recallAnswers(entries, state.key, draft.trigger) }
    case 'entry-changed':
      return draft.change?.what === 'returned' ? { basis: returnedBasis(state), answers: [] } : NONE
    case 'day':
      return draft.says?.what === 'wet' && draft.says.on === false ? { basis: wetOffBasis(entries), answers: [] } : NONE
    default:
      return NONE
  }
}
