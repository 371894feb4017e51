import 'server-only'
import { randomBytes } from 'node:crypto'
import { eq, max } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { record as recordTable } from '@/db/schema'
import { foldSubject } from '@/lib/inspection/fold-subject'
import { isKnown, RECORD_VERSION, type KnownRecord, type RecordKind, type RecordOf } from '@/lib/inspection/record'
import { subjectKey } from '@/lib/inspection/subject'
import type { AccountActor } from '@/lib/platform/actor'
import { assert } from '@/lib/platform/assert'
import { newId } from '@/lib/platform/ids'
import { signJws } from '@/lib/platform/jws'
import { refuse, type Refusal } from '@/lib/platform/refusal'
import { serverKey } from '@/lib/platform/server-key'
import { sha256 } from '@/lib/platform/sha256'
import { venueDay } from '@/lib/rules/venue-day'
import { noteHash } from '../core/chain'
import { effectOf } from '../core/effect-of'
import { isChiefAct, mayRecord } from '../core/may-record'
import { readRecord } from '../core/read-record'
import { RECORD_TYPE } from '../core/record-type'
import { workOutEdges } from '../core/work-out-edges'
import { shownOf } from './disposition-context'
import { foldContext, readFrame } from './event-frame'
import { eventLog } from './event-log'
import { serverDeviceFor } from './server-device'
import { beginLogWork, keepNotes, takeRecord, type LogWork } from './take-record'

/** Kinds the office makes; what permits a car or a person is made beside them, by a device. */
type ServerKind = 'presented' | 'void' | 'hold' | 'recall' | 'day' | 'entry-changed' | 'incident' | 'comment'
type FilledIn =
  'v' | 'id' | 'event' | 'device' | 'deviceSeq' | 'actor' | 'at' | 'offset' | 'day' | 'seen' | 'basis' | 'answers' | 'shown' | 'effect'

/** A record of the office before it is one: what it says, without envelope. `note:<ref>` in `notes` stands for the note of that ref. */
export type ServerDraft = { [K in ServerKind & RecordKind]: Omit<RecordOf<K>, FilledIn> }[ServerKind]

export interface ServerNote {
  readonly ref: string
  readonly text: string
}

export interface ServerRecord {
  readonly seq: number
  readonly hash: string
  readonly record: KnownRecord
}

/** The type of `appendServerRecords`, for commands of features, which get it handed in by their route (they do not import sync). */
export type AppendServerRecords = typeof appendServerRecords

/**
 * The one way in which the server makes records: signed by its own device (number 0), attributed to the account that acts, and taken into the log through
 * the very steps of a push (disposition, number, chain), so that devices and the fold see them like any other.
 *
 * How to call it:
 * - inside your own `transaction(database, (tx) => …)`, so that rows and records are kept together or not at all;
 * - BEFORE you change rows of the entry: `shown` says the number and plate as they were when the organiser acted;
 * - from a command of a feature by argument: `export const POST = handle(contract, myCommand(appendServerRecords))`, with the type `AppendServerRecords`;
 * - after the commit call `announce(eventId)`.
 *
 * Refuses `missing` for an event of another club, `forbidden` where the actor's roles at the event may not make one of the drafts; then nothing was written.
 * The chief's own acts (ruling, dispensation, lifted, adopted) are never made here: they come from the chief's own device (rule M3).
 * Several drafts are made in the order given, each knowing the ones before it.
 */
export function appendServerRecords(
  tx: Db,
  eventId: string,
  actor: AccountActor,
  drafts: readonly ServerDraft[],
  now: number,
  notes: readonly ServerNote[] = [],
): readonly ServerRecord[] | Refusal {
  assert(tx.$client.inTransaction, 'records of the server are made outside a transaction')
  const own = readFrame(tx, eventId)
  if (own === null || own.event.clubId !== actor.clubId) return refuse('missing')
  const { device, person } = serverDeviceFor(tx, own.event, actor, now)
  const roles = device.people.find(({ personId }) => personId === person)?.roles ?? []
  assert(!drafts.some(isChiefAct), 'a chief’s act is asked of the server')
  if (!drafts.every((draft) => mayRecord(draft, roles))) return refuse('forbidden')
  // Read again, and not kept: this transaction may have changed rows already, and may yet be rolled back.
  const frame = readFrame(tx, eventId) ?? own
  const work = beginLogWork(tx, frame, eventLog(tx, eventId), now)
  const salted = notes.map((note) => saltNote(note))
  const hashes = new Map(salted.map(({ ref, hash }) => [`note:${ref}`, hash]))
  const { privateKey } = serverKey(tx, frame.event.clubId)
  let deviceSeq = lastDeviceSeq(tx, device.deviceId)
  const made = drafts.map((draft) => {
    const record = complete(work, draft, { device: device.deviceId, deviceSeq: (deviceSeq += 1), actor: person }, hashes)
    const jws = signJws(record, RECORD_TYPE, privateKey, device.deviceId)
    const { outcome, code, hash, seq } = takeRecord(work, { state: 'verified', jws, hash: sha256(jws), record, device })
    assert(outcome === 'stored' && seq !== null, `the server's own record was ${outcome}: ${code ?? 'no reason'}`)
    return { seq, hash, record }
  })
  keepNotes(work, salted)
  return made
}

function saltNote({ ref, text }: ServerNote) {
  const salt = randomBytes(16).toString('base64url')
  return { ref, salt, text, hash: noteHash(salt, text, sha256) }
}

function lastDeviceSeq(tx: Db, deviceId: string): number {
  const last = tx
    .select({ seq: max(recordTable.deviceSeq) })
    .from(recordTable)
    .where(eq(recordTable.deviceId, deviceId))
    .get()
  return last?.seq ?? 0
}

interface Maker {
  readonly device: string
  readonly deviceSeq: number
  readonly actor: string
}

function complete(work: LogWork, draft: ServerDraft, maker: Maker, notes: ReadonlyMap<string, string>): KnownRecord {
  const { database, frame, log, now } = work
  const key = subjectKey(draft.subject)
  const entries = [...(log.bySubject.get(key) ?? []), ...(log.bySubject.get(subjectKey({ event: frame.event.id })) ?? [])]
  const state = foldSubject(entries, key, foldContext(database, frame, now))
  const named = 'notes' in draft && draft.notes !== undefined ? { notes: draft.notes.map((ref) => notes.get(ref) ?? ref) } : {}
  const shown = shownOf(frame, log, draft)
  const record = readRecord({
    v: RECORD_VERSION,
    id: newId(),
    event: frame.event.id,
    ...maker,
    at: now,
    offset: 0,
    day: venueDay(now, frame.event.timeZone),
    seen: log.seq,
    ...workOutEdges(draft, { actor: maker.actor, state, entries }),
    shown: { number: shown?.number ?? '', plateTail: shown?.plateTail ?? '' },
    effect: effectOf(draft),
    ...draft,
    ...named,
  })
  assert(record !== null && isKnown(record), `the server drafts a ${draft.kind} that is none`)
  return record
}
