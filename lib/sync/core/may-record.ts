import { isKnown, type AnyRecord, type KnownRecord } from '@/lib/inspection/record'
import { subjectKind } from '@/lib/inspection/subject'
import { can, type Action, type Role } from '@/lib/permissions/policy'

/** As much of a record as says who may make it. */
export type MayRecordInput = Pick<KnownRecord, 'kind' | 'subject'> & {
  readonly outcome?: string
  readonly change?: { readonly what: string }
}

/** Acts that only the chief's own device may sign (rule M3). */
const CHIEF_ACTS: readonly Action[] = ['record:ruling', 'record:dispensation', 'record:lifted', 'record:adopted']

/** The action in the policy table that making this record is. */
export function recordAction(record: MayRecordInput): Action {
  if (record.kind === 'finding') {
    if (record.outcome === 'ok') return 'record:finding-permits'
    return record.outcome === 'advisory' ? 'record:finding-advisory' : 'record:finding-stops'
  }
  if (record.kind === 'entry-changed') return record.change?.what === 'people' ? 'record:entry-people-changed' : 'record:entry-changed'
  return `record:${record.kind}`
}

/**
 * Whether somebody with these roles may make this record. Sign-on judges persons only: its role says nothing about a car.
 * Devices ask it before saving, the server again at push: the same answer is what makes own unsent records provisional and not a guess (rule T1).
 */
export function mayRecord(record: MayRecordInput, roles: readonly Role[]): boolean {
  const judgesCar = record.kind === 'finding' && subjectKind(record.subject) !== 'person'
  const counted = judgesCar ? roles.filter((role) => role !== 'sign-on') : roles
  return can(counted, recordAction(record))
}

/** Whether only the chief's own device may sign it. */
export function isChiefAct(record: MayRecordInput): boolean {
  return CHIEF_ACTS.includes(recordAction(record))
}

/** As `mayRecord`, for whatever came over the wire: of an unknown kind nobody can have been given the right to permit anything (rule T3). */
export function mayRecordAny(record: AnyRecord, roles: readonly Role[]): boolean {
  return isKnown(record) ? mayRecord(record, roles) : record.effect !== 'permits'
}
