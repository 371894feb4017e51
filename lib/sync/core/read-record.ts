import {
  RECORD_KINDS,
  RECORD_VERSION,
  type AnyRecord,
  type KnownRecord,
  type RecordKind,
  type UnknownRecord,
} from '@/lib/inspection/record'
import type { Subject } from '@/lib/inspection/subject'
import { effectOf } from './effect-of'

const ID = /^[0-9a-f-]{36}$/
const EFFECTS = ['stops', 'permits', 'none'] as const

/**
 * Reads a payload as a record. A kind this build knows is parsed strictly, and its `effect` must be the one its kind and outcome have; of any other
 * kind or version only the envelope is read (rule T3). Null when not even that can be.
 */
export function readRecord(payload: Readonly<Record<string, unknown>>): AnyRecord | null {
  const { kind, v } = payload
  if (v === RECORD_VERSION && typeof kind === 'string' && Object.hasOwn(RECORD_KINDS, kind)) {
    const parsed = RECORD_KINDS[kind as RecordKind].safeParse(payload)
    if (!parsed.success) return null
    const record = parsed.data as KnownRecord
    return record.effect === effectOf(record) ? record : null
  }
  return readEnvelope(payload)
}

function readEnvelope(payload: Readonly<Record<string, unknown>>): UnknownRecord | null {
  const { v, kind, id, effect, event, device, deviceSeq, actor, at, day } = payload
  const subject = readSubject(payload.subject)
  if (typeof v !== 'number' || typeof kind !== 'string' || kind.length > 60 || subject === null) return null
  if (!isId(id) || !isId(event) || !isId(device) || !isId(actor) || !isCount(deviceSeq) || !isCount(at) || typeof day !== 'string')
    return null
  const known = EFFECTS.find((one) => one === effect)
  if (known === undefined) return null
  return { ...payload, v, kind, id, effect: known, event, subject, device, deviceSeq, actor, at, day }
}

function readSubject(value: unknown): Subject | null {
  if (typeof value !== 'object' || value === null) return null
  const { car, person, fit, event } = value as Record<string, unknown>
  if (isId(fit) && isId(person)) return { fit, person }
  if (isId(car)) return { car }
  if (isId(person)) return { person }
  return isId(event) ? { event } : null
}

function isId(value: unknown): value is string {
  return typeof value === 'string' && ID.test(value)
}

function isCount(value: unknown): value is number {
  return typeof value === 'number' && Number.isSafeInteger(value) && value >= 0
}
