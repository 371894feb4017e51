import { subjectKey, type Subject } from '@/lib/inspection/subject'
import { takesAway } from '../core/decide-disposition'
import { isChiefAct, mayRecord } from '../core/may-record'
import type { DevicePerson } from './day-client'
import type { DayParts } from './day-parts'
import type { Draft, DraftNote } from './draft'
import { makeRecords, type Made, type Maker } from './make-records'
import { dayError, storageError } from './problem-of'

/** Saves one action, or rejects with a `DayError` and saves nothing. `draft` is told the number the next pass of this device has. */
export type Save = (draft: (nextPass: number) => Promise<readonly Draft[]>, notes: readonly DraftNote[]) => Promise<Made>

export function daySaving(parts: DayParts): Save {
  const { disk, hands, bump, now, store } = parts
  return async (draft, notes) => {
    const person = hands.unlocked()
    if (person === null) throw dayError('locked')
    if (disk.memory.snapshot() === null) throw dayError('not-loaded')
    const allowed = async (nextPass: number) => {
      const drafts = await draft(nextPass)
      if (!drafts.every((one) => may(parts, one, person))) throw dayError('not-allowed')
      return drafts
    }
    try {
      const made = await makeRecords(makerOf(parts, person.id), allowed, notes)
      disk.made(made)
      hands.touched()
      return made
    } catch (error) {
      throw storageError(error)
    } finally {
      bump()
      now.loop?.kick()
      // The room left is told with the next change; nobody waits for an estimate.
      void store.room().then((room) => {
        now.room = room
      })
    }
  }
}

/** What the server will ask at push, asked before saving: who may not, is told now and not in an hour. */
function may({ disk, day, enrolment }: DayParts, draft: Draft, person: DevicePerson): boolean {
  if (!mayRecord(draft, person.roles) || (isChiefAct(draft) && enrolment.says.people.length !== 1)) return false
  if (draft.kind !== 'presented' || person.roles.includes('scrutineer') || person.roles.includes('chief')) return true
  const heads = disk.memory.state(subjectKey(draft.subject), day()).presentedHeads
  return !takesAway(
    draft,
    heads.map(({ record }) => record),
  )
}

function makerOf({ store, enrolment, tools, disk, day, cars }: DayParts, actor: string): Maker {
  const { memory } = disk
  return {
    store,
    enrolment,
    tools,
    actor,
    offset: () => disk.pull().offset,
    day,
    seen: () => disk.pull().seq,
    shown: cars.shown,
    state: (subject: Subject) => memory.state(subjectKey(subject), day()),
    entries: (subject) => [...memory.log(subjectKey(subject)), ...memory.log(subjectKey({ event: enrolment.says.event }))],
    catchUp: disk.catchUp,
  }
}
