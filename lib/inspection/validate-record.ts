import * as z from 'zod/mini'
import { parseCivilDate } from '@/lib/rules/civil-date'
import { findingEffect } from './finding-effect'
import { RECORD_KINDS, RECORD_VERSION, type AnyRecord, type KnownRecord, type RecordKind, type Seated, type UnknownRecord } from './record'

export type ParsedRecord = { readonly ok: true; readonly record: AnyRecord } | { readonly ok: false; readonly problem: string }

const id = z.string().check(z.regex(/^[0-9a-f-]{36}$/))
const subject = z.union([
  z.strictObject({ fit: id, person: id }),
  z.strictObject({ car: id }),
  z.strictObject({ person: id }),
  z.strictObject({ event: id }),
])

/** Built once: a schema made at each record costs more than the record. */
const headSchema = z.object({ v: z.unknown(), kind: z.unknown() })

/** What is read of a kind or version this build does not know; the rest stays in the signed text, which is forwarded as it is (rule T3). */
const unknownSchema = z.object({
  v: z.int().check(z.gte(1)),
  kind: z.string().check(z.regex(/^[a-z0-9]+(-[a-z0-9]+)*$/), z.maxLength(60)),
  id,
  effect: z.enum(['stops', 'permits', 'none']),
  event: id,
  subject,
  device: id,
  deviceSeq: z.int().check(z.gte(1)),
  actor: id,
  at: z.int().check(z.gte(0)),
  day: z.string().check(z.regex(/^\d{4}-\d{2}-\d{2}$/)),
})

/**
 * Reads the payload of a record's JWS. A known kind is read strictly and must not contradict itself; an unknown kind or version keeps its
 * envelope and effect, so that its *stops* still stops. The problem names the field, for the log and for "needs attention".
 */
export function parseRecord(payload: unknown): ParsedRecord {
  const head = headSchema.safeParse(payload)
  if (!head.success) return { ok: false, problem: 'not a record: no object with v and kind' }
  const { v, kind } = head.data
  if (v !== RECORD_VERSION || typeof kind !== 'string' || !Object.hasOwn(RECORD_KINDS, kind)) return parseUnknown(payload)
  const parsed = (RECORD_KINDS[kind as RecordKind] as unknown as z.ZodMiniType<KnownRecord>).safeParse(payload)
  if (!parsed.success) return { ok: false, problem: firstIssue(parsed.error) }
  const problem = contradictionIn(parsed.data)
  return problem === null ? { ok: true, record: parsed.data } : { ok: false, problem }
}

function parseUnknown(payload: unknown): ParsedRecord {
  const parsed = unknownSchema.safeParse(payload)
  return parsed.success ? { ok: true, record: parsed.data satisfies UnknownRecord } : { ok: false, problem: firstIssue(parsed.error) }
}

function firstIssue(error: z.core.$ZodError): string {
  const issue = error.issues[0]
  if (!issue) return 'not a record'
  const path = issue.path.map(String).join('.')
  return path === '' ? issue.message : `${path}: ${issue.message}`
}

/** Says where a record contradicts itself: its effect against what it says, or words that cannot stand together. */
function contradictionIn(record: KnownRecord): string | null {
  if (parseCivilDate(record.day) === null) return `day: ${record.day} is not a date`
  if (new Set(record.basis).size !== record.basis.length) return 'basis: names the same record twice'
  switch (record.kind) {
    case 'finding':
      return contradictionInFinding(record)
    case 'ruling':
      return effectProblem(record.effect, findingEffect(record.outcome), `a ruling of ${record.outcome}`)
    case 'dispensation':
      return record.basis.length === 0 ? 'basis: a dispensation names the fail it accepts' : null
    case 'entry-changed':
      return contradictionInChange(record)
    default:
      return null
  }
}

function contradictionInFinding(record: Extract<KnownRecord, { kind: 'finding' }>): string | null {
  const { outcome, found, carriedFrom } = record
  const permits = findingEffect(outcome) === 'permits'
  if (found !== undefined && !permits) return `found: what is put right here ends ok or advisory, not ${outcome}`
  if (found !== undefined && carriedFrom !== undefined) return 'found: a carried-forward finding is no look and puts nothing right'
  if (outcome === 'unseen' && record.basis.length === 0) return 'basis: an unseen names the finding it takes back'
  return effectProblem(record.effect, findingEffect(outcome), `a finding of ${outcome}`)
}

function contradictionInChange(record: Extract<KnownRecord, { kind: 'entry-changed' }>): string | null {
  const { change, notes = [] } = record
  const { what } = change
  const seat = what === 'people' ? change.seated : undefined
  // The only free text of a change is the name of who is seated; anything else has nowhere to stand.
  if (notes.length > (seat === undefined ? 0 : 1)) return 'notes: a change names at most the one who is seated'
  if (what === 'people' && seat !== undefined) return contradictionInSeat(seat, change) ?? permitsNothing(record)
  if (what === 'withdrawn') return effectProblem(record.effect, 'stops', 'a withdrawal')
  if (what === 'returned') return effectProblem(record.effect, 'permits', 'a return')
  return permitsNothing(record)
}

function permitsNothing({ effect, change }: Extract<KnownRecord, { kind: 'entry-changed' }>): string | null {
  return effect === 'permits' ? `effect: a change of ${change.what} cannot say permits` : null
}

/** Who is seated is the one who was added, and counts as a passenger exactly when they ride as one (rule F13 waits for it). */
function contradictionInSeat(
  { person, role }: Seated,
  { added, passengers }: { readonly added: readonly string[]; readonly passengers: readonly string[] },
): string | null {
  if (added.length !== 1 || added[0] !== person) return 'change.seated: is not the one who was added'
  const rides = passengers.length === 1 && passengers[0] === person
  const isRight = role === 'passenger' ? rides : passengers.length === 0
  return isRight ? null : `change.passengers: contradicts the role of who is seated, ${role}`
}

function effectProblem(said: string, must: string, what: string): string | null {
  return said === must ? null : `effect: ${what} says ${must}, not ${said}`
}
