import type { Disposition, LogEntry, QuarantineCode } from '@/lib/inspection/log-entry'
import { findingEffect } from '@/lib/inspection/finding-effect'
import type { FindingOutcome, KnownRecord, RecallTrigger, RecordOf } from '@/lib/inspection/record'
import type { FoldContext, SubjectState } from '@/lib/inspection/state'
import { subjectKey, type Subject, type SubjectKey } from '@/lib/inspection/subject'
import { PADDOCK_CHECKLIST, PADDOCK_LIMITS, paddockBook, paddockCheck } from './paddock-book'
import { fakeHash, fakeId } from './paddock-hash'

export const EVENT = fakeId('event')
export const SATURDAY = '2026-05-09'
export const SUNDAY = '2026-05-10'
export const CAR = { car: fakeId('entry 47') } as const
export const PERSON = { person: fakeId('a driver') } as const
export const FIT = { fit: CAR.car, person: PERSON.person } as const
export const GROUP_A = fakeId('group a')

/** The people of the tests. */
export const CREW = {
  asha: fakeId('asha, scrutineer'),
  ben: fakeId('ben, scrutineer'),
  chief: fakeId('the chief'),
  desk: fakeId('sign-on desk'),
  organiser: fakeId('organiser'),
} as const

/** Anything that names a record: its entry or its hash. */
export type Named = LogEntry | string

/** What a test may say of any record; the rest is filled in. */
export interface Said {
  readonly subject?: Subject
  readonly actor?: string
  readonly day?: string
  readonly at?: number
  readonly basis?: readonly Named[]
  readonly answers?: readonly Named[]
  readonly quarantined?: QuarantineCode
  readonly provisional?: boolean
  readonly shown?: { readonly number: string; readonly plateTail: string }
}

export interface FindingSaid extends Said {
  readonly found?: RecordOf<'finding'>['found']
  readonly judgement?: RecordOf<'finding'>['judgement']
  readonly measured?: RecordOf<'finding'>['measured'] | null
  readonly paramsHash?: string | null
  readonly carriedFrom?: string
  readonly reason?: string
}

type Extra<K extends KnownRecord['kind']> = Omit<RecordOf<K>, keyof ReturnType<typeof envelope>>

let counter = 0

function envelope(said: Said, subject: Subject) {
  counter += 1
  return {
    v: 1 as const,
    id: fakeId(`record ${counter}`),
    event: EVENT,
    subject,
    device: fakeId(`device of ${said.actor ?? CREW.asha}`),
    deviceSeq: counter,
    actor: said.actor ?? CREW.asha,
    at: said.at ?? 1_778_310_000_000 + counter * 60_000,
    offset: 0,
    day: said.day ?? SATURDAY,
    seen: 0,
    basis: hashesOf(said.basis),
    answers: hashesOf(said.answers),
    shown: said.shown ?? { number: '47', plateTail: 'KLM' },
  }
}

function hashesOf(named: readonly Named[] = []): string[] {
  return named.map((one) => (typeof one === 'string' ? one : one.hash))
}

function entry(record: object, said: Said): LogEntry {
  return { hash: fakeHash(JSON.stringify(record)), record: record as KnownRecord, disposition: dispositionOf(said) }
}

function dispositionOf({ quarantined, provisional }: Said): Disposition {
  if (quarantined) return { state: 'quarantined', code: quarantined }
  return { state: provisional ? 'provisional' : 'accepted' }
}

function make<K extends KnownRecord['kind']>(extra: Extra<K> & { readonly kind: K }, said: Said, subject: Subject): LogEntry {
  return entry({ ...envelope(said, said.subject ?? subject), ...extra }, said)
}

/** `presented`, at look-over depth unless said. */
export function presented(
  said: Said & {
    readonly depth?: RecordOf<'presented'>['depth']
    readonly facts?: RecordOf<'presented'>['facts']
    readonly limits?: string
    readonly checklist?: string
  } = {},
): LogEntry {
  const { depth = 'look-over', facts = { cage: false, slicks: false }, limits = PADDOCK_LIMITS, checklist = PADDOCK_CHECKLIST } = said
  return make<'presented'>({ kind: 'presented', effect: 'none', checklist, limits, declaration: null, facts, depth } as never, said, CAR)
}

/** A finding; on a measured check it carries a value and the limits in force unless `measured: null`. */
export function finding(check: string, outcome: FindingOutcome, said: FindingSaid = {}): LogEntry {
  const { found, judgement, carriedFrom, reason } = said
  const measured = said.measured === undefined && check === 'wheels.tread' ? { depthMm: 4 } : (said.measured ?? undefined)
  const paramsHash = said.paramsHash === undefined && check === 'wheels.tread' ? paddockCheck(check).paramsHash : said.paramsHash
  const extra = {
    kind: 'finding' as const,
    effect: findingEffect(outcome),
    check,
    outcome,
    ...(reason === undefined ? {} : { reason }),
    ...(found === undefined ? {} : { found }),
    ...(judgement === undefined ? {} : { judgement }),
    ...(measured === undefined ? {} : { measured }),
    ...(paramsHash ? { paramsHash } : {}),
    ...(carriedFrom === undefined ? {} : { carriedFrom }),
  }
  return make<'finding'>(extra, said, CAR)
}

