import { isKnown, RECORD_VERSION, type KnownRecord } from '@/lib/inspection/record'
import type { LogEntry } from '@/lib/inspection/log-entry'
import type { SubjectState } from '@/lib/inspection/state'
import type { Subject } from '@/lib/inspection/subject'
import { noteHash } from '../core/chain'
import { effectOf } from '../core/effect-of'
import { recordKey, type StoredRecord } from '../core/held-record'
import { readRecord } from '../core/read-record'
import { RECORD_TYPE } from '../core/record-type'
import { workOutEdges } from '../core/work-out-edges'
import { base64url } from '../core/base64url'
import { dayError } from './problem-of'
import { signJwsWith } from './device-key'
import { StoreConflict, type DeviceStore } from './device-store'
import { KEYS, NO_COUNTERS, type Enrolment, type MakeCounters } from './enrolment'
import type { DayTools } from './day-tools'
import type { Draft, DraftNote, SavedRecord } from './draft'

/** What a record is made from besides its draft. */
export interface Maker {
  readonly store: DeviceStore
  readonly enrolment: Enrolment
  readonly tools: DayTools
  /** Who is unlocked. */
  readonly actor: string
  readonly offset: () => number
  readonly day: () => string
  readonly seen: () => number
  readonly shown: (subject: Subject) => { readonly number: string; readonly plateTail: string }
  readonly state: (subject: Subject) => SubjectState
  /** Records of the subject and of the event itself. */
  readonly entries: (subject: Subject) => readonly LogEntry[]
  /** Takes in what other tabs have written since; called once the lock is held. */
  readonly catchUp: () => Promise<void>
}

/** A note as it lies in the store. */
export interface StoredNote {
  readonly hash: string
  readonly salt: string
  readonly text: string
}

export interface Made {
  readonly saved: readonly SavedRecord[]
  readonly stored: readonly StoredRecord[]
  readonly notes: readonly StoredNote[]
  readonly counters: MakeCounters
}

/** How often a forked counter is tried again where locks do not reach over tabs. */
const TRIES = 5

/**
 * Makes, signs and saves the records of one action under the lock and in one transaction (rule M1). Rejects with a `DayError` or the store's own error; then
 * nothing was saved. `draft` is called once the lock is held and told the number the next pass of this device has.
 */
export function makeRecords(
  maker: Maker,
  draft: (nextPass: number) => Promise<readonly Draft[]>,
  notes: readonly DraftNote[],
): Promise<Made> {
  return maker.store.lock('make', async () => {
    for (let tries = 1; ; tries += 1) {
      try {
        return await makeOnce(maker, draft, notes)
      } catch (error) {
        if (!(error instanceof StoreConflict) || tries >= TRIES) throw error
      }
    }
  })
}

async function makeOnce(maker: Maker, draft: (nextPass: number) => Promise<readonly Draft[]>, notes: readonly DraftNote[]): Promise<Made> {
  await maker.catchUp()
  const held = (await maker.store.read(KEYS.make)) as MakeCounters | undefined
  const counters = held ?? NO_COUNTERS
  const drafts = await draft(counters.passCounter + 1)
  const salted = saltNotes(notes, maker.tools)
  const records = drafts.map((one, index) => complete(one, counters.deviceSeq + 1 + index, salted, maker))
  const made = await Promise.all(records.map((record) => sign(record, maker)))
  const passes = records.filter(({ kind }) => kind === 'pass' || kind === 'band').length
  const next: MakeCounters = { deviceSeq: counters.deviceSeq + records.length, passCounter: counters.passCounter + passes }
  await maker.store.commit({
    put: [
      ...made.map(({ stored }) => [recordKey(stored.hash), stored] as const),
      ...[...salted.values()].map((note) => [`n:${note.hash}`, note] as const),
      [KEYS.make, next],
    ],
    expect: { key: KEYS.make, field: 'deviceSeq', value: held?.deviceSeq },
  })
  return { saved: made.map(({ saved }) => saved), stored: made.map(({ stored }) => stored), notes: [...salted.values()], counters: next }
}

function saltNotes(notes: readonly DraftNote[], tools: DayTools): ReadonlyMap<string, StoredNote> {
  return new Map(
    notes.map(({ ref, text }) => {
      const salt = base64url(tools.randomBytes(16))
      return [`note:${ref}`, { hash: noteHash(salt, text, tools.sha256), salt, text }]
    }),
  )
}

function complete(draft: Draft, deviceSeq: number, notes: ReadonlyMap<string, StoredNote>, maker: Maker): KnownRecord {
  const { actor, tools, enrolment } = maker
  const edges = workOutEdges(draft, { actor, state: maker.state(draft.subject), entries: maker.entries(draft.subject) })
  const named = 'notes' in draft && draft.notes !== undefined ? { notes: draft.notes.map((ref) => notes.get(ref)?.hash ?? ref) } : {}
  const whole = {
    v: RECORD_VERSION,
    id: tools.newId(),
    event: enrolment.says.event,
    device: enrolment.says.device,
    deviceSeq,
    actor,
    at: tools.now(),
    offset: maker.offset(),
    day: maker.day(),
    seen: maker.seen(),
    ...edges,
    shown: maker.shown(draft.subject),
    effect: effectOf(draft),
    ...draft,
    ...named,
  }
  // By the very reader the server uses: what it would refuse is refused now, while the person is still there.
  const record = readRecord(whole)
  if (record === null || !isKnown(record)) throw dayError('unreadable-draft')
  return record
}

async function sign(
  record: KnownRecord,
  { enrolment, tools }: Maker,
): Promise<{ readonly saved: SavedRecord; readonly stored: StoredRecord }> {
  const jws = await signJwsWith(enrolment.key, RECORD_TYPE, enrolment.says.device, record)
  const hash = tools.sha256(jws)
  const { id, deviceSeq } = record
  const stored: StoredRecord = {
    hash,
    id,
    jws,
    seq: null,
    lastSeq: null,
    deviceSeq,
    mine: true,
    disposition: 'provisional',
    code: null,
    out: 'unsent',
  }
  return { saved: { id, hash, record }, stored }
}
