import * as z from 'zod/mini'

/** Version of the record format; a record made under another version is still read by its `effect` (rule T3). */
export const RECORD_VERSION = 1

const uuid7 = z.string().check(z.regex(/^[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/))
const id = z.string().check(z.regex(/^[0-9a-f-]{36}$/))
/** SHA-256 in lower-case hex. */
const hash = z.string().check(z.regex(/^[0-9a-f]{64}$/))
const civilDate = z.string().check(z.regex(/^\d{4}-\d{2}-\d{2}$/))
const instantMs = z.int().check(z.gte(0))
const code = z.string().check(z.regex(/^[a-z0-9]+(-[a-z0-9]+)*$/), z.maxLength(60))
const checkId = z.string().check(z.regex(/^[a-z0-9.-]+$/), z.maxLength(120))
const hashes = z.array(hash).check(z.maxLength(500))
const figures = z.record(
  z.string().check(z.maxLength(60)),
  z.union([z.string().check(z.maxLength(200)), z.number(), z.boolean(), z.null()]),
)

const car = z.strictObject({ car: id })
const person = z.strictObject({ person: id })
const fit = z.strictObject({ fit: id, person: id })
const event = z.strictObject({ event: id })
const judgedSubject = z.union([fit, car, person])
const anySubject = z.union([fit, car, person, event])

/** Fields every record carries (SYNC, "A record"). */
const envelope = {
  v: z.literal(RECORD_VERSION),
  id: uuid7,
  event: id,
  device: id,
  /** Gapless per device, from 1. */
  deviceSeq: z.int().check(z.gte(1)),
  actor: id,
  writtenBy: z.optional(id),
  /** Device clock, ms since the epoch. */
  at: instantMs,
  /** Server time minus device clock as last known, ms. */
  offset: z.int(),
  /** Venue day by the corrected clock. */
  day: civilDate,
  /** Highest server seq of the event applied when it was made. */
  seen: z.int().check(z.gte(0)),
  basis: hashes,
  answers: hashes,
  /** What the screen showed when the tap fell; empty strings for a subject without number or plate. */
  shown: z.strictObject({ number: z.string().check(z.maxLength(12)), plateTail: z.string().check(z.maxLength(6)) }),
}

/** Keyed in from a paper card: who looked, when by the card, and the photograph of the sheet. The actor is who keyed it in. */
const paper = z.strictObject({ seenBy: id, seenAt: instantMs, sheet: z.optional(hash) })

const outcome = z.enum(['ok', 'advisory', 'fail', 'could-not-see', 'unseen'])
const reason = z.nullable(code)

const presented = z.strictObject({
  ...envelope,
  kind: z.literal('presented'),
  effect: z.literal('none'),
  subject: judgedSubject,
  checklist: hash,
  limits: hash,
  declaration: z.nullable(z.strictObject({ id, version: z.int() })),
  facts: figures,
  depth: z.enum(['look-over', 'standard', 'full']),
  paper: z.optional(paper),
})

const finding = z.strictObject({
  ...envelope,
  kind: z.literal('finding'),
  effect: z.enum(['stops', 'permits']),
  subject: judgedSubject,
  check: checkId,
  outcome,
  reason: z.optional(reason),
  /** The state left. */
  measured: z.optional(figures),
  /** The state met, when it was put right here. */
  found: z.optional(z.strictObject({ outcome: z.enum(['fail', 'advisory']), values: z.optional(figures), reason })),
  judgement: z.optional(
    z.strictObject({ outcome: z.enum(['ok', 'advisory', 'fail', 'undecided']), code: z.string().check(z.maxLength(80)), facts: figures }),
  ),
  paramsHash: z.optional(hash),
  notes: z.optional(hashes),
  photos: z.optional(hashes),
  /** Hash of the earlier event's finding that this one carries forward (rule F11). */
  carriedFrom: z.optional(hash),
  paper: z.optional(paper),
})

const ruling = z.strictObject({
  ...envelope,
  kind: z.literal('ruling'),
  effect: z.enum(['stops', 'permits']),
  subject: judgedSubject,
  check: checkId,
  outcome: z.enum(['ok', 'advisory', 'fail', 'could-not-see']),
  why: z.string().check(z.minLength(1), z.maxLength(500)),
})

const dispensation = z.strictObject({
  ...envelope,
  kind: z.literal('dispensation'),
  effect: z.literal('permits'),
  subject: judgedSubject,
  check: checkId,
  reason: z.string().check(z.minLength(1), z.maxLength(500)),
  conditions: z.string().check(z.minLength(1), z.maxLength(500)),
  /** Last venue day it holds; null: the event's end. */
  until: z.nullable(civilDate),
})

const pass = z.strictObject({
  ...envelope,
  kind: z.literal('pass'),
  effect: z.literal('permits'),
  subject: car,
  /** The token's base32 text (lib/pass/token). */
  token: z.string().check(z.regex(/^[A-Z2-7]{133}$/)),
})

const band = z.strictObject({
  ...envelope,
  kind: z.literal('band'),
  effect: z.literal('permits'),
  subject: person,
  token: z.string().check(z.regex(/^[A-Z2-7]{133}$/)),
  bandNumber: z.string().check(z.minLength(1), z.maxLength(6)),
})

const voided = z.strictObject({
  ...envelope,
  kind: z.literal('void'),
  effect: z.literal('stops'),
  subject: z.union([car, person]),
  /** Hash of the pass or band record. */
  voids: hash,
  reason: z.string().check(z.minLength(1), z.maxLength(500)),
})

const hold = z.strictObject({
  ...envelope,
  kind: z.literal('hold'),
  effect: z.literal('stops'),
  subject: z.union([fit, car, person]),
  reason: code,
  stations: z.array(code).check(z.maxLength(40)),
  checks: z.array(checkId).check(z.maxLength(200)),
  stickerRemoved: z.nullable(z.boolean()),
  notes: z.optional(hashes),
})

const lifted = z.strictObject({
  ...envelope,
  kind: z.literal('lifted'),
  effect: z.literal('permits'),
  subject: z.union([fit, car, person]),
  holds: hashes.check(z.minLength(1)),
  why: z.string().check(z.minLength(1), z.maxLength(500)),
})

const trigger = z.discriminatedUnion('when', [
  z.strictObject({ when: z.literal('session-over'), group: id, session: z.int().check(z.gte(1)) }),
  z.strictObject({ when: z.literal('time'), at: instantMs }),
  z.strictObject({ when: z.literal('wet') }),
  z.strictObject({ when: z.literal('passenger') }),
])

const recall = z.strictObject({
  ...envelope,
  kind: z.literal('recall'),
  effect: z.literal('stops'),
  subject: judgedSubject,
  stations: z.array(code),
  checks: z.array(checkId),
  trigger,
})

const day = z.strictObject({
  ...envelope,
  kind: z.literal('day'),
  effect: z.literal('stops'),
  subject: event,
  says: z.discriminatedUnion('what', [
    z.strictObject({ what: z.literal('session-over'), group: id, session: z.int().check(z.gte(1)) }),
    z.strictObject({ what: z.literal('wet'), on: z.boolean() }),
    z.strictObject({ what: z.literal('time'), at: instantMs }),
  ]),
})

const seat = z.strictObject({
  person: id,
  role: z.enum(['driver', 'passenger', 'instructor']),
  /** Under age, as told at the desk; null where nobody asked, as with somebody who is known already. */
  minor: z.nullable(z.boolean()),
})

const entryChanged = z.strictObject({
  ...envelope,
  kind: z.literal('entry-changed'),
  effect: z.enum(['stops', 'none', 'permits']),
  subject: z.union([car, person]),
  change: z.discriminatedUnion('what', [
    z.strictObject({ what: z.literal('withdrawn') }),
    z.strictObject({ what: z.literal('returned') }),
    z.strictObject({ what: z.literal('number'), number: z.string().check(z.maxLength(12)) }),
    z.strictObject({ what: z.literal('plate'), plateTail: z.string().check(z.maxLength(6)) }),
    z.strictObject({ what: z.literal('group'), group: id }),
    z.strictObject({
      what: z.literal('people'),
      added: z.array(id),
      removed: z.array(id),
      passengers: z.array(id),
      /** Who was seated at the desk, one a record. Where the person is new, the record's one note is the name: names never stand in a record. */
      seated: z.optional(seat),
    }),
    z.strictObject({ what: z.literal('facts') }),
  ]),
  notes: z.optional(hashes),
})

const adopted = z.strictObject({
  ...envelope,
  kind: z.literal('adopted'),
  effect: z.literal('none'),
  subject: anySubject,
  /** Hash of the quarantined record that gets its effect back. */
  adopts: hash,
  why: z.string().check(z.minLength(1), z.maxLength(500)),
})

const incident = z.strictObject({ ...envelope, kind: z.literal('incident'), effect: z.literal('none'), subject: anySubject, notes: hashes })
const comment = z.strictObject({ ...envelope, kind: z.literal('comment'), effect: z.literal('none'), subject: anySubject, notes: hashes })

/** The registry of kinds: a new kind is one schema above and one line here. */
export const RECORD_KINDS = {
  presented,
  finding,
  ruling,
  dispensation,
  pass,
  band,
  void: voided,
  hold,
  lifted,
  recall,
  day,
  'entry-changed': entryChanged,
  adopted,
  incident,
  comment,
} as const

export type RecordKind = keyof typeof RECORD_KINDS
export type RecordOf<K extends RecordKind> = z.infer<(typeof RECORD_KINDS)[K]>
/** A record of a kind this build knows. */
export type KnownRecord = { [K in RecordKind]: RecordOf<K> }[RecordKind]

export type FindingOutcome = RecordOf<'finding'>['outcome']
export type Seated = z.infer<typeof seat>
export type RecallTrigger = RecordOf<'recall'>['trigger']

/** A record of a kind this build does not know: only its envelope and its effect are read (rule T3). */
export interface UnknownRecord {
  readonly v: number
  readonly kind: string
  readonly id: string
  readonly effect: 'stops' | 'permits' | 'none'
  readonly event: string
  readonly subject: KnownRecord['subject']
  readonly device: string
  readonly deviceSeq: number
  readonly actor: string
  readonly at: number
  readonly day: string
}

export type AnyRecord = KnownRecord | UnknownRecord

// Asked for every record of every fold: a set answers faster than an object of schemas.
const KNOWN_KINDS: ReadonlySet<string> = new Set(Object.keys(RECORD_KINDS))

/** Whether this build knows the record's kind and version. */
export function isKnown(record: AnyRecord): record is KnownRecord {
  return record.v === RECORD_VERSION && KNOWN_KINDS.has(record.kind)
}
