import type { Check, Checklist, Limits, Station } from './checklist'

/**
 * A checklist and a set of limits opened for use: corners unfolded, ids indexed, the params in force and their hash worked out per check.
 * Built once per (checklist, limits) pair by `openBook`; everything later only reads it.
 */
export interface Book {
  readonly checklistHash: string
  readonly limitsHash: string
  readonly checklist: Checklist
  readonly limits: Limits
  readonly checks: readonly BookCheck[]
  readonly byId: ReadonlyMap<string, BookCheck>
  readonly stations: ReadonlyMap<string, Station>
}

/** A check with what its limits come to. `paramsHash` is null where the check has no rule. */
export type BookCheck = Check & {
  readonly params: Readonly<Record<string, unknown>>
  readonly paramsHash: string | null
}