export function ruling(check: string, outcome: RecordOf<'ruling'>['outcome'], said: Said): LogEntry {
  return make<'ruling'>(
    { kind: 'ruling', effect: findingEffect(outcome), check, outcome, why: 'seen by both' } as never,
    { actor: CREW.chief, ...said },
    CAR,
  )
}

export function dispensation(check: string, until: string | null, said: Said): LogEntry {
  const extra = { kind: 'dispensation', effect: 'permits', check, reason: 'spare part on its way', conditions: 'group C only', until }
  return make<'dispensation'>(extra as never, { actor: CREW.chief, ...said }, CAR)
}

export function hold(
  said: Said & { readonly stations?: readonly string[]; readonly checks?: readonly string[]; readonly reason?: string } = {},
): LogEntry {
  const extra = {
    kind: 'hold',
    effect: 'stops',
    reason: said.reason ?? 'contact',
    stations: said.stations ?? [],
    checks: said.checks ?? [],
    stickerRemoved: null,
  }
  return make<'hold'>(extra as never, said, CAR)
}

export function lifted(holds: readonly Named[], said: Said = {}): LogEntry {
  return make<'lifted'>(
    { kind: 'lifted', effect: 'permits', holds: hashesOf(holds), why: 'seen by the chief' } as never,
    { actor: CREW.chief, ...said },
    CAR,
  )
}

export function recall(
  trigger: RecallTrigger,
  said: Said & { readonly stations?: readonly string[]; readonly checks?: readonly string[] } = {},
): LogEntry {
  return make<'recall'>(
    { kind: 'recall', effect: 'stops', stations: said.stations ?? [], checks: said.checks ?? [], trigger } as never,
    said,
    CAR,
  )
}

export function day(says: RecordOf<'day'>['says'], said: Said = {}): LogEntry {
  return make<'day'>({ kind: 'day', effect: 'stops', says } as never, { actor: CREW.organiser, ...said }, { event: EVENT })
}

export function entryChanged(change: RecordOf<'entry-changed'>['change'], said: Said = {}): LogEntry {
  const effect = change.what === 'returned' ? 'permits' : change.what === 'group' || change.what === 'people' ? 'none' : 'stops'
  return make<'entry-changed'>({ kind: 'entry-changed', effect, change } as never, { actor: CREW.organiser, ...said }, CAR)
}

export function pass(said: Said = {}): LogEntry {
  return make<'pass'>({ kind: 'pass', effect: 'permits', token: 'A'.repeat(133) } as never, said, CAR)
}

export function band(said: Said = {}): LogEntry {
  return make<'band'>(
    { kind: 'band', effect: 'permits', token: 'B'.repeat(133), bandNumber: '112' } as never,
    { actor: CREW.desk, ...said },
    PERSON,
  )
}

export function voided(voids: Named, said: Said = {}): LogEntry {
  return make<'void'>(
    { kind: 'void', effect: 'stops', voids: hashesOf([voids])[0], reason: 'issued twice' } as never,
    { actor: CREW.chief, ...said },
    CAR,
  )
}

export function adopted(adopts: Named, said: Said = {}): LogEntry {
  return make<'adopted'>(
    { kind: 'adopted', effect: 'none', adopts: hashesOf([adopts])[0], why: 'seen it done' } as never,
    { actor: CREW.chief, ...said },
    CAR,
  )
}

export function comment(said: Said = {}): LogEntry {
  return make<'comment'>({ kind: 'comment', effect: 'none', notes: [] } as never, said, CAR)
}

/** A record of a kind this build does not know. */
export function unknownKind(effect: 'stops' | 'permits' | 'none', said: Said = {}): LogEntry {
  return entry({ ...envelope(said, said.subject ?? CAR), kind: 'tow-request', effect }, said)
}

/** The checks a plain car must have seen at a look-over. */
export const LOOK_OVER = ['brakes.pads', 'wheels.tread', 'wheels.nuts.front', 'wheels.nuts.rear', 'seat.mounts'] as const

/** An ok on every check of a look-over but those named. */
export function allOk(said: FindingSaid & { readonly except?: readonly string[] } = {}): readonly LogEntry[] {
  return LOOK_OVER.filter((check) => !said.except?.includes(check)).map((check) => finding(check, 'ok', said))
}

/** What the fold is told: the test book, Saturday of a two-day event, nobody declared. */
export function context(given: Partial<FoldContext> = {}): FoldContext {
  return { day: SATURDAY, lastDay: SUNDAY, declared: new Set<SubjectKey>(), openBook: paddockBook, ...given }
}

export const CAR_KEY = subjectKey(CAR)
export const PERSON_KEY = subjectKey(PERSON)
export const FIT_KEY = subjectKey(FIT)

/** A state as one text: equal texts are equal states, with checks and passes in the same order. */
export function asText(state: SubjectState): string {
  return JSON.stringify({ ...state, checks: [...state.checks] })
}
