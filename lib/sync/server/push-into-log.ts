import 'server-only'
import type { Db } from '@/db/client'
import { transaction } from '@/db/transaction'
import type { SyncPushRequest, SyncPushResponse } from '@/lib/contracts/sync-push'
import { assert } from '@/lib/platform/assert'
import { eventFrame } from './event-frame'
import { dropEventLog, eventLog } from './event-log'
import { seatPeople } from './seat-people'
import { beginLogWork, keepNotes, takeRecord } from './take-record'
import type { RefusedRecord, VerifiedRecord } from './verify-records'

type Answer = SyncPushResponse['answers'][number]

/** Who pushed, and what they said of themselves. */
export interface Pusher {
  readonly deviceId: string
  readonly unsent: number
}

/**
 * Takes verified records into the event's log in one transaction (rules S1, S2, S3, T1): each gets its number, its disposition and its place in the chain.
 * Nothing is folded here: who reads folds. All is committed, synchronously to the disk, before anything is answered.
 */
export function pushIntoLog(
  database: Db,
  eventId: string,
  records: readonly (VerifiedRecord | RefusedRecord)[],
  notes: SyncPushRequest['notes'],
  pusher: Pusher,
  now: number,
): { readonly answers: readonly Answer[]; readonly stored: number } {
  try {
    return transaction(database, () => {
      const frame = eventFrame(database, eventId)
      assert(frame !== null, `a push to event ${eventId}, which is not there`)
      const log = eventLog(database, eventId)
      const work = beginLogWork(database, frame, log, now)
      const before = log.seq
      const answers = records.map((record) => (record.state === 'refused' ? refusal(record) : takeRecord(work, record)))
      keepNotes(work, notes)
      seatPeople(
        work,
        records.flatMap((record, index) => (record.state === 'verified' && answers[index]?.outcome === 'stored' ? [record.record] : [])),
        notes,
      )
      const answered = answers.filter(({ outcome }) => outcome !== 'refused').length
      work.statements.contact.run({ at: now, unsent: Math.max(0, pusher.unsent - answered), deviceId: pusher.deviceId })
      return { answers, stored: log.seq - before }
    })
  } catch (error) {
    // What was appended in memory is not in the database.
    dropEventLog(database, eventId)
    throw error
  }
}

function refusal({ id, hash, code }: RefusedRecord): Answer {
  return { id, hash, outcome: 'refused', code, seq: null }
}
