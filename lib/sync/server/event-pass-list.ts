import 'server-only'
import { asc, eq } from 'drizzle-orm'
import type { Db } from '@/db/client'
import { device, devicePerson } from '@/db/schema'
import type { DaySnapshot } from '@/lib/contracts/day-snapshot'
import { subjectKey } from '@/lib/inspection/subject'
import { buildPassList, type EntryForList } from '@/lib/pass/build-pass-list'
import type { ListedKey, PassList } from '@/lib/pass/pass-list'
import { can, type Role } from '@/lib/permissions/policy'
import { entryNow } from '../core/entry-now'
import { foldContext, type EventFrame } from './event-frame'
import type { EventLog } from './event-log'
import { eventStates } from './event-states'
import { pinnedBook } from './pinned-books'

interface Made {
  readonly tag: string
  readonly list: PassList
}

const made = new WeakMap<EventLog, Made>()

/** The pass list of an event as its log stands (rule F8): made once per change, and told with the time of each asking, since it was true until then. */
export function eventPassList(database: Db, frame: EventFrame, log: EventLog, snapshot: DaySnapshot, now: number): PassList {
  const context = foldContext(database, frame, now)
  const { snapshotVersion, checklistHash, limitsHash, code } = frame.event
  const keys = listedKeys(database, frame.event.id)
  const tag = `${log.seq} ${log.chain} ${snapshot.version} ${context.day} ${JSON.stringify(keys)}`
  const known = made.get(log)
  if (known?.tag === tag) return { ...known.list, at: now }
  const list = buildPassList({
    seq: log.seq,
    // Both only grow, so that of two lists the one with the higher number is the newer.
    version: log.seq + snapshotVersion,
    at: now,
    eventCode: code,
    day: context.day,
    entries: entriesOf(snapshot, log),
    states: eventStates(frame, log, [...log.bySubject.keys(), ...context.declared], context),
    names: new Map(snapshot.people.map(({ id, name }) => [id, name])),
    keys,
    book: pinnedBook(database, checklistHash, limitsHash),
  })
  made.set(log, { tag, list })
  return list
}

function entriesOf(snapshot: DaySnapshot, log: EventLog): readonly EntryForList[] {
  const groups = new Map(snapshot.groups.map(({ id, name }) => [id, name]))
  return snapshot.entries.map((entry) => {
    const now = entryNow(entry, log.changes.get(subjectKey({ car: entry.id })) ?? [])
    return { ...now, groupName: groups.get(now.group) ?? '' }
  })
}

/** The keys that ever signed for this event. Whether one may issue is by its enrolment, not by who still holds a role: a pass made in time stays good. */
function listedKeys(database: Db, eventId: string): readonly ListedKey[] {
  const people = database
    .select({ deviceId: devicePerson.deviceId, roles: devicePerson.roles })
    .from(devicePerson)
    .innerJoin(device, eq(device.id, devicePerson.deviceId))
    .where(eq(device.eventId, eventId))
    .all()
  const issuers = new Set(
    people
      // The pit exit asks this of a car's pass: a device of sign-on issues bands and no passes.
      .filter(({ roles }) => can(roles as readonly Role[], 'record:pass'))
      .map(({ deviceId }) => deviceId),
  )
  return database
    .select({ id: device.id, kid: device.kid, publicKey: device.publicKey, state: device.state })
    .from(device)
    .where(eq(device.eventId, eventId))
    .orderBy(asc(device.kid))
    .all()
    .map(({ id, kid, publicKey, state }) => ({ kid, publicKey, state, mayIssue: issuers.has(id) }))
}
